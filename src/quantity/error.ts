/** Text that is no quantity, or not the one that is wanted; the place counts UTF-16 units within the text. */
export class QuantityError extends Error {
  constructor(
    message: string,
    readonly offset: number,
    readonly length: number,
  ) {
    super(message)
    this.name = 'QuantityError'
  }
}
