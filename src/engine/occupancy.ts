import type { Injection, Mode, Network, Shape, Source } from '../model/network.js'
import { complex } from '../physics/complex.js'
import { boltzmannConstant, reducedPlanckConstant } from '../physics/constants.js'
import { gaussLegendre } from '../physics/gauss-legendre.js'
import { totalDensity } from './evaluate.js'
import type { Point } from './points.js'
import { energyDecay, type Pole } from './poles.js'
import type { Anchor, Points } from '../model/points.js'

/**
 * A viscous bath as the white force that it is next to the resonance of its own mode, 4ħΩ(n(Ω,T)+½)mΓ. Taken literally, the zero point of a viscous
 * bath grows with frequency and ⟨p²⟩ diverges; the occupancy of a mode means this white bath.
 */
function whitened(shape: Shape, mode: Mode): Shape {
  if (shape.form !== 'viscous bath') return shape
  const omega = 2 * Math.PI * mode.frequency
  const x = (reducedPlanckConstant * omega) / (2 * boltzmannConstant * shape.temperature)
  const coth = shape.temperature === 0 ? 1 : 1 / Math.tanh(x)
  return { form: 'constant', value: 2 * reducedPlanckConstant * omega * shape.strength * coth }
}

/** The network whose record is the motion of one mode itself, shaken by everything that enters its equations. */
function motionOf(network: Network, mode: Mode): Network {
  const still = (node: Injection): Injection => ({ ...node, direct: complex(0) })
  const ownerOf = (source: Source): Mode => network.modes.find(m => m.id === source.owner) ?? mode
  const sources: Source[] = network.sources
    .filter(source => source.nodes.some(node => node.rows.length > 0))
    .map(source => ({ ...source, nodes: source.nodes.map(still), shape: whitened(source.shape, ownerOf(source)) }))
  const one = complex(1)
  return {
    ...network,
    readout: [{ column: mode.unknown, value: one }],
    measurand: { rows: [], direct: one },
    sources,
  }
}

/** A panel of the integral, its ends as offsets from an anchor. */
interface Panel {
  readonly anchor: number
  readonly from: number
  readonly to: number
}

/**
 * Each panel reaches four times as far from a pole as the one before. Seen from such a panel the pole lies on the Bernstein ellipse of
 * parameter 3, and the rule's error is 3^(−2·12) ≈ 4e-12.
 */
const growth = 4

const nodesPerPanel = 12

const rule = gaussLegendre(nodesPerPanel)

/** Poles at positive frequencies as anchors, ascending; one at zero frequency stands for those on the imaginary axis. */
function poleAnchors(poles: readonly Pole[]): Anchor[] {
  const anchors = poles
    .filter(pole => pole.omega.re >= 0)
    .map((pole, i): Anchor => ({
      id: `pole ${i + 1}`,
      nature: 'pole',
      frequency: pole.omega.re / (2 * Math.PI),
      halfWidth: Math.abs(energyDecay(pole)) / (4 * Math.PI),
    }))
    .sort((a, b) => a.frequency - b.frequency)
  return anchors.filter((a, i) => i === 0 || a.frequency > anchors[i - 1].frequency)
}

/**
 * Where the integral begins, over the lowest pole: at 0 for white baths. A structural bath diverges there as ln f/Q, which a millionth of
 * the pole keeps below 10/Q; a stated power law or table may rise faster, and motion slower than a thousandth of the pole is then drift.
 */
function lowestOf({ sources }: Network): number {
  const shapes = sources.flatMap(({ shape, nodes }) => [shape, ...nodes.flatMap(node => node.shape ?? [])])
  const drifts = sources.some(({ nodes }) => nodes.some(({ filter }) => (filter?.order ?? 0) < 0))
  if (drifts || shapes.some(({ form }) => form === 'power' || form === 'table')) return 1e-3
  return shapes.some(shape => shape.form === 'structural bath') ? 1e-6 : 0
}

/** Ends of panels from `lowest` to `highest` in Hz: geometric around every pole, whatever other poles lie in between. */
function panelEnds(anchors: readonly Anchor[], lowest: number, highest: number): Point[] {
  const ends: Point[] = []
  for (const [anchor, { frequency, halfWidth }] of anchors.entries()) {
    const first = Math.max(halfWidth, Number.EPSILON * frequency)
    for (const [sign, reach] of [
      [-1, frequency - lowest],
      [1, highest - frequency],
    ] as const) {
      for (let offset = first; offset < reach; offset *= growth) ends.push({ anchor, offset: sign * offset })
      if (reach > 0) ends.push({ anchor, offset: sign * reach })
    }
    if (frequency > lowest) ends.push({ anchor, offset: 0 })
  }
  return ends.map(end => fromNearest(anchors, end))
}

