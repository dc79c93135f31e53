import { readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import type { Budget, Parameters, Slot } from '../../src/model/budget.js'
import { budgetOf, component, slot } from '../engine/budget-of.js'

type Series = number[]

/** One working point with force-referred one-sided power densities in N²/Hz. */
export interface CavityCase {
  id: string
  parameters: {
    mass: number
    frequency: number
    Q: number
    temperature: number
    cavity_frequency: number
    g0_hz: number
    kappa_hz: number
    rate_share_pumped: number
    rate_share_second: number
    rate_share_internal: number
    detected: 'pumped' | 'second'
    detuning_hz: number
    intracavity_quanta: number
    efficiency: number
    occupancy_pumped: number
    occupancy_second: number
    occupancy_internal: number
    readout: string
    homodyne_angle_deg: number | null
    squeezing_db: number
    squeezing_angle_deg: number
    added_quanta: number
    damping: 'viscous' | 'structural'
  }
  stable: boolean
  frequencies_hz: Series
  force_psd: Record<string, Series>
  parts: Record<string, { imprecision: Series; back_action: Series; correlation: Series }>
  sql_force_psd: Series
  final_occupancy: number | null
}

const file = fileURLToPath(new URL('./data/cavity-cases.json', import.meta.url))

export const cavityCases = JSON.parse(readFileSync(file, 'utf8')) as CavityCase[]

const angular = (hertz: number): Slot => slot(2 * Math.PI * hertz)

function ports(p: CavityCase['parameters']): Map<string, Parameters> {
  const port = (name: 'pumped' | 'second' | 'internal'): [string, Parameters] => [
    name,
    {
      rate: angular(p.kappa_hz * p[`rate_share_${name}`]),
      occupancy: { base: slot(p[`occupancy_${name}`]), rise: slot(0), at: slot(1), exponent: slot(1) },
      ...(name === 'pumped' &&
        p.squeezing_db > 0 && {
          squeezing: { level: slot(p.squeezing_db), angle: slot((p.squeezing_angle_deg * Math.PI) / 180) },
        }),
    },
  ]
  const names = ['pumped', 'second', 'internal'] as const
  return new Map(names.filter(name => p[`rate_share_${name}`] > 0).map(port))
}

function detector(p: CavityCase['parameters'], reads: string): ReturnType<typeof component> {
  const efficiency = slot(p.efficiency)
  if (p.homodyne_angle_deg === null) {
    return component('detector', 'sideband', {
      reads,
      side: p.readout.startsWith('upper') ? 'upper' : 'lower',
      efficiency,
    })
  }
  return component('detector', 'homodyne', { reads, angle: slot((p.homodyne_angle_deg * Math.PI) / 180), efficiency })
}

/** The working point as a budget. The efficiency stands between port and amplifier, as in the data. */
export function budgetOfCase({ parameters: p }: CavityCase): Budget {
  const port = `cavity.${p.detected}`
  const amplified = p.added_quanta > 0
  const readout = detector({ ...p, efficiency: amplified ? 1 : p.efficiency }, amplified ? 'amplifier' : port)
  const chain = amplified
    ? [
        component('line', 'loss', { reads: port, transmission: slot(p.efficiency) }),
        component('amplifier', 'amplifier', { reads: 'line', added: slot(p.added_quanta) }),
      ]
    : []
  return budgetOf([
    component('mode', 'resonator', {
      mass: slot(p.mass),
      frequency: slot(p.frequency),
      quality: slot(p.Q),
      law: p.damping,
      temperature: slot(p.temperature),
    }),
    component('cavity', 'cavity', {
      frequency: slot(p.cavity_frequency),
      modes: new Map([['mode', slot(1)]]),
      g0: angular(p.g0_hz),
      ports: ports(p),
      pump: { port: 'pumped', quanta: slot(p.intracavity_quanta), detuning: angular(p.detuning_hz) },
    }),
    ...chain,
    readout,
  ])
}
