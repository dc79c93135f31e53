import type { Assessment, ModeState } from '../model/assessment.js'
import type { Budget, Variant } from '../model/budget.js'
import type { Evaluation } from '../model/evaluation.js'
import type { Network } from '../model/network.js'
import { EngineFault, ofVariant, Refusal, type Problem } from '../model/problem.js'
import { ascending, modeAnchors, zeroAnchors } from './anchors.js'
import { assemble } from './assemble.js'
import { refuseBlind } from './blind.js'
import { Evaluator } from './evaluate.js'
import { firstPoints, pointAt, refine } from './grid.js'
import { bestIndex, headlinesOf } from './headlines.js'
import { polesOf, type Pole } from './poles.js'
import { pumpRange } from './power-sweep.js'
import { refuseBeyondQuantum } from './quantum-bound.js'
import { requirementResults } from './requirements.js'
import { Changes } from './sensitivity.js'
import { refuseUnstable } from './stability.js'
import { cavityStates, modeStates } from './states.js'
import { leastNonlinear, linearity } from './working-point.js'
import { bandsOf, lineSpreadsAt, rootSharesAt, type Differentiated } from './uncertainty.js'

const units = { force: 'N/√Hz', acceleration: 'm/s²/√Hz', displacement: 'm/√Hz', strain: '1/√Hz' } as const

const everything = { sources: true, limits: true } as const

/** Unit of the measurand's amplitude density. */
export const unitOf = (budget: Budget): string => units[budget.measurand.quantity]

/** A budget at its working point, ready to be evaluated anywhere. */
export interface Prepared {
  readonly budget: Budget
  readonly network: Network
  readonly poles: readonly Pole[]
}

/** Throws `Refusal` where the working point is unstable, the record blind, or a kernel refuses its values. */
export function prepare(budget: Budget): Prepared {
  const network = assemble(budget)
  const poles = polesOf(network)
  refuseUnstable(network, poles)
  refuseBlind(budget, network)
  refuseBeyondQuantum(budget, network)
  return { budget, network, poles }
}

/** All curves on a grid of the engine's own choice over the whole band. */
export function evaluateBand({ budget, network, poles }: Prepared): Evaluation {
  const curves = new Evaluator(budget, network, { sources: false, limits: true })
  const knots = budget.tables.flatMap(table => [...table.frequency])
  const modes = modeAnchors(network, poles, budget.band)
  const first = curves.at(firstPoints(modes, budget.band, knots))
  const zeros = zeroAnchors(network, first, budget.band)
  const anchors = ascending([...modes, ...zeros])
  const start = zeros.length === 0 ? first.points : firstPoints(anchors, budget.band, knots)
  return new Evaluator(budget, network, everything).at(refine(curves, start))
}

/** Refuses a budget whose numbers leave double precision: nothing that is not a number may reach a page. */
export function refuseBeyondNumbers(budget: Budget, { total, points }: Evaluation): void {
  const bad = total.findIndex(value => !Number.isFinite(value))
  if (bad < 0) return
  const message = `at ${points.frequency[bad]} Hz the noise is no finite number: some value of this budget is far too large or too small for what it is; look at masses, rates and densities`
  throw new Refusal([{ severity: 'error', code: 'no-number', place: budget.band.place, message }])
}

/** All curves exactly at given frequencies in Hz, in the order given. */
export function evaluateAtFrequencies(budget: Budget, frequencies: ArrayLike<number>): Evaluation {
  return evaluateList(prepare(budget), frequencies)
}

export function evaluateList({ budget, network, poles }: Prepared, frequencies: ArrayLike<number>): Evaluation {
  const anchors = modeAnchors(network, poles, { low: 0, high: Infinity })
  const list = Array.from(frequencies, frequency => pointAt(anchors, frequency))
  // Anchors that no point is measured from would be followed for nothing when roots change.
  const used = [...new Set(list.map(p => p.anchor))].filter(anchor => anchor >= 0)
  const points = {
    anchors: used.map(anchor => anchors[anchor]),
    frequency: Float64Array.from(frequencies),
    anchor: Int32Array.from(list, p => used.indexOf(p.anchor)),
    offset: Float64Array.from(list, p => p.offset),
  }
  return new Evaluator(budget, network, everything).at(points)
}

/**
 * A limit that binds the readout's computed noise cannot be passed: where it is, the engine contradicts itself. A part in a million is
 * left for lossless readouts, which reach their limits.
 */
