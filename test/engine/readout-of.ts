import type { Budget, ComponentSpec, Parameters } from '../../src/model/budget.js'
import { budgetOf, component, slot } from './budget-of.js'

/** A mechanical mode; frequency in Hz, 0 for a free mass. */
export interface ModeOf {
  readonly mass: number
  readonly frequency: number
  readonly quality?: number
  readonly law?: 'viscous' | 'structural'
  readonly temperature?: number
  readonly weight?: number
}

export interface PortOf {
  /** In rad/s. */
  readonly rate: number
  readonly occupancy?: number
  /** In dB and rad. */
  readonly squeezing?: readonly [level: number, angle: number]
}

/** A cavity readout; rates in rad/s, angles in rad; the pump enters through the first port. */
export interface ReadoutOf {
  readonly modes: Readonly<Record<string, ModeOf>>
  readonly cavityFrequency?: number
  /** G in rad/s/m. */
  readonly coupling: number
  readonly ports: Readonly<Record<string, PortOf>>
  readonly quanta: number
  readonly detuning?: number
  /** Port that is read; the first where left out. */
  readonly reads?: string
  /** Homodyne angle, or a sideband. */
  readonly record?: number | 'upper' | 'lower'
  readonly efficiency?: number
  /** Added quanta of an amplifier behind the port. */
  readonly added?: number
  readonly more?: readonly ComponentSpec[]
}

function modeComponent(id: string, mode: ModeOf): ComponentSpec {
  if (mode.frequency === 0) return component(id, 'free-mass', { mass: slot(mode.mass) })
  return component(id, 'resonator', {
    mass: slot(mode.mass),
    frequency: slot(mode.frequency),
    quality: slot(mode.quality ?? 1e6),
    law: mode.law ?? 'viscous',
    temperature: slot(mode.temperature ?? 0),
  })
}

function portParameters({ rate, occupancy, squeezing }: PortOf): Parameters {
  return {
    rate: slot(rate),
    ...(occupancy !== undefined && {
      occupancy: { base: slot(occupancy), rise: slot(0), at: slot(1), exponent: slot(1) },
    }),
    ...(squeezing !== undefined && { squeezing: { level: slot(squeezing[0]), angle: slot(squeezing[1]) } }),
  }
}

function detectorComponent({ record = Math.PI / 2, efficiency = 1 }: ReadoutOf, reads: string): ComponentSpec {
  const how = typeof record === 'number' ? { angle: slot(record) } : { side: record }
  return component('detector', typeof record === 'number' ? 'homodyne' : 'sideband', {
    reads,
    efficiency: slot(efficiency),
    ...how,
  })
}

/** The readout as a budget: components `cavity`, `detector`, an `amplifier` where quanta are added, and the modes. */
export function readoutOf(readout: ReadoutOf, changes: Partial<Budget> = {}): Budget {
  const { modes, ports, added } = readout
  const port = `cavity.${readout.reads ?? Object.keys(ports)[0]}`
  return budgetOf(
    [
      ...Object.entries(modes).map(([id, mode]) => modeComponent(id, mode)),
      component('cavity', 'cavity', {
        frequency: slot(readout.cavityFrequency ?? 2.8e14),
        modes: new Map(Object.entries(modes).map(([id, mode]) => [id, slot(mode.weight ?? 1)])),
        coupling: slot(readout.coupling),
        ports: new Map(Object.entries(ports).map(([name, p]) => [name, portParameters(p)])),
        pump: { port: Object.keys(ports)[0], quanta: slot(readout.quanta), detuning: slot(readout.detuning ?? 0) },
      }),
      ...(added === undefined ? [] : [component('amplifier', 'amplifier', { reads: port, added: slot(added) })]),
      detectorComponent(readout, added === undefined ? port : 'amplifier'),
      ...(readout.more ?? []),
    ],
    changes,
  )
}
