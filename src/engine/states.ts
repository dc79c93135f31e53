import type { CavityState, ModeState } from '../model/assessment.js'
import type { Mode, Network } from '../model/network.js'
import { finalOccupancy } from './occupancy.js'
import { energyDecay, polesOfModes, type Pole } from './poles.js'

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

/** Modes as light has left them. */
export function modeStates(network: Network, poles: readonly Pole[]): ModeState[] {
  const ofModes = polesOfModes(network, poles)
  return network.modes.map(mode => {
    const pole = ofModes.get(mode.id)
    const linewidth = mode.gamma / twoPi + mode.frequency * mode.phi
    const shaken = network.cavities.length > 0 && mode.zeroPoint !== null && network.modes.every(m => m.frequency > 0)
    return {
      id: mode.id,
      frequency: mode.frequency,
      effectiveFrequency: pole === undefined ? mode.frequency : pole.omega.re / twoPi,
      linewidth,
      effectiveLinewidth: pole === undefined ? linewidth : energyDecay(pole) / twoPi,
      thermalOccupancy: mode.thermalOccupancy,
      finalOccupancy: shaken ? finalOccupancy(network, poles, mode) : null,
      zeroPoint: mode.zeroPoint,
      cooperativity: cooperativity(network, mode),
    }
  })
}

export function cavityStates(network: Network): CavityState[] {
  return network.cavities.map(({ id, kappa, quanta, pumpPower, detuning, ports }) => ({
    id,
    linewidth: kappa / twoPi,
    quanta,
    pumpPower,
    detuning: detuning / twoPi,
    ports: ports.map(port => ({ id: port.id, rate: port.rate / twoPi, occupancy: port.occupancy })),
  }))
}
