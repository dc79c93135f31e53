import type { Place, Problem } from '../model/problem.js'

/** More than this tells nobody anything; the rest is counted. */
const shown = 100

/** Collects what is wrong with the inputs of one budget. */
export class Issues {
  readonly #found: Problem[] = []
  readonly #seen = new Set<string>()
  /** Places with an error of an earlier stage: what a later stage finds there follows from it. */
  readonly #settled = new Set<string>()

  error(code: string, place: Place, message: string): void {
    this.add({ severity: 'error', code, place, message })
  }

  warning(code: string, place: Place, message: string): void {
    this.add({ severity: 'warning', code, place, message })
  }

  /** The same sentence at the same place is kept once: an alias reaches one node along several ways. */
  add(problem: Problem): void {
    const place = key(problem.place)
    const sentence = `${place}:${problem.message}`
    if (this.#settled.has(place) || this.#seen.has(sentence)) return
    this.#seen.add(sentence)
    this.#found.push(problem)
  }

  /** From here on, errors at places that already have one are dropped. */
  nextStage(): void {
    for (const problem of this.#found) if (problem.severity === 'error') this.#settled.add(key(problem.place))
  }

  get errors(): number {
    return this.#found.filter(problem => problem.severity === 'error').length
  }

  get failed(): boolean {
    return this.#found.some(problem => problem.severity === 'error')
  }

  /** In the order of the files, errors and warnings together, cut after a hundred. */
  sorted(): readonly Problem[] {
    const all = [...this.#found].sort(byPlace)
    if (all.length <= shown) return all
    const [kept, cut] = [all.slice(0, shown), all.slice(shown)]
    const severity = cut.some(problem => problem.severity === 'error') ? 'error' : 'warning'
    const place = kept.at(-1)?.place ?? { file: '', line: 1, column: 1 }
    return [...kept, { severity, code: 'more', place, message: `${cut.length} more problems are not listed` }]
  }
}

function byPlace(a: Problem, b: Problem): number {
  if (a.place.file !== b.place.file) return a.place.file < b.place.file ? -1 : 1
  return a.place.line - b.place.line || a.place.column - b.place.column
}

function key({ file, line, column }: Place): string {
  return `${file}:${line}:${column}`
}
