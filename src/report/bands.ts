import type { Assessment } from '../model/assessment.js'
import type { Family } from '../model/evaluation.js'
import { spokenRange } from './landmarks.js'
import { percentText, rangeDigits } from './numbers.js'
import { lineFamily, lineTitle } from './titles.js'

/** A stretch of the band and the line that is largest in it. */
export interface BandRow {
  readonly line: string
  readonly title: string
  readonly family: Family
  readonly range: string
  readonly share: string
}

/** What limits the sensor in which part of its band. */
export function bandRows(assessment: Assessment): readonly BandRow[] {
  const { dominance } = assessment.headlines
  // One number of digits for the whole table, so that neighbours state their common end alike.
  const digits = Math.max(...dominance.map(({ from, to }) => rangeDigits(from, to)))
  return dominance.map(({ line, from, to, least, greatest }) => ({
    line,
    title: lineTitle(assessment, line),
    family: lineFamily(assessment, line),
    range: spokenRange(assessment, { from, to }, digits),
    share: shareRange(percentText(least), percentText(greatest)),
  }))
}

function shareRange(least: string, greatest: string): string {
  return least === greatest ? least : `${least.replace('\u00a0%', '')} to ${greatest}`
}
