import type { Span } from './tree.js'

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

/** The piece of the text that a span covers. */
export function sliceOf(span: Span, text: string): string {
  return text.slice(span.start, span.end)
}

/** An error that begins with the piece it refuses; `remedy` goes on from there. */
export function refusePiece(span: Span, text: string, remedy: string): QuantityError {
  return new QuantityError(`\`${sliceOf(span, text)}\` ${remedy}`, span.start, span.end - span.start)
}
