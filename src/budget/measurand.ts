import type { ComponentSpec, MeasurandSpec } from '../model/budget.js'
import { declarations } from '../catalogue/declarations.js'
import type { Place } from '../model/problem.js'
import { QuantityError } from '../quantity/error.js'
import { toDeclared } from '../quantity/declared.js'
import { parseQuantity } from '../quantity/parse.js'
import { textOf } from './amount.js'
import type { Directory } from './directory.js'
import type { Issues } from './issues.js'
import { child, placeWithin, type Tree } from './tree.js'

const quantities = ['force', 'acceleration', 'displacement', 'strain'] as const

/** Reads `measurand:`; null where it is none, which has been said. */
export function readMeasurand(
  entry: { tree: Tree | undefined; place: Place },
  directory: Directory,
  issues: Issues,
): MeasurandSpec | null {
  const { tree, place } = entry
  const quantity = quantities.find(word => word === textOf(child(tree, 'quantity')))
  if (tree?.type !== 'map' || quantity === undefined) return null
  const given = ['mode', 'at', 'weights'].flatMap(key => tree.entries.get(key) ?? [])
  const second = given[1]
  if (second !== undefined)
    issues.error(
      'exclusive',
      second.keyPlace,
      `the measurand has ${given.map(each => `\`${each.key}\``).join(' and ')}; keep one of them`,
    )
  const mode = named(child(tree, 'mode'), 'mode', { directory, issues })
  const at = named(child(tree, 'at'), 'sensing', { directory, issues })
  const weights = readWeights(child(tree, 'weights'), directory, issues)
  const stray = tree.entries.get('mode') ?? tree.entries.get('weights')
  if (quantity === 'displacement' && stray !== undefined)
    issues.error(
      'exclusive',
      stray.keyPlace,
      `a displacement is added where motion is sensed; use \`at: <component>\` instead of \`${stray.key}\``,
    )
  return { quantity, weights: mode === null ? weights : new Map([[mode, 1]]), at, place }
}

interface Context {
  readonly directory: Directory
  readonly issues: Issues
}

function named(tree: Tree | undefined, of: 'mode' | 'sensing', { directory, issues }: Context): string | null {
  const word = textOf(tree)
  if (tree === undefined || word === null) return null
  const fault = directory.fault(word, of)
  if (fault !== null) issues.error('unknown-name', tree.place, fault)
  return fault === null ? word : null
}

function readWeights(tree: Tree | undefined, directory: Directory, issues: Issues): ReadonlyMap<string, number> | null {
  if (tree?.type !== 'map') return null
  const weights = new Map<string, number>()
  for (const { key, keyPlace, value } of tree.entries.values()) {
    const fault = directory.fault(key, 'mode')
    if (fault !== null) issues.error('unknown-name', keyPlace, fault)
    const weight = plainNumber(value, issues)
    if (weight !== null) weights.set(key, weight)
  }
  if (![...weights.values()].some(weight => weight !== 0))
    issues.error('range', tree.place, 'every weight is 0, so that nothing is pushed; give one mode a weight')
  return weights
}

function plainNumber(tree: Tree, issues: Issues): number | null {
  if (tree.type !== 'scalar') return null
  try {
    return toDeclared(parseQuantity(tree.text), 'number').value
  } catch (error) {
    if (!(error instanceof QuantityError)) throw error
    issues.error('quantity', placeWithin(tree, error.offset), error.message)
    return null
  }
}

/** Acceleration pushes a mode by the mass that the frame moves; a kind that can state it must. */
export function checkMovedMass(measurand: MeasurandSpec, components: readonly ComponentSpec[], issues: Issues): void {
  if (measurand.quantity !== 'acceleration') return
  for (const component of pushed(measurand, components)) {
    const declared = declarations.get(component.kind)?.fields['moved_mass']
    if (declared === undefined || component.parameters['moved_mass'] !== undefined) continue
    issues.error(
      'moved-mass',
      component.place,
      `an acceleration of the frame pushes \`${component.id}\` by the mass it moves: give \`moved_mass\`, or use the kind \`rigid\` for a body that moves as a whole`,
    )
  }
}

/** A strain pushes a mode by ½ m L ω² h with the length L that the file must state; an interferometer knows its own. */
export function checkStrainLength(
  measurand: MeasurandSpec,
  components: readonly ComponentSpec[],
  issues: Issues,
): void {
  if (measurand.quantity !== 'strain') return
  for (const component of pushed(measurand, components)) {
    const declaration = declarations.get(component.kind)
    if (declaration?.moves === true || component.parameters['strain_length'] !== undefined) continue
    const remedy =
      declaration?.fields['strain_length'] === undefined
        ? 'push a `resonator` with a `strain_length` or an `interferometer` instead'
        : 'give `strain_length`, 4/π² of its length for a bar'
    const message = `a strain pushes \`${component.id}\` by its effective length, which is not known; ${remedy}`
    issues.error('strain-length', component.place, message)
  }
}

/** The mechanical components that a measurand pushes. */
function pushed(measurand: MeasurandSpec, components: readonly ComponentSpec[]): ComponentSpec[] {
  const modes = components.filter(({ kind }) => {
    const declaration = declarations.get(kind)
    return declaration?.nature === 'mechanical' || declaration?.moves === true
  })
  const itself = modes.find(mode => mode.id === measurand.at)
  if (itself !== undefined) return [itself]
  const sensing = components.find(component => component.id === measurand.at)?.parameters['modes']
  const ids =
    measurand.weights?.keys() ?? (sensing instanceof Map ? (sensing as ReadonlyMap<string, unknown>).keys() : null)
  if (ids === null) return modes
  const named = new Set(ids)
  return modes.filter(mode => named.has(mode.id))
}
