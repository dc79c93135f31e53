import type { Assessment } from '../model/assessment.js'
import type { Budget } from '../model/budget.js'
import { bestFrequencyText } from './headlines.js'
import { decibelText, hasBackAction } from './margins.js'
import { densityText } from './numbers.js'
import { requirementStatus } from './requirements.js'

/** The budget or one of its variants, by its headline numbers. */
export interface VariantRow {
  readonly id: string
  readonly title: string
  readonly about: string
  /** `drum.quality: 8.1(3)e7 → 8.1e8`. */
  readonly changes: readonly string[]
  readonly best: string
  readonly bestAt: string
  /** At the budget's reference frequency; empty where it has none. */
  readonly reference: string
  /** Total to the standard quantum limit, there or at the best; empty where it has no meaning. */
  readonly margin: string
  /** Of its requirements; empty where it has none. */
  readonly requirements: string
}

/** The budget as it is and its variants; empty where it has none. */
export function variantRows(assessment: Assessment): readonly VariantRow[] {
  const { budget, variants } = assessment
  if (variants.length === 0) return []
  return [
    variantRow(assessment, { id: '', title: 'As it is', about: '', changes: [] }),
    ...variants.map(({ id, title, assessment: changed }) =>
      variantRow(changed, {
        id,
        title: variantName(id, title),
        about: budget.variants.find(each => each.id === id)?.about ?? '',
        changes: changesBetween(budget, changed.budget),
      }),
    ),
  ]
}

/** `cold: Q ten times higher`; an id that was only made readable is not said twice. */
export function variantName(id: string, title: string): string {
  return title === id.replaceAll('_', ' ') ? title : `${id}: ${title}`
}

type Words = Pick<VariantRow, 'id' | 'title' | 'about' | 'changes'>

function variantRow(assessment: Assessment, words: Words): VariantRow {
  const { headlines, unit } = assessment
  const { best, reference } = headlines
  const at = reference ?? best
  const margin = at.totalMargin === null || !hasBackAction(assessment) ? null : at.totalMargin
  return {
    ...words,
    best: densityText(best.asd, unit, best.asdSpread.combined),
    bestAt: bestFrequencyText(assessment),
    reference: reference === null ? '' : densityText(reference.asd, unit, reference.asdSpread.combined),
    margin: margin === null ? '' : decibelText(margin, at.totalMarginSpread?.combined),
    requirements: requirementStatus(assessment)?.text ?? '',
  }
}

/** What a variant states otherwise, by the texts of both files. */
function changesBetween(before: Budget, after: Budget): readonly string[] {
  const [old, now] = [before, after].map(textsOf)
  const changed = [...now].filter(([id, text]) => old.get(id) !== text)
  const gone = [...old.keys()].filter(id => !now.has(id))
  return [
    ...changed.map(([id, text]) => `${id}: ${old.get(id) ?? 'not there'} → ${text}`),
    ...gone.map(id => `${id}: ${old.get(id)} → left out`),
  ]
}

function textsOf({ roots, derived }: Budget): ReadonlyMap<string, string> {
  return new Map([...roots, ...derived].map(({ id, text }) => [id, text]))
}
