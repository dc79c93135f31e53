import type { Budget, LineSpec, PartName } from '../model/budget.js'
import type { Family } from '../model/evaluation.js'
import type { Network, Source } from '../model/network.js'
import { EngineFault } from '../model/problem.js'

/** The pieces that a source is made of; they add up to it. */
export type Piece = 'imprecision' | 'back-action' | 'correlation' | 'heating'

/** A line of the budget in terms of sources and their pieces. */
export interface LinePlan {
  readonly id: string
  readonly title: string
  readonly family: Family
  readonly signed: boolean
  readonly pieces: readonly { readonly source: Source; readonly piece: Piece | 'all' }[]
}

interface Draft {
  readonly id: string
  readonly title: string
  /** Pieces of each source that the line holds. */
  readonly held: Map<Source, Set<PartName | 'all'>>
}

const titleOf = (id: string): string => {
  const words = id.replaceAll('_', ' ')
  return words[0].toUpperCase() + words.slice(1)
}

/** True where the light carries noise of the source to the mechanics: such a source has back-action. */
const actsBack = (source: Source): boolean => source.parted && source.nodes.some(node => node.rows.length > 0)

/** The parts that a source has at all. */
function partsOf(source: Source): readonly (PartName | 'all')[] {
  if (!source.parted) return ['all']
  const parts: PartName[] = ['imprecision']
  if (actsBack(source)) parts.push('back-action')
  if (source.heating !== null) parts.push('heating')
  return parts
}

/** Ids that `of` may name: a source, or a component for all of its sources. */
function sourcesOf(network: Network, of: string): Source[] {
  return network.sources.filter(source => source.id === of || source.owner === of)
}

class Drafts {
  readonly all: Draft[] = []
  readonly #claimed = new Map<Source, Map<PartName | 'all', string>>()

  line(id: string, title: string): Draft {
    const known = this.all.find(line => line.id === id)
    if (known !== undefined) return known
    const draft = { id, title, held: new Map<Source, Set<PartName | 'all'>>() }
    this.all.push(draft)
    return draft
  }

  claim(line: Draft, source: Source, part: PartName | 'all'): void {
    const claims = this.#claimed.get(source) ?? new Map<PartName | 'all', string>()
    const other = claims.get(part)
    if (other !== undefined) throw new EngineFault(`${source.id} ${part} is claimed by ${other} and by ${line.id}`)
    this.#claimed.set(source, claims.set(part, line.id))
    line.held.set(source, (line.held.get(source) ?? new Set()).add(part))
  }

  owner(source: Source, part: PartName | 'all'): string | undefined {
    return this.#claimed.get(source)?.get(part)
  }

  touched(owner: string): boolean {
    return [...this.#claimed.keys()].some(source => source.owner === owner)
  }
}

function claimStated(drafts: Drafts, spec: LineSpec, network: Network): void {
  const line = drafts.line(spec.id, spec.title ?? titleOf(spec.id))
  const { claims } = spec
  const named = 'kind' in claims ? [spec.id] : claims.of
  const wanted = 'kind' in claims ? null : claims.part
  for (const source of new Set(named.flatMap(of => sourcesOf(network, of)))) {
    for (const part of partsOf(source))
      if (wanted === null || part === wanted || part === 'all') drafts.claim(line, source, part)
  }
}

/** Where unclaimed noise of a component that no line mentions goes. */
function defaultLine(source: Source, part: PartName | 'all'): { id: string; title: string } {
  if (source.family === 'thermal') return { id: 'thermal', title: 'Thermal' }
  if (part === 'back-action') return { id: 'back_action', title: 'Back-action' }
  if (part === 'heating') return { id: 'heating', title: 'Heating' }
  if (source.family === 'amplifier') return { id: 'added', title: 'Amplifier added noise' }
  if (source.channel === 'noise' || part === 'all') return { id: source.id, title: titleOf(source.title) }
  return { id: 'shot', title: 'Shot' }
}

function claimRest(drafts: Drafts, network: Network, stated: ReadonlySet<string>): void {
  const touched = new Set(network.sources.map(source => source.owner).filter(owner => drafts.touched(owner)))
  for (const source of network.sources) {
    for (const part of partsOf(source)) {
      if (drafts.owner(source, part) !== undefined) continue
      const usual = defaultLine(source, part)
      const own = touched.has(source.owner) || stated.has(usual.id)
      const { id, title } = own ? { id: source.id, title: titleOf(source.title) } : usual
      drafts.claim(drafts.line(id, title), source, part)
    }
  }
}

/** The pieces of one source in one line; imprecision and back-action in the same line bring their correlation along. */
function piecesOf(source: Source, held: ReadonlySet<PartName | 'all'>): (Piece | 'all')[] {
  if (partsOf(source).every(part => held.has(part))) return ['all']
  const pieces: (Piece | 'all')[] = [...held]
  if (held.has('imprecision') && held.has('back-action')) pieces.push('correlation')
  return pieces
}

function familyOf(draft: Draft): Family {
  const [source, held] = [...draft.held][0]
  const [part] = held
  if (part === 'heating' || part === 'back-action') return part
  return source.family
}

/** A signed line for each pair of lines that share out imprecision and back-action of the same source. */
function correlations(drafts: Drafts, network: Network): LinePlan[] {
  const pairs = new Map<string, LinePlan>()
  for (const source of network.sources.filter(actsBack)) {
    const [first, second] = [drafts.owner(source, 'imprecision'), drafts.owner(source, 'back-action')]
    if (first === undefined || second === undefined || first === second) continue
    const id = `correlation.${first}.${second}`
    const known = pairs.get(id)
    const piece = { source, piece: 'correlation' } as const
    const title = `Correlation of ${first.replaceAll('_', ' ')} and ${second.replaceAll('_', ' ')}`
    pairs.set(id, { id, title, family: 'correlation', signed: true, pieces: [...(known?.pieces ?? []), piece] })
  }
  return [...pairs.values()]
}

/**
 * The lines of the budget in the order of the file, then what no line claims, then correlations between lines. Every piece of
 * every source stands in exactly one line.
 */
export function planLines(budget: Pick<Budget, 'lines'>, network: Network): LinePlan[] {
  const drafts = new Drafts()
  for (const spec of budget.lines) claimStated(drafts, spec, network)
  claimRest(drafts, network, new Set(budget.lines.map(line => line.id)))
  const lines = drafts.all
    .filter(draft => draft.held.size > 0)
    .map(draft => ({
      id: draft.id,
      title: draft.title,
      family: familyOf(draft),
      signed: false,
      pieces: [...draft.held].flatMap(([source, held]) => piecesOf(source, held).map(piece => ({ source, piece }))),
    }))
  return [...lines, ...correlations(drafts, network)]
}
