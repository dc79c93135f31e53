import type { Assessment } from '../model/assessment.js'
import { percentText, rangeText } from './numbers.js'
import { lineTitle } from './titles.js'

/** A stretch of the band and the line that is largest in it. */
export interface BandRow {
  readonly line: string
  readonly title: string
  readonly range: string
  readonly share: string
}

/** What limits the sensor in which part of its band. */
export function bandRows(assessment: Assessment): readonly BandRow[] {
  return assessment.headlines.dominance.map(({ line, from, to, least, greatest }) => ({
    line,
    title: lineTitle(assessment, line),
    range: rangeText(from, to),
    share: shareRange(percentText(least), percentText(greatest)),
  }))
}

function shareRange(least: string, greatest: string): string {
  return least === greatest ? least : `${least.replace(' %', '')} – ${greatest}`
}
