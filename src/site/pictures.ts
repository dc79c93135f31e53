import { closeUpScene } from '../figure/close-up-scene.js'
import { figureCss } from '../figure/figure-css.js'
import { figureInput, type FigureInput } from '../figure/input.js'
import type { Scene, Size } from '../figure/scene.js'
import { sensitivityScene } from '../figure/sensitivity-scene.js'
import { shareScene } from '../figure/share-scene.js'
import { sparkScene } from '../figure/spark-scene.js'
import { renderSvg } from '../figure/svg.js'
import type { Assessment } from '../model/assessment.js'

/** One figure, drawn twice: letters of the wide one would be too small on a narrow screen. */
export interface Picture {
  readonly wide: string
  readonly narrow: string
}

/** The figures of a report as SVG text. */
export interface ReportPictures {
  readonly main: Picture
  readonly shares: Picture
  /** One for each resonance in the band, against the offset from it. */
  readonly closeUps: readonly (Picture & { readonly id: string })[]
  /** For the front page. */
  readonly spark: string
}

const narrow = { width: 360, height: 400 }

/** Every figure of one report. */
export function reportPictures(assessment: Assessment): ReportPictures {
  const input = figureInput(assessment)
  const draw = (name: string, wide: Size, scene: (size: Size) => Scene): Picture => ({
    wide: renderSvg(scene(wide), `${name}-wide`),
    narrow: renderSvg(scene(narrow), `${name}-narrow`),
  })
  return {
    main: draw('curves', { width: 1080, height: 600 }, size => sensitivityScene(input, size)),
    shares: draw('shares', { width: 860, height: 320 }, size => shareScene(input, size)),
    closeUps: resonances(input).map(anchor => ({
      id: anchor.id,
      ...draw(`near-${anchor.id.replaceAll(' ', '-')}`, { width: 860, height: 420 }, size =>
        closeUpScene(input, anchor, size),
      ),
    })),
    spark: renderSvg(sparkScene(input, { width: 320, height: 120 }), `spark-${assessment.budget.sensor}`),
  }
}

function resonances({ points, band }: FigureInput): FigureInput['points']['anchors'] {
  return points.anchors.filter(
    anchor => anchor.nature === 'mode' && anchor.frequency >= band.low && anchor.frequency <= band.high,
  )
}

/** The main figure as a file of its own: it carries its style sheet, because it is opened without a page around it. */
export function standaloneFigure(assessment: Assessment): string {
  const svg = renderSvg(sensitivityScene(figureInput(assessment), { width: 1080, height: 600 }), 'figure')
  return `${svg.replace('>', `><style>${figureCss()}</style>`)}\n`
}
