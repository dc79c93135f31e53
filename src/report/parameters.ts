import type { Assessment } from '../model/assessment.js'
import type { Root } from '../model/budget.js'
import { siText, siUncertaintyText } from './si-values.js'

/** One value of the file and what it rests on. */
export interface ParameterRow {
  readonly id: string
  readonly written: string
  readonly si: string
  readonly uncertainty: string
  readonly evidence: string
  readonly assumed: boolean
  readonly about: string
  readonly measured: string
  readonly place: string
}

/** Every value that the budget's file states, in its order there. */
export function parameterRows({ budget }: Assessment): readonly ParameterRow[] {
  return budget.roots
    .toSorted((a, b) => a.place.line - b.place.line || a.place.column - b.place.column)
    .map(root => parameterRow(root, budget.file))
}

function parameterRow(root: Root, file: string): ParameterRow {
  return {
    id: root.id,
    written: root.text,
    si: siText(root),
    uncertainty: siUncertaintyText(root),
    evidence: root.evidence ?? '',
    assumed: root.evidence === 'assumed',
    about: root.about ?? '',
    measured: root.measured ?? '',
    place: `${besides(root.place.file, file)}:${root.place.line}`,
  }
}

/** A path as seen from the budget's own folder, where it lies below it. */
function besides(path: string, file: string): string {
  const folder = file.slice(0, file.lastIndexOf('/') + 1)
  return path.startsWith(folder) ? path.slice(folder.length) : path
}
