import { schemaFiles } from '../budget/editor-schema.js'
import { curvesCsv } from '../report/curves-csv.js'
import { curvesJson } from '../report/curves-json.js'
import type { SiteInput } from './input.js'
import { standaloneFigure } from './pictures.js'

/** The files beside the pages: the schemas; curves and figure of every report, at both of its addresses. */
export function sideFiles({ results }: SiteInput): ReadonlyMap<string, string> {
  const files = new Map<string, string>()
  for (const [name, text] of schemaFiles()) files.set(`schema/${name}`, text)
  for (const { sensor, assessment } of results) {
    if (assessment === null) continue
    const own = new Map([
      ['curves.csv', curvesCsv(assessment)],
      ['curves.json', curvesJson(assessment)],
      ['figure.svg', standaloneFigure(assessment)],
    ])
    for (const folder of ['draft', assessment.budget.revision])
      for (const [name, content] of own) files.set(`${sensor}/${folder}/${name}`, content)
  }
  return files
}
