import type { ModeState } from '../model/assessment.js'
import type { Mode, Network } from '../model/network.js'
import { Evaluator } from './evaluate.js'
import { makePoints } from './points.js'

/** Rms motion over half a linewidth from which on a readout is not linear any more: common practice, no source. */
export const leastNonlinear = 0.1

/** The network with its motion held still, and a displacement of the sensed coordinate as what is measured. */
function heldStill(network: Network): Network {
  const mechanical = (row: number): boolean => network.unknowns[row].nature === 'mechanical'
  return {
    ...network,
    entries: network.entries.filter(({ row, column }) => !mechanical(row) || mechanical(column)),
    measurand: network.sensing.injection,
    sources: network.sources
      .filter(({ readout }) => readout)
      .map(source => ({
        ...source,
        nodes: source.nodes.map(node => ({ ...node, rows: node.rows.filter(({ row }) => !mechanical(row)) })),
      })),
  }
}

/**
 * Γ_meas = (c x_zp)²/(2 S_x^imp) in rad/s, S_x^imp the one-sided imprecision of the sensed coordinate at the mode's frequency with the motion
 * held still; an ideal readout has 4g²/κ. Null where the readout does not sense the mode [Clerk et al., Rev. Mod. Phys. 82, 1155 (2010)].
 */
export function measurementRate(network: Network, mode: Mode): number | null {
  const weight = network.sensing.weights.find(each => each.mode.id === mode.id)?.weight ?? 0
  if (weight === 0 || mode.zeroPoint === null) return null
  const points = makePoints([], [{ anchor: -1, offset: mode.frequency }])
  const { added } = new Evaluator({ lines: [] }, heldStill(network), { sources: false, limits: false }).at(points)
  const rate = (weight * mode.zeroPoint) ** 2 / (2 * added[0])
  return Number.isFinite(rate) ? rate : null
}

/** Γ(n_th + ½) in rad/s, how fast the bath alone blurs the motion; Γ is the damping at the mode's own frequency. */
export const decoherenceRate = ({ gamma, phi, frequency, thermalOccupancy }: Mode): number =>
  (gamma + 2 * Math.PI * frequency * phi) * (thermalOccupancy + 0.5)

/**
 * G x_rms/(κ/2) of the readout's cavity, x_rms² = Σ c²x_zp²(2n_f + 1) over the modes that it senses, as if position and momentum had the
 * same share; null without a cavity, or where an occupancy is not known. Modes slower than `slowest` in Hz are left out.
 */
export function linearity(
  network: Network,
  states: readonly Pick<ModeState, 'id' | 'finalOccupancy'>[],
  slowest = 0,
): number | null {
  const cavity = network.cavities.find(({ id }) => id === network.sensing.id)
  if (cavity === undefined) return null
  const sensed = network.sensing.weights.filter(({ mode }) => mode.frequency >= slowest)
  const squares = sensed.map(({ mode, weight }) => {
    const final = states.find(({ id }) => id === mode.id)?.finalOccupancy ?? null
    return final === null || mode.zeroPoint === null ? null : (weight * mode.zeroPoint) ** 2 * (2 * final + 1)
  })
  if (squares.length === 0 || squares.includes(null)) return null
  const motion = Math.sqrt(squares.reduce<number>((sum, square) => sum + (square ?? 0), 0))
  return (Math.abs(cavity.coupling) * motion) / (cavity.kappa / 2)
}
