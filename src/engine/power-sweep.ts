import type { BestPump, PumpRange } from '../model/assessment.js'
import type { Budget, ComponentSpec, Parameters, Slot } from '../model/budget.js'
import { Refusal } from '../model/problem.js'
import { assemble } from './assemble.js'
import { totalDensity } from './evaluate.js'
import { modeAnchors } from './anchors.js'
import { makePoints } from './points.js'
import { pointAt } from './grid.js'
import { polesOf } from './poles.js'
import { refuseUnstable } from './stability.js'

/** Decades below and above the present pump, and points in each decade. */
const reach = 2
const perDecade = 10

function scaled(slot: Slot, factor: number): Slot {
  return 'constant' in slot ? { constant: slot.constant * factor } : { ...slot, scale: (slot.scale ?? 1) * factor }
}

/** Fields of a cavity's pump that set its strength; the occupancies that follow the pump follow by themselves. */
const strengths = ['power', 'quanta']

function withPump(component: ComponentSpec, factor: number): ComponentSpec {
  const pump = component.parameters.pump as Parameters
  const stronger = strengths
    .filter(name => name in pump)
    .map((name): [string, Slot] => [name, scaled(pump[name] as Slot, factor)])
  const parameters = { ...component.parameters, pump: { ...pump, ...Object.fromEntries(stronger) } }
  return { ...component, parameters }
}

/** The budget with the pump of its cavities times a factor and the detuning at the working point kept. */
export function pumped(budget: Budget, factor: number): Budget {
  const components = budget.components.map(each => (each.kind === 'cavity' ? withPump(each, factor) : each))
  return { ...budget, components }
}

/** Power density of the total at a frequency with the pump times a factor; null where it is unstable or refused. */
export function totalAt(budget: Budget, factor: number, frequency: number): number | null {
  try {
    const network = assemble(pumped(budget, factor))
    const poles = polesOf(network)
    refuseUnstable(network, poles)
    const anchors = modeAnchors(network, poles, { low: 0, high: Infinity })
    const points = makePoints(anchors, [pointAt(anchors, frequency)])
    return totalDensity(network, points)[0]
  } catch (error) {
    if (error instanceof Refusal) return null
    throw error
  }
}

/** Halves an interval of log₁₀ factor until it is a ten-thousandth wide: the last stable and the first unstable pump. */
function edgeBetween(budget: Budget, frequency: number, stable: number, unstable: number): number {
  let [low, high] = [stable, unstable]
  while (high - low > 1e-4) {
    const middle = (low + high) / 2
    if (totalAt(budget, 10 ** middle, frequency) === null) high = middle
    else low = middle
  }
  return 10 ** low
}

/** Golden-section search for the least of f between a and b, to a ten-thousandth. */
function leastBetween(f: (x: number) => number, from: number, to: number): number {
  const golden = (Math.sqrt(5) - 1) / 2
  let [a, b] = [from, to]
  while (b - a > 1e-4) {
    const [left, right] = [b - golden * (b - a), a + golden * (b - a)]
    if (f(left) <= f(right)) b = right
    else a = left
  }
  return (a + b) / 2
}

/**
 * The same budget over four decades of pump around its own: where the total at a frequency is least, and from which pump on it is unstable.
 * Null without a cavity. The detuning is the one at the working point, so that the static shift does not move with the pump.
 */
export function pumpRange(budget: Budget, frequency: number): PumpRange | null {
  if (!budget.components.some(({ kind }) => kind === 'cavity')) return null
  const steps = Array.from({ length: 2 * reach * perDecade + 1 }, (_, i) => i / perDecade - reach)
  const totals = steps.map(step => totalAt(budget, 10 ** step, frequency))
  const lost = steps.findIndex((step, i) => step > 0 && totals[i] === null)
  const usable = lost < 0 ? steps.length : lost
  return {
    frequency,
    best: bestOf(budget, frequency, { steps, totals: totals.slice(0, usable) }),
    stableUpTo: lost < 0 ? null : edgeBetween(budget, frequency, steps[lost - 1], steps[lost]),
    farthest: 10 ** reach,
  }
}

/** Null where the total still falls, or has not begun to rise, at an end of the range. */
function bestOf(
  budget: Budget,
  frequency: number,
  { steps, totals }: { steps: readonly number[]; totals: readonly (number | null)[] },
): BestPump | null {
  const value = (x: number): number => totalAt(budget, 10 ** x, frequency) ?? Infinity
  const known = totals.map(total => total ?? Infinity)
  const least = known.indexOf(Math.min(...known))
  if (least <= 0 || least >= known.length - 1) return null
  const step = leastBetween(value, steps[least - 1], steps[least + 1])
  return { factor: 10 ** step, asd: Math.sqrt(value(step)) }
}