/** The same frequency as an offset from the nearest pole. */
function fromNearest(anchors: readonly Anchor[], end: Point): Point {
  const offsets = anchors.map(({ frequency }) => anchors[end.anchor].frequency - frequency + end.offset)
  const nearest = offsets.reduce(
    (best, offset, i) => (Math.abs(offset) < Math.abs(offsets[best]) ? i : best),
    end.anchor,
  )
  return nearest === end.anchor ? end : { anchor: nearest, offset: offsets[nearest] }
}

/** Panels between neighbouring ends, each measured from the pole that it is nearest to. */
function panelsOver(anchors: readonly Anchor[], lowest: number, highest: number): Panel[] {
  const ends = panelEnds(anchors, lowest, highest).sort(
    (a, b) => frequencyOf(anchors, a) - frequencyOf(anchors, b) || a.offset - b.offset,
  )
  return ends.slice(1).flatMap((right, i) => {
    const left = ends[i]
    const shift = anchors[right.anchor].frequency - anchors[left.anchor].frequency
    const fromLeft = Math.min(Math.abs(left.offset), Math.abs(right.offset + shift))
    const fromRight = Math.min(Math.abs(right.offset), Math.abs(left.offset - shift))
    const panel =
      fromLeft <= fromRight
        ? { anchor: left.anchor, from: left.offset, to: right.offset + shift }
        : { anchor: right.anchor, from: left.offset - shift, to: right.offset }
    return panel.to > panel.from ? [panel] : []
  })
}

/** Nodes of the rule on all panels, ascending as the panels are, with their weights. */
function nodesOver(anchors: readonly Anchor[], panels: readonly Panel[]): { points: Points; weights: Float64Array } {
  const size = panels.length * nodesPerPanel
  const points = {
    anchors,
    frequency: new Float64Array(size),
    anchor: new Int32Array(size),
    offset: new Float64Array(size),
  }
  const weights = new Float64Array(size)
  for (const [i, { anchor, from, to }] of panels.entries()) {
    for (let k = 0; k < nodesPerPanel; k++) {
      const at = i * nodesPerPanel + k
      const offset = (from + to) / 2 + (rule.nodes[k] * (to - from)) / 2
      points.anchor[at] = anchor
      points.offset[at] = offset
      points.frequency[at] = anchors[anchor].frequency + offset
      weights[at] = (rule.weights[k] * (to - from)) / 2
    }
  }
  return { points, weights }
}

/**
 * Final occupancy n_f = (⟨q²⟩ + ⟨p²⟩)/2 − ½ about the bare frequency, light on, q = x/(√2 x_zp) and p likewise, from
 * ⟨x²⟩ = ∫S_x df and ⟨p²⟩ = m²∫ω²S_x df over one-sided S_x of the actual motion, by Gauss–Legendre panels around the poles of the network.
 * For white baths it equals the Lyapunov solution.
 */
export function finalOccupancy(network: Network, poles: readonly Pole[], mode: Mode): number {
  const anchors = poleAnchors(poles)
  const fastest = Math.max(...poles.map(pole => Math.hypot(pole.omega.re, pole.omega.im))) / (2 * Math.PI)
  const motion = motionOf(network, mode)
  const lowest =
    lowestOf(motion) * Math.min(...anchors.filter(a => a.frequency > 0).map(a => a.frequency), mode.frequency)
  const { points, weights } = nodesOver(anchors, panelsOver(anchors, lowest, 1e9 * fastest))
  const total = totalDensity(motion, points)
  let x = 0
  let p = 0
  for (let i = 0; i < total.length; i++) {
    const density = total[i] * weights[i]
    x += density
    p += density * (2 * Math.PI * points.frequency[i]) ** 2
  }
  const zeroPoint = mode.zeroPoint!
  const momentum = (reducedPlanckConstant / (2 * zeroPoint)) ** 2
  return (x / zeroPoint ** 2 + (p * mode.mass ** 2) / momentum) / 4 - 0.5
}

const frequencyOf = (anchors: readonly Anchor[], { anchor, offset }: Point): number =>
  anchors[anchor].frequency + offset
