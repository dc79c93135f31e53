import type { Budget } from '../model/budget.js'
import type { Network, QuantumClaim } from '../model/network.js'
import { Refusal } from '../model/problem.js'
import { Evaluator } from './evaluate.js'
import { absolutePoints } from './points.js'

/** Points over the band at which a claim is tried, beside the rows of tables: a stated density is smooth in between. */
const tried = 129

function triedIn({ band, tables }: Budget): Float64Array {
  const ratio = band.high / band.low
  const even = Array.from({ length: tried }, (_, i) => band.low * ratio ** (i / (tried - 1)))
  const rows = tables.flatMap(table => [...table.frequency]).filter(f => f > band.low && f < band.high)
  return Float64Array.from([...even.slice(0, -1), band.high, ...rows]).sort()
}

/**
 * Refuses a stated imprecision and back-action that no detector has. With commutators [x_n, F_n†] = iħ of a detector that neither stiffens nor
 * damps, positive noise at ω and −ω asks S_xx S_FF ≥ (Re S_xF)² + (ħ + |Im S_xF|)², one-sided; without correlation S_xx S_FF ≥ ħ²
 * [Clerk et al., Rev. Mod. Phys. 82, 1155 (2010), sections IV and V]. A part in 10⁹ is left for rounding.
 */
export function refuseBeyondQuantum(budget: Budget, network: Network): void {
  if (network.sources.every(source => source.claim === undefined)) return
  const frequencies = triedIn(budget)
  const { sources } = new Evaluator({ lines: [] }, network, { sources: true, limits: false }).at(
    absolutePoints(frequencies),
  )
  const problems = network.sources.flatMap(({ claim, owner }, k) => {
    if (claim === undefined) return []
    const { own } = sources[k]
    const worst = own.reduce((least, value, i) => (value < own[least] ? i : least), 0)
    const claimed = 2 * own[worst] * claim.factor
    return claimed >= 1 - 1e-9 ? [] : [problem(claim, { owner, claimed, frequency: frequencies[worst] })]
  })
  if (problems.length > 0) throw new Refusal(problems)
}

function problem(
  { place, product, unit, remedy }: QuantumClaim,
  { owner, claimed, frequency }: { owner: string; claimed: number; frequency: number },
): Refusal['problems'][number] {
  const [number, hertz] = [claimed, frequency].map(value => Number(value.toPrecision(4)))
  return {
    severity: 'error',
    code: 'quantum-bound',
    place,
    message: `\`${owner}\` claims ${product} = ${number} ${unit} at ${hertz} Hz, but no detector has less than 1 ${unit}; ${remedy}`,
  }
}
