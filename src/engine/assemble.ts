import type { Assembly, Instance, Kernel, Output, Stage } from '../catalogue/kernel.js'
import { kernels } from '../catalogue/kernels.js'
import type { Budget, ComponentSpec, Parameters } from '../model/budget.js'
import type {
  Complex,
  Entry,
  Injection,
  Mode,
  Network,
  Sensing,
  Source,
  Unknown,
  WorkingPoint,
} from '../model/network.js'
import { EngineFault, Refusal, type Place, type Problem } from '../model/problem.js'
import { add, complex } from '../physics/complex.js'
import { Binder, rootValues } from './bind.js'

const stages: readonly Stage[] = ['mechanical', 'field', 'chain', 'detector', 'noise']

interface Part {
  readonly kind: string
  readonly instance: Instance<never>
}

/** Collects what kernels put into the network. */
class Builder implements Assembly {
  readonly unknowns: Unknown[] = []
  readonly entries: { row: number; column: number; entry: Entry }[] = []
  readonly readout: { column: number; value: Complex }[] = []
  readonly sources = new Map<string, Source>()
  readonly modes = new Map<string, Mode>()
  readonly sensings = new Map<string, Sensing>()
  readonly cavities: WorkingPoint[] = []
  readonly #outputs = new Map<string, Output>()
  detector: { u: Complex; v: Complex } | null = null
  sensed: string | null = null

  constructor(readonly readoutId: string) {}

