/** A value from a file inside a sentence: in backquotes, on one line, at most sixty characters. */
export function quoted(text: string): string {
  if (text === '') return 'nothing'
  const line = text.replace(/\s+/g, ' ')
  const short = [...line].length > 60 ? `${[...line].slice(0, 59).join('')}…` : line
  return `\`${short.replaceAll('`', '’')}\``
}

/** `a cavity`, `an amplifier`. */
export function withArticle(noun: string): string {
  return `${/^[aeiou]/.test(noun) ? 'an' : 'a'} ${noun}`
}
