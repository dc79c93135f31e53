import { readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import type { TwoPumpCavity, TwoPumpReadout } from '../../src/physics/two-pump.js'

/** One working point with force-referred one-sided power densities in N²/Hz at offsets from the pumps' centre. */
export interface TwoPumpCase {
  readonly id: string
  readonly parameters: {
    readonly mass: number
    readonly frequency: number
    readonly Q: number
    readonly temperature: number
    readonly g0_hz: number
    readonly kappa_hz: number
    readonly rate_share_detected: number
    readonly occupancy_detected: number
    readonly occupancy_internal: number
    readonly efficiency: number
    readonly added_quanta: number
    readonly quanta_red: number
    readonly quanta_blue: number
    readonly half_spacing_hz: number
    readonly centre_detuning_hz: number
    readonly angle_deg: number
  }
  readonly offsets_hz: readonly number[]
  readonly force_psd: Readonly<Record<string, readonly number[]>>
  readonly stable: boolean
}

const file = fileURLToPath(new URL('./data/two-pump-cases.json', import.meta.url))

export const twoPumpCases = JSON.parse(readFileSync(file, 'utf8')) as TwoPumpCase[]

const twoPi = 2 * Math.PI

export function cavityOf({ parameters: p }: TwoPumpCase): TwoPumpCavity {
  const kappa = twoPi * p.kappa_hz
  return {
    mass: p.mass,
    omega: twoPi * p.frequency,
    gamma: (twoPi * p.frequency) / p.Q,
    temperature: p.temperature,
    coupling: twoPi * p.g0_hz,
    ports: [
      { id: 'detected', rate: kappa * p.rate_share_detected, occupancy: p.occupancy_detected },
      { id: 'internal', rate: kappa * (1 - p.rate_share_detected), occupancy: p.occupancy_internal },
    ],
    red: p.quanta_red,
    blue: p.quanta_blue,
    halfSpacing: twoPi * p.half_spacing_hz,
    spacingError: twoPi * (p.frequency - p.half_spacing_hz),
    detuning: twoPi * p.centre_detuning_hz,
  }
}

export function readoutOf({ parameters: p }: TwoPumpCase): TwoPumpReadout {
  return { port: 0, angle: (p.angle_deg * Math.PI) / 180, efficiency: p.efficiency, added: p.added_quanta }
}