  displacement(id: string): number {
    return this.unknowns.push({ id, nature: 'mechanical', conjugate: null }) - 1
  }
  field(id: string): readonly [number, number] {
    const a = this.unknowns.length
    this.unknowns.push({ id: `${id}.a`, nature: 'field', conjugate: a + 1 })
    this.unknowns.push({ id: `${id}.a†`, nature: 'field', conjugate: a })
    return [a, a + 1]
  }
  stamp(row: number, column: number, entry: Entry): void {
    this.entries.push({ row, column, entry })
  }
  source(source: Source): void {
    this.sources.set(source.id, source)
  }
  mode(mode: Mode): void {
    this.modes.set(mode.id, mode)
  }
  modeOf(id: string): Mode {
    return found(this.modes, id)
  }
  sensing(sensing: Sensing): void {
    this.sensings.set(sensing.id, sensing)
  }
  sensingOf(id: string): Sensing {
    return found(this.sensings, id)
  }
  workingPoint(point: WorkingPoint): void {
    this.cavities.push(point)
  }
  output(id: string, output: Output): void {
    this.#outputs.set(id, output)
  }
  outputOf(id: string): Output {
    return found(this.#outputs, id)
  }
  record(column: number, value: Complex): void {
    this.readout.push({ column, value })
  }
  direct(id: string, node: number, value: Complex): void {
    const source = found(this.sources, id)
    const nodes = source.nodes.map((n, i) => (i === node ? { ...n, direct: add(n.direct, value) } : n))
    this.sources.set(id, { ...source, nodes })
  }
  isReadout(id: string): boolean {
    return id === this.readoutId
  }
  reads(id: string): void {
    this.sensed = id
  }
}

/** Names were resolved at the border; one that is missing here is a fault of the engine. */
function found<T>(map: ReadonlyMap<string, T>, id: string): T {
  const value = map.get(id)
  if (value === undefined) throw new EngineFault(`\`${id}\` is not in the network`)
  return value
}

const titleOf = (id: string): string => id.replaceAll('_', ' ')

/** All components and all contributions that are sources of their own, as kernels see them. */
function parts(budget: Budget, binder: Binder): Part[] {
  const instance = (
    spec: Pick<ComponentSpec, 'id' | 'place' | 'places'> & { parameters: Parameters },
    title: string,
  ): Instance<never> => ({
    id: spec.id,
    title,
    values: binder.parameters(spec.parameters) as never,
    place: (path?: string): Place => placeOf(spec, path),
  })
  const components = budget.components.map(c => ({ kind: c.kind, instance: instance(c, titleOf(c.id)) }))
  const noises = budget.lines.flatMap(line =>
    'kind' in line.claims
      ? [{ kind: line.claims.kind, instance: instance({ ...line, ...line.claims }, line.title ?? titleOf(line.id)) }]
      : [],
  )
  return [...components, ...noises]
}

/** The nearest place above a field that the file has. */
function placeOf({ place, places }: Pick<ComponentSpec, 'place' | 'places'>, path: string | undefined): Place {
  for (let at = path ?? ''; at !== ''; at = at.slice(0, Math.max(0, at.lastIndexOf('.')))) {
    const here = places.get(at)
    if (here !== undefined) return here
  }
  return place
}

const refuse = (code: string, place: Place, message: string): Refusal =>
  new Refusal([{ severity: 'error', code, place, message } satisfies Problem])

/** Injection of a unit of the measurand. */
function measurandInjection(budget: Budget, builder: Builder, sensing: Sensing): Injection {
  const { quantity, weights, at, place } = budget.measurand
  const direct = complex(0)
  if (quantity === 'displacement') return at === null ? sensing.injection : builder.sensingOf(at).injection
  if (quantity === 'acceleration') {
    const rows = [...builder.modes.values()].map(mode => {
      if (mode.movedMass === null)
        throw refuse('moved-mass', place, `acceleration needs the \`moved_mass\` of \`${mode.id}\``)
      return { row: mode.unknown, value: complex(mode.movedMass) }
    })
    return { rows, direct }
  }
  if (quantity === 'strain') return strainInjection(budget, builder)
  const pushed =
    weights ?? new Map((at === null ? sensing : builder.sensingOf(at)).weights.map(w => [w.mode.id, w.weight]))
  return {
    rows: [...pushed].map(([id, weight]) => ({ row: builder.modeOf(id).unknown, value: complex(weight) })),
    direct,
  }
}

/** F = M ḧ on each pushed mode, M its strain moment: every mode that the file does not exclude by naming others. */
function strainInjection({ measurand }: Budget, builder: Builder): Injection {
  const { weights, at, place } = measurand
  const sensed = at === null ? null : builder.sensingOf(at).weights.map(w => [w.mode.id, w.weight] as const)
  const pushed = [...(weights ?? sensed ?? [...builder.modes.keys()].map(id => [id, 1] as const))]
  const rows = pushed.map(([id, weight]) => {
    const { unknown, strainMoment } = builder.modeOf(id)
    if (strainMoment === undefined)
      throw refuse('strain-length', place, `strain needs the \`strain_length\` of \`${id}\``)
    return { row: unknown, value: complex(weight * strainMoment) }
  })
  return { rows, direct: complex(0), filter: { order: 2, constant: complex(1) } }
}

/**
 * Budget → network at given values of its roots. Throws `Refusal` where a kernel refuses its values (no carrier at the
 * detector, losses that do not add up).
 */
export function assemble(budget: Budget, roots: Float64Array = rootValues(budget)): Network {
  const builder = new Builder(budget.readout)
  const all = parts(budget, new Binder(budget, roots))
  for (const stage of stages) {
    for (const part of all) {
      const kernel = (kernels as Record<string, Kernel>)[part.kind]
      if (stage === 'mechanical') kernel.move?.(part.instance, builder)
      if (kernel.stage === stage) kernel.assemble(part.instance, builder)
    }
  }
  const sensing = found(builder.sensings, builder.sensed ?? budget.readout)
  return {
    unknowns: builder.unknowns,
    entries: builder.entries,
    readout: builder.readout,
    measurand: measurandInjection(budget, builder, sensing),
    sources: [...builder.sources.values()],
    modes: [...builder.modes.values()],
    sensing,
    cavities: builder.cavities,
  }
}
