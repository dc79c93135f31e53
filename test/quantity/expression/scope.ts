import { constants } from '../../../src/physics/constants.js'
import type { ValueKind } from '../../../src/quantity/expression/value-kind.js'
import { constantsByName } from '../../../src/quantity/expression/constants.js'
import { parseQuantity } from '../../../src/quantity/parse.js'

export interface Known extends ValueKind {
  readonly value: number
}

const written: Readonly<Record<string, string>> = {
  mass: '3 ng',
  m: '3 ng',
  k: '2 N/m',
  temperature: '4 K',
  rate: '2 rad/s',
  linewidth: '600 kHz',
  frequency: '1.2 MHz',
  quality: '2e6',
  wavelength: '1064 nm',
  length: '2 mm',
  tau: '2 ms',
  s: '3 s',
  r: '50 kΩ',
  cap: '1 pF',
  power: '3 mW',
  viscosity: '1.8e-5 Pa s',
  density: '2 aN/√Hz',
  gain: '20 dB',
  f: '1 kHz',
}

/** Parameters, constants of nature and the frequency, as expressions of a budget would find them. */
export const scope: ReadonlyMap<string, Known> = new Map<string, Known>([
  ...constantsByName(constants),
  ...Object.entries(written).map(([name, text]) => [name, parseQuantity(text)] as const),
])

export function valueIn(name: string): number {
  return scope.get(name)?.value ?? NaN
}
