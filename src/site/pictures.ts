import { figureCss } from '../figure/figure-css.js'
import { figureInput } from '../figure/input.js'
import { sensitivityScene } from '../figure/sensitivity-scene.js'
import { renderSvg } from '../figure/svg.js'
import type { Assessment } from '../model/assessment.js'

/** The figures of a report as SVG text. */
export interface ReportPictures {
  /** For wide pages and for paper. */
  readonly wide: string
  /** For narrow screens, where the wide one's letters would be too small. */
  readonly narrow: string
}

const wideSize = { width: 1080, height: 600 }
const narrowSize = { width: 360, height: 420 }

/** Every figure of one report. */
export function reportPictures(assessment: Assessment): ReportPictures {
  const input = figureInput(assessment)
  return {
    wide: renderSvg(sensitivityScene(input, wideSize), 'wide'),
    narrow: renderSvg(sensitivityScene(input, narrowSize), 'narrow'),
  }
}

/** The wide figure as a file of its own: it carries its style sheet, because it is opened without a page around it. */
export function standaloneFigure(assessment: Assessment): string {
  const svg = renderSvg(sensitivityScene(figureInput(assessment), wideSize), 'figure')
  return `${svg.replace('>', `><style>${figureCss()}</style>`)}\n`
}
