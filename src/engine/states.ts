import type { CavityState, ModeState, Spread } from '../model/assessment.js'
import type { Budget } from '../model/budget.js'
import type { Mode, Network } from '../model/network.js'
import { finalOccupancy } from './occupancy.js'
import { energyDecay, polesOfModes, type Pole } from './poles.js'
import type { Changes } from './sensitivity.js'
import { spreadOf } from './uncertainty.js'
import { decoherenceRate, linearity, measurementRate } from './working-point.js'

const twoPi = 2 * Math.PI

/** Weight of a mode in the coordinate that a cavity senses; 0 where it is not sensed by the readout's cavity. */
function weightOf(network: Network, mode: Mode): number {
  return network.sensing.weights.find(w => w.mode.id === mode.id)?.weight ?? 0
}

/** 4g²/κΓ with g = G c x_zp √n̄ and Γ the damping at the mode's own frequency. */
function cooperativity(network: Network, mode: Mode): number | null {
  const cavity = network.cavities.find(c => c.id === network.sensing.id)
  if (cavity === undefined || mode.zeroPoint === null) return null
  const g0 = cavity.coupling * weightOf(network, mode) * mode.zeroPoint
  const decay = mode.gamma + twoPi * mode.frequency * mode.phi
  return (4 * g0 * g0 * cavity.quanta) / (cavity.kappa * decay)
}

/** The network's poles, and the changed networks where spreads of occupancies are wanted: they take many evaluations. */
export interface Wanted {
  readonly poles: readonly Pole[]
  readonly changes: Changes | null
}

/** True where the occupancy of a mode means something: light, and a frequency of every mode to count quanta of. */
const countable = (network: Network, mode: Mode): boolean =>
  network.cavities.length > 0 && mode.zeroPoint !== null && network.modes.every(m => m.frequency > 0)

/** Final occupancies of all modes, in their order, with their spreads. */
function occupancies(
  budget: Budget,
  network: Network,
  { poles, changes }: Wanted,
): { value: number | null; spread: Spread | null }[] {
  const all = (net: Network, list: readonly Pole[]): (number | null)[] =>
    net.modes.map(mode => (countable(net, mode) ? finalOccupancy(net, list, mode) : null))
  const values = all(network, poles)
  if (changes === null || values.every(value => value === null)) return values.map(value => ({ value, spread: null }))
  const slopes = changes.derivatives(changed => all(changed.network, changed.poles).map(value => value ?? 0))
  return values.map((value, k) => {
    if (value === null) return { value, spread: null }
    const parts = slopes.map(({ root, slopes: by }) => by[k] * budget.roots[root].uncertainty)
    return {
      value,
      spread: spreadOf(
        budget,
        slopes.map(({ root }) => root),
        parts,
      ),
    }
  })
}

/** Modes as light has left them. */
export function modeStates(budget: Budget, network: Network, wanted: Wanted): ModeState[] {
  const ofModes = polesOfModes(network, wanted.poles)
  const final = occupancies(budget, network, wanted)
  return network.modes.map((mode, k) => {
    const pole = ofModes.get(mode.id)
    const measured = measurementRate(network, mode)
    const linewidth = mode.gamma / twoPi + mode.frequency * mode.phi
    return {
      id: mode.id,
      frequency: mode.frequency,
      effectiveFrequency: pole === undefined ? mode.frequency : pole.omega.re / twoPi,
      linewidth,
      effectiveLinewidth: pole === undefined ? linewidth : energyDecay(pole) / twoPi,
      thermalOccupancy: mode.thermalOccupancy,
      finalOccupancy: final[k].value,
      finalOccupancySpread: final[k].spread,
      zeroPoint: mode.zeroPoint,
      cooperativity: cooperativity(network, mode),
      measurementRate: measured === null ? null : measured / twoPi,
      decoherenceRate: decoherenceRate(mode) / twoPi,
    }
  })
}

export function cavityStates(network: Network, modes: readonly ModeState[]): CavityState[] {
  return network.cavities.map(({ id, kappa, quanta, pumpPower, detuning, ports }) => ({
    id,
    linewidth: kappa / twoPi,
    quanta,
    pumpPower,
    detuning: detuning / twoPi,
    linearity: id === network.sensing.id ? linearity(network, modes) : null,
    ports: ports.map(port => ({ id: port.id, rate: port.rate / twoPi, occupancy: port.occupancy })),
  }))
}
