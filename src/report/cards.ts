import type { Declaration } from '../catalogue/declaration.js'
import type { Assessment } from '../model/assessment.js'
import type { Parameters } from '../model/budget.js'
import type { Family, LineCurve, SourceCurve } from '../model/evaluation.js'
import { declarationOf } from './catalogue.js'
import { claimedSources, lineValue } from './contributions.js'
import { formatTex } from '../quantity/format.js'
import { percentText } from './numbers.js'
import { wordAt } from './slots.js'
import { substitute } from './substitution.js'
import { symbolRows, type SymbolRow } from './symbols.js'
import { termRow, type TermRow } from './terms.js'

/** An equation of the catalogue as this budget uses it. */
export interface CardEquation {
  readonly name: string
  readonly tex: string
  /** The same with numbers, one for each source that it describes; empty where it has no closed form. */
  readonly numbers: readonly string[]
}

/** Everything a report says about one line of the budget. */
export interface EquationCard {
  readonly id: string
  readonly title: string
  readonly family: Family
  readonly signed: boolean
  readonly value: string
  readonly share: string
  readonly about: string
  readonly evidence: string
  readonly equations: readonly CardEquation[]
  readonly terms: readonly TermRow[]
  /** Of the components that no card before this one has shown. */
  readonly symbols: readonly { readonly owner: string; readonly rows: readonly SymbolRow[] }[]
  /** Lines whose cards show the symbols of the others. */
  readonly symbolsBefore: readonly { readonly id: string; readonly title: string }[]
  /** Titles and words of the kinds behind it. */
  readonly kinds: readonly { readonly kind: string; readonly title: string; readonly validity: string }[]
  /** Keys of the catalogue's references. */
  readonly references: readonly string[]
}

/** One card a line, in the order of the file; values at the reference frequency. */
export function equationCards(assessment: Assessment): readonly EquationCard[] {
  const shown = new Map<string, string>()
  return assessment.atReference.lines.map(line => equationCard(line, assessment, shown))
}

interface Owner {
  readonly id: string
  readonly declaration: Declaration
  readonly parameters: Parameters
}

/** `shown` keeps, over the cards, which line's card lists the symbols of an owner. */
function equationCard(line: LineCurve, assessment: Assessment, shown: Map<string, string>): EquationCard {
  const { budget, atReference } = assessment
  const spec = budget.lines.find(each => each.id === line.id)
  const owners = ownersOf(line, assessment)
  const fresh = owners.filter(owner => !shown.has(owner.id))
  const before = new Set(owners.flatMap(owner => shown.get(owner.id) ?? []))
  for (const owner of fresh) shown.set(owner.id, line.id)
  const declarations = [...new Set(owners.map(owner => owner.declaration))]
  return {
    id: line.id,
    title: line.title,
    family: line.family,
    signed: line.signed,
    value: lineValue(line, assessment),
    share: percentText(line.psd[0] / atReference.total[0]),
    about: spec?.about ?? '',
    evidence: spec?.evidence ?? '',
    equations: line.signed ? [correlation] : cardEquations(line, owners, assessment),
    terms: line.signed ? [] : line.of.flatMap(claim => termRow(claim, assessment) ?? []),
    symbols: fresh
      .map(owner => ({ owner: owner.id, rows: symbolRows(owner, budget) }))
      .filter(({ rows }) => rows.length > 0),
    symbolsBefore: atReference.lines.filter(each => before.has(each.id)).map(({ id, title }) => ({ id, title })),
    kinds: declarations.map(({ kind, title, validity }) => ({ kind, title, validity })),
    references: [...new Set(declarations.flatMap(declaration => declaration.references))],
  }
}

const correlation: CardEquation = {
  name: 'correlation',
  tex: 'S^{\\mathrm{cor}} = \\frac{4}{|R|^2}\\,\\mathrm{Re}\\left(t_{\\mathrm{imp}}V_j f^\\dagger R^*\\right)',
  numbers: [],
}

function ownersOf(line: LineCurve, { budget, atReference }: Assessment): readonly Owner[] {
  const ids = [...new Set(claimedSources(line, atReference).map(source => source.owner))]
  return ids.flatMap(id => {
    const component = budget.components.find(each => each.id === id)
    const claims = budget.lines.find(each => each.id === id)?.claims
    const owner = component ?? (claims !== undefined && 'kind' in claims ? claims : null)
    const declaration = owner === null ? null : declarationOf(owner.kind)
    return owner === null || declaration === null ? [] : [{ id, declaration, parameters: owner.parameters }]
  })
}

function cardEquations(line: LineCurve, owners: readonly Owner[], assessment: Assessment): readonly CardEquation[] {
  const found = line.of.flatMap(claim => {
    const [id, part] = claim.split(' ')
    const source = assessment.atReference.sources.find(each => each.id === id)
    const owner = owners.find(each => each.id === source?.owner)
    return source === undefined || owner === undefined ? [] : sourceEquations(source, owner, part ?? null, assessment)
  })
  return joined(found)
}

/** One entry an equation, with the numbers of every source that it describes. */
function joined(equations: readonly CardEquation[]): readonly CardEquation[] {
  const byTex = new Map<string, CardEquation>()
  for (const equation of equations) {
    const numbers = new Set([...(byTex.get(equation.tex)?.numbers ?? []), ...equation.numbers])
    byTex.set(equation.tex, { ...equation, numbers: [...numbers] })
  }
  return [...byTex.values()]
}

/** The kind's equations for this part or channel; all of them where none is named after it. */
function sourceEquations(
  source: SourceCurve,
  owner: Owner,
  part: string | null,
  assessment: Assessment,
): readonly CardEquation[] {
  const { equations } = owner.declaration
  const names = wantedNames(source, owner, part)
  const wanted = equations.filter(equation => names.includes(equation.name))
  return (wanted.length > 0 ? wanted : equations).map(({ name, tex }) => ({
    name,
    tex,
    numbers: numbersIn({ name, tex }, source, owner, assessment),
  }))
}

function wantedNames(source: SourceCurve, owner: Owner, part: string | null): readonly string[] {
  if (part === 'heating') return ['imprecision', 'back-action']
  if (part !== null) return [part]
  const channel = source.channel ?? ''
  const law = wordAt(owner.parameters, 'losses', channel, 'law') ?? wordAt(owner.parameters, 'law') ?? 'viscous'
  return [`${law} bath`, `${channel} noise`, channel]
}

function numbersIn(
  { name, tex }: { readonly name: string; readonly tex: string },
  source: SourceCurve,
  owner: Owner,
  { budget, atReference }: Assessment,
): readonly string[] {
  if (source.ownUnit === 'quanta') return []
  const unit = source.ownUnit === 'N²/Hz' ? 'N/√Hz' : 'm/√Hz'
  const ground = {
    budget,
    unit,
    parameters: owner.parameters,
    channel: source.channel,
    frequency: atReference.points.frequency[0],
  }
  const put = substitute(name, ground, source.own[0])
  if (put === null) return []
  const left = tex.split('=')[0].replace('(f)', '').trim()
  const result = `\\left(${formatTex(Math.sqrt(put.value), unit)}\\right)^2`
  return [put.tex === result ? `${left} = ${result}` : `${left} = ${put.tex} = ${result}`]
}
