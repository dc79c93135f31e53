/** Texts that are kept before the memory is emptied: more than one project's, and no growth without end. */
const most = 5000

/**
 * The same function with its results kept by their text; only for results that nobody changes. What throws is not kept. A check of many
 * budgets reads the same units and temperatures over and over.
 */
export function remembered<Result>(work: (text: string) => Result): (text: string) => Result {
  const known = new Map<string, Result>()
  return text => {
    const before = known.get(text)
    if (before !== undefined) return before
    const result = work(text)
    if (known.size >= most) known.clear()
    known.set(text, result)
    return result
  }
}
