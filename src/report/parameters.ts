import type { Budget, Derived, Root } from '../model/budget.js'
import type { Place } from '../model/problem.js'
import { evidenceText, type BibliographyEntry, type EvidenceText } from './citations.js'
import { numberText } from './numbers.js'
import { siText, siUncertaintyText } from './si-values.js'

/** One value of the file, stated or derived, and what it rests on. */
export interface ParameterRow {
  readonly id: string
  readonly written: string
  /** Derived from others by the expression that is written. */
  readonly derived: boolean
  readonly si: string
  readonly uncertainty: string
  /** `rectangular, systematic`; empty where no uncertainty is stated. */
  readonly dispersion: string
  readonly evidence: EvidenceText
  readonly about: string
  /** ISO date; empty where there is none, or where the evidence names it. */
  readonly measured: string
  readonly place: string
  /** It stands in a file that the budget's own file builds upon. */
  readonly inherited: boolean
}

/** Two values that share a cause. */
export interface CorrelationRow {
  readonly one: string
  readonly other: string
  readonly coefficient: string
  readonly place: string
}

/** Every value that the budget states or derives, those of its own file first, each in its order there. */
export function parameterRows(budget: Budget, bibliography: readonly BibliographyEntry[]): readonly ParameterRow[] {
  const values = Float64Array.from(budget.roots, root => root.value)
  return [
    ...budget.roots.map(root => ({ place: root.place, row: rootRow(root, budget.file, bibliography) })),
    ...budget.derived.map(derived => ({
      place: derived.place,
      row: derivedRow(derived, derived.formula.value(values), { file: budget.file, bibliography }),
    })),
  ]
    .toSorted((a, b) => inOrder(a.place, b.place, budget.file))
    .map(({ row }) => row)
}

export function correlationRows({ correlations, roots, file }: Budget): readonly CorrelationRow[] {
  return correlations.map(({ roots: [one, other], coefficient, place }) => ({
    one: roots[one].id,
    other: roots[other].id,
    coefficient: numberText(coefficient),
    place: placeText(place, file),
  }))
}

function inOrder(a: Place, b: Place, own: string): number {
  if (a.file !== b.file) return a.file === own || (b.file !== own && a.file < b.file) ? -1 : 1
  return a.line - b.line || a.column - b.column
}

function rootRow(root: Root, file: string, bibliography: readonly BibliographyEntry[]): ParameterRow {
  return {
    id: root.id,
    written: root.text,
    derived: false,
    si: siText(root),
    uncertainty: siUncertaintyText(root),
    dispersion: root.uncertainty > 0 ? `${root.distribution}, ${root.effect}` : '',
    evidence: evidenceText(root.evidence, bibliography),
    about: root.about ?? '',
    // A note often names the day already.
    measured: root.measured === null || root.evidence?.includes(root.measured) ? '' : root.measured,
    place: placeText(root.place, file),
    inherited: root.place.file !== file,
  }
}

function derivedRow(
  { id, text, dimension, about, evidence, place }: Derived,
  value: number,
  { file, bibliography }: { file: string; bibliography: readonly BibliographyEntry[] },
): ParameterRow {
  return {
    id,
    written: text,
    derived: true,
    si: siText({ value, dimension }),
    uncertainty: '',
    dispersion: '',
    evidence: evidenceText(evidence, bibliography),
    about: about ?? '',
    measured: '',
    place: placeText(place, file),
    inherited: place.file !== file,
  }
}

/** A place as seen from the budget's own folder, where it lies below it. */
function placeText({ file, line }: Place, own: string): string {
  const folder = own.slice(0, own.lastIndexOf('/') + 1)
  return `${file.startsWith(folder) ? file.slice(folder.length) : file}:${line}`
}
