import type { Assessment } from '../model/assessment.js'
import type { Family } from '../model/evaluation.js'
import { percentText, rangeText } from './numbers.js'
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
  return assessment.headlines.dominance.map(({ line, from, to, least, greatest }) => ({
    line,
    title: lineTitle(assessment, line),
    family: lineFamily(assessment, line),
    range: rangeText(from, to),
    share: shareRange(percentText(least), percentText(greatest)),
  }))
}

function shareRange(least: string, greatest: string): string {
  return least === greatest ? least : `${least.replace('\u00a0%', '')} to ${greatest}`
}
