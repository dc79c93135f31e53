/** Arrays for evaluations that follow one another: taking again after `reset` overwrites what was taken before. */
export class Arena {
  readonly #arrays: Float64Array[] = []
  #used = 0

  reset(): void {
    this.#used = 0
  }

  take(length: number): Float64Array {
    const known = this.#arrays[this.#used]
    const array = known?.length === length ? known : new Float64Array(length)
    this.#arrays[this.#used++] = array
    return array
  }
}
