import type { Mode, Shape } from '../../model/network.js'
import { Refusal } from '../../model/problem.js'
import { complex } from '../../physics/complex.js'
import { occupancy, zeroPointAmplitude } from '../../physics/quanta.js'
import { into, type Assembly, type Instance, type Kernel } from '../kernel.js'
import type { ValuesOf } from '../values.js'
import type { declaration } from '../declarations/resonator.js'
import type { modeFields } from '../declarations/resonator.js'

type ModeValues = ValuesOf<typeof modeFields>

/** One way of losing energy: loss angle at resonance (1/Q), law, temperature. */
interface Channel {
  readonly name: string
  readonly angle: number
  readonly law: 'viscous' | 'structural'
  readonly temperature: number
}

/** Splits the damping into channels: `bath` alone, or those of `losses`, of which one without a number takes the rest of the total. */
export function lossChannels(instance: Instance<ModeValues>): Channel[] {
  const { quality, law, losses, temperature } = instance.values
  const total = quality === undefined ? null : 1 / quality
  if (losses === undefined) {
    if (total === null) throw missing(instance, 'quality', 'a quality factor or `losses`')
    return [{ name: 'bath', angle: total, law, temperature: warm(instance, temperature, 'temperature') }]
  }
  const angles = new Map<string, number | null>()
  for (const [name, loss] of losses) {
    if (loss.quality !== undefined) angles.set(name, 1 / loss.quality)
    else if (loss.share !== undefined && total !== null) angles.set(name, loss.share * total)
    else angles.set(name, null)
  }
  const stated = [...angles.values()].reduce<number>((sum, angle) => sum + (angle ?? 0), 0)
  const open = [...angles.values()].filter(angle => angle === null).length
  checkDivision(instance, { total, stated, open })
  return [...losses].map(([name, loss]) => ({
    name,
    angle: angles.get(name) ?? (total ?? 0) - stated,
    law: loss.law,
    temperature: warm(instance, loss.temperature ?? temperature, `losses.${name}.temperature`),
  }))
}

/** The channels must make up the total that the file states, to a part in a million. */
function checkDivision(
  instance: Instance<ModeValues>,
  { total, stated, open }: { total: number | null; stated: number; open: number },
): void {
  if (open > 1) throw missing(instance, 'losses', 'a quality factor or a share for all channels but one')
  if (open === 1 && total === null)
    throw missing(instance, 'losses', 'a total `quality` that the channel without a number can take the rest of')
  if (total === null) return
  const rest = (total - stated) / total
  if (open === 1 ? rest <= 0 : Math.abs(rest) > 1e-6) {
    throw refusal(
      instance,
      'losses',
      'loss-sum',
      `the channels of \`${instance.id}\` lose ${stated.toPrecision(4)} in 1/Q, the total quality says ${total.toPrecision(4)}: change one of them, or leave one channel without a number to take the rest`,
    )
  }
}

function warm(instance: Instance<ModeValues>, temperature: number | undefined, path: string): number {
  if (temperature === undefined) throw missing(instance, path, 'a temperature of its bath, such as `4.1 K`')
  return temperature
}

function missing(instance: Instance<ModeValues>, path: string, what: string): Refusal {
  return refusal(instance, path, 'missing', `\`${instance.id}\` needs ${what}`)
}

function refusal(instance: Instance<ModeValues>, path: string, code: string, message: string): Refusal {
  return new Refusal([{ severity: 'error', code, place: instance.place(path), message }])
}

/** Thermal force of one channel, one-sided [Callen, Welton 1951]. */
function bathShape(channel: Channel, mass: number, omega0: number): Shape {
  const strength = channel.law === 'viscous' ? mass * omega0 * channel.angle : mass * omega0 * omega0 * channel.angle
  return {
    form: channel.law === 'viscous' ? 'viscous bath' : 'structural bath',
    strength,
    temperature: channel.temperature,
  }
}

/** Puts a mode with a restoring force into the network; shared by all kinds that are one. */
export function assembleMode(
  instance: Instance<ModeValues>,
  net: Assembly,
  { movedMass, strainLength }: { movedMass: number | null; strainLength?: number },
): void {
  const { mass, frequency } = instance.values
  const omega0 = 2 * Math.PI * frequency
  const channels = lossChannels(instance)
  const sum = (law: Channel['law']) => channels.filter(c => c.law === law).reduce((total, c) => total + c.angle, 0)
  const gamma = omega0 * sum('viscous')
  const phi = sum('structural')
  const unknown = net.displacement(instance.id)
  net.stamp(unknown, unknown, { form: 'oscillator', mass, frequency, gamma, phi })
  const mode: Mode = {
    id: instance.id,
    unknown,
    mass,
    frequency,
    gamma,
    phi,
    movedMass,
    ...(strainLength !== undefined && { strainMoment: (mass * strainLength) / 2 }),
    thermalOccupancy:
      channels.reduce((n, c) => n + c.angle * occupancy(omega0, c.temperature), 0) /
      channels.reduce((n, c) => n + c.angle, 0),
    zeroPoint: zeroPointAmplitude(mass, omega0),
  }
  net.mode(mode)
  for (const channel of channels) {
    net.source({
      id: `${instance.id}.${channel.name}`,
      title: `${instance.title} ${channel.name}`,
      family: 'thermal',
      readout: false,
      owner: instance.id,
      channel: channel.name,
      ownUnit: 'N²/Hz',
      ownFactor: 1,
      nodes: [into(unknown, complex(1))],
      vacuum: [[complex(1)]],
      heating: null,
      shape: bathShape(channel, mass, omega0),
      parted: false,
    })
  }
}

export const kernel: Kernel<ValuesOf<typeof declaration.fields>> = {
  stage: 'mechanical',
  assemble(instance, net) {
    const { moved_mass: movedMass = null, strain_length: strainLength } = instance.values
    assembleMode(instance, net, { movedMass, ...(strainLength !== undefined && { strainLength }) })
  },
}
