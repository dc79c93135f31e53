import type { Evaluation } from '../model/evaluation.js'
import type { Network } from '../model/network.js'
import type { Anchor } from '../model/points.js'
import { complex, divide, magnitude, multiply, scale, subtract } from '../physics/complex.js'
import type { ComplexFrequency } from './dense.js'
import { transferAt } from './transfer-at.js'
import { energyDecay, polesOfModes, type Pole } from './poles.js'

export interface Band {
  readonly low: number
  readonly high: number
}

const inside = ({ frequency }: Anchor, { low, high }: Band): boolean => frequency >= low && frequency <= high

/** No narrower than what double precision tells apart. */
const widthOf = (hertz: number, frequency: number): number => Math.max(hertz, 1e-13 * frequency)

/** Bare modes in the band, and the poles that they have become where light has moved or broadened them. */
export function modeAnchors(network: Network, poles: readonly Pole[], band: Band): Anchor[] {
  const ofModes = polesOfModes(network, poles)
  const anchors = network.modes.flatMap(mode => {
    if (mode.frequency === 0) return []
    const bare = (mode.gamma + 2 * Math.PI * mode.frequency * mode.phi) / (4 * Math.PI)
    const halfWidth = widthOf(bare, mode.frequency)
    const list: Anchor[] = [{ id: mode.id, nature: 'mode', frequency: mode.frequency, halfWidth }]
    const pole = ofModes.get(mode.id)
    if (pole === undefined) return list
    const frequency = pole.omega.re / (2 * Math.PI)
    const width = widthOf(Math.abs(energyDecay(pole)) / (4 * Math.PI), frequency)
    const moved = Math.abs(frequency - mode.frequency) > 0.1 * Math.min(halfWidth, width)
    if (frequency > 0 && (moved || Math.abs(Math.log(width / halfWidth)) > 0.1)) {
      list.push({ id: withLight(mode.id), nature: 'pole', frequency, halfWidth: width })
    }
    return list
  })
  return ascending(anchors.filter(anchor => inside(anchor, band)))
}

/**
 * The same anchors in a network whose parameters have changed a little: a mode is where its parameter says, a pole and a zero are found
 * again. One that cannot be found stays where it was. Poles are needed only where an anchor is one.
 */
export function followAnchors(anchors: readonly Anchor[], network: Network, poles: readonly Pole[]): Anchor[] {
  const ofModes = poles.length === 0 ? new Map<string, Pole>() : polesOfModes(network, poles)
  return anchors.map(anchor => {
    if (anchor.nature === 'zero') {
      const zero = zeroNear(network, anchor.frequency, Math.max(anchor.halfWidth, 1e-9 * anchor.frequency))
      return { ...anchor, frequency: zero?.frequency ?? anchor.frequency }
    }
    const mode = network.modes.find(m => anchor.id === m.id || anchor.id === withLight(m.id))
    if (mode === undefined) return anchor
    if (anchor.nature === 'mode') return { ...anchor, frequency: mode.frequency }
    const pole = ofModes.get(mode.id)
    return pole === undefined ? anchor : { ...anchor, frequency: pole.omega.re / (2 * Math.PI) }
  })
}

const withLight = (mode: string): string => `${mode} with light`

/** Sorted, one for each frequency; where two fall on the same number the narrower stays. */
export function ascending(anchors: readonly Anchor[]): Anchor[] {
  const sorted = [...anchors].sort((a, b) => a.frequency - b.frequency || a.halfWidth - b.halfWidth)
  return sorted.filter((anchor, i) => i === 0 || anchor.frequency > sorted[i - 1].frequency)
}

/**
 * Zeros of the response near its dips on a first grid, as anchors: there the total has a peak as sharp as a resonance. From each local
 * minimum of |R|² the secant method looks for R(ω) = 0 in the complex plane.
 */
export function zeroAnchors(network: Network, first: Evaluation, band: Band): Anchor[] {
  const { response, points } = first
  const dips: number[] = []
  for (let i = 1; i < response.length - 1; i++) {
    if (response[i] < response[i - 1] && response[i] <= response[i + 1]) dips.push(i)
  }
  const zeros = dips.flatMap(i => {
    const spacing = points.frequency[i + 1] - points.frequency[i - 1]
    const zero = zeroNear(network, points.frequency[i], spacing)
    if (zero === null || Math.abs(zero.frequency - points.frequency[i]) > spacing) return []
    return [zero]
  })
  return zeros.filter(zero => inside(zero, band)).map((zero, i) => ({ ...zero, id: `zero ${i + 1}` }))
}

/** A root of R by the secant method; null where it does not settle. */
function zeroNear(network: Network, frequency: number, spacing: number): Anchor | null {
  const at = (shift: { re: number; im: number }): ComplexFrequency => ({ anchor: frequency, shift })
  let before = complex(0)
  let shift = complex(0.3 * spacing, -0.1 * spacing)
  let valueBefore = transferAt(network, network.measurand, at(before))
  for (let pass = 0; pass < 60; pass++) {
    const value = transferAt(network, network.measurand, at(shift))
    const change = subtract(value, valueBefore)
    if (magnitude(change) === 0) break
    const step = divide(multiply(value, subtract(shift, before)), change)
    before = shift
    valueBefore = value
    shift = subtract(shift, step)
    if (!Number.isFinite(magnitude(shift)) || Math.abs(shift.re) > 1e3 * spacing * 2 * Math.PI) return null
    if (magnitude(step) <= 1e-12 * magnitude(scale(shift, 1)) + 1e-15 * frequency) {
      const root = frequency + shift.re / (2 * Math.PI)
      return {
        id: 'zero',
        nature: 'zero',
        frequency: root,
        halfWidth: widthOf(Math.abs(shift.im) / (2 * Math.PI), root),
      }
    }
  }
  return null
}
