import { QuantityError } from '../quantity/error.js'
import { parseQuantity } from '../quantity/parse.js'
import { toDeclared } from '../quantity/declared.js'
import type { Place } from '../model/problem.js'
import type { Issues } from './issues.js'
import { quoted } from './quoted.js'
import { placeWithin, type Tree } from './tree.js'

export interface BandRead {
  /** In Hz, 0 < low < high. */
  readonly low: number
  readonly high: number
  readonly place: Place
}

/** Reads `1.20 MHz to 1.30 MHz`; null where it is no band, which has been said. */
export function readBand(tree: Tree | undefined, issues: Issues): BandRead | null {
  if (tree?.type !== 'scalar' || tree.text === '') return null
  const parts = /^(.*?\S)\s+to\s+(\S.*)$/su.exec(tree.text)
  if (parts === null) {
    issues.error(
      'band',
      tree.place,
      `${quoted(tree.text)} is no band; write two frequencies with \`to\` between them: \`1.20 MHz to 1.30 MHz\``,
    )
    return null
  }
  const [, lowText = '', highText = ''] = parts
  const frequency = (text: string, offset: number): number | null => {
    try {
      return toDeclared(parseQuantity(text), 'frequency').value
    } catch (error) {
      if (!(error instanceof QuantityError)) throw error
      issues.error('quantity', placeWithin(tree, offset + error.offset), error.message)
      return null
    }
  }
  const low = frequency(lowText, 0)
  const high = frequency(highText, tree.text.length - highText.length)
  if (low === null || high === null) return null
  if (!(low > 0)) issues.error('band', tree.place, `the band begins at ${quoted(lowText)}; it must begin above 0 Hz`)
  else if (!(low < high))
    issues.error(
      'band',
      tree.place,
      `the band ends at ${quoted(highText)}, which is not above its begin ${quoted(lowText)}; write the lower frequency first`,
    )
  else return { low, high, place: tree.place }
  return null
}