function checkLimits(evaluation: Evaluation): void {
  for (const limit of evaluation.limits) {
    if (limit.bounds !== 'added') continue
    for (let i = 0; i < evaluation.added.length; i++) {
      if (evaluation.added[i] >= limit.psd[i] * (1 - 1e-6)) continue
      const at = evaluation.points.frequency[i]
      const ratio = (evaluation.added[i] / limit.psd[i]).toPrecision(6)
      throw new EngineFault(
        `the added noise is ${ratio} of the ${limit.title.toLowerCase()} at ${at} Hz, which nothing can pass`,
      )
    }
  }
}

/** True where the network knows how the readout disturbs what it senses. */
const actsBack = ({ sensing }: Network): boolean => sensing.light !== null || sensing.push !== undefined

/** What a person should know beside the numbers. */
export function warningsOf({ budget, network }: Prepared): Problem[] {
  const warnings = [...budget.warnings]
  if (!actsBack(network)) {
    warnings.push({
      severity: 'warning',
      code: 'no-back-action',
      place: budget.readoutPlace,
      message: `back-action missing: \`${budget.readout}\` states its noise but not how it disturbs the motion; margins to quantum limits mean little without it`,
    })
  }
  return warnings
}

/**
 * The motion pulls the resonance over a good part of its linewidth: the linear equations then say too little. Motion slower than the band is
 * left out, since a lock follows it.
 */
function nonlinear({ budget, network }: Prepared, modes: readonly ModeState[]): Problem[] {
  const cavity = network.cavities.find(({ id }) => id === network.sensing.id)
  const pulled = linearity(network, modes, budget.band.low)
  if (cavity === undefined || pulled === null || pulled <= leastNonlinear) return []
  const size = Number(pulled.toPrecision(2))
  const message = `the rms motion pulls \`${cavity.id}\` by ${size} of half its linewidth; above ${leastNonlinear} the readout is not linear, and this budget takes it as linear`
  return [{ severity: 'warning', code: 'nonlinear', place: cavity.place, message }]
}

/** How much is wanted: a report has uncertainties at every point of the band; a glance only those of its headline numbers, and no curves of variants. */
export type Depth = 'report' | 'glance'

/** Everything that a report says about one budget. Throws `Refusal` for the input's faults and `EngineFault` for the engine's. */
export function assess(budget: Budget, depth: Depth = 'report'): Assessment {
  const prepared = prepare(budget)
  if (depth === 'glance') tryVariants(budget)
  const { network, poles } = prepared
  const evaluation = evaluateBand(prepared)
  refuseBeyondNumbers(budget, evaluation)
  if (actsBack(network)) checkLimits(evaluation)
  const changes = new Changes(budget)
  const at = (...frequencies: number[]): Differentiated => {
    const here = evaluateList(prepared, frequencies)
    return { evaluation: here, slopes: changes.sensitivities(here, 'spot') }
  }
  const best = evaluation.points.frequency[bestIndex(evaluation)]
  const reference = budget.reference ?? best
  const spots = at(reference, best)
  const counted = depth === 'report' || budget.requirements.some(({ of }) => of.startsWith('occupancy.'))
  const modes = modeStates(budget, network, { poles, changes: counted ? changes : null })
  return {
    budget,
    evaluation,
    atReference: evaluateList(prepared, [reference]),
    headlines: headlinesOf(budget, evaluation, spots),
    bands: depth === 'report' ? bandsOf(budget, evaluation, changes.sensitivities(evaluation, 'band')) : null,
    rootShares: rootSharesAt(budget, spots, 0),
    lineSpreads: lineSpreadsAt(budget, spots, 0),
    requirements: requirementResults(budget, { band: evaluation, modes, at }),
    variants: depth === 'report' ? budget.variants.map(assessVariant) : [],
    modes,
    cavities: cavityStates(network, modes),
    pumpRange: depth === 'report' ? pumpRange(budget, reference) : null,
    unit: unitOf(budget),
    warnings: [...warningsOf(prepared), ...nonlinear(prepared, modes)],
  }
}

/** Throws a refusal that names the variant: its place may lie in what the budget itself says, and is fine there. */
function inVariant<Result>(id: string, work: () => Result): Result {
  try {
    return work()
  } catch (error) {
    if (!(error instanceof Refusal)) throw error
    throw new Refusal(error.problems.map(problem => ofVariant(id, problem)))
  }
}

function assessVariant({ id, title, budget }: Variant): Assessment['variants'][number] {
  return { id, title, assessment: inVariant(id, () => assess(budget)) }
}

/** Whether a variant would be refused, without drawing it. */
export function tryVariants(budget: Budget): void {
  for (const variant of budget.variants) inVariant(variant.id, () => prepare(variant.budget))
}
