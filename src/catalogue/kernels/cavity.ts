import type { Complex, Covariance, Mode, WorkingPoint } from '../../model/network.js'
import { Refusal } from '../../model/problem.js'
import { complex, magnitude, multiply, phase, scale } from '../../physics/complex.js'
import { reducedPlanckConstant } from '../../physics/constants.js'
import { addBlocks, squeezedBlock, thermalBlock } from '../../physics/covariance.js'
import { intracavityQuanta, pumpPower } from '../../physics/photons.js'
import { occupancy } from '../../physics/quanta.js'
import type { declaration } from '../declarations/cavity.js'
import { noDirect, type Assembly, type Instance, type Kernel } from '../kernel.js'
import type { ValuesOf } from '../values.js'

type Values = ValuesOf<typeof declaration.fields>
type Port = Values['ports'] extends ReadonlyMap<string, infer P> ? P : never

/** Weights of the sensed coordinate as modes, in the order of the file. */
function sensedModes(instance: Instance<Values>, net: Assembly): { mode: Mode; weight: number }[] {
  return [...instance.values.modes].map(([id, weight]) => ({ mode: net.modeOf(id), weight }))
}

/** G in rad/s/m: as stated, or g₀/x_zp of the one mode. */
function couplingPerMetre(instance: Instance<Values>, modes: readonly { mode: Mode; weight: number }[]): number {
  const { coupling, g0 } = instance.values
  if (coupling !== undefined) return coupling
  const zeroPoint = modes[0]?.mode.zeroPoint
  if (g0 === undefined || zeroPoint === null || zeroPoint === undefined) {
    throw new Refusal([
      {
        severity: 'error',
        code: 'no-zero-point',
        place: instance.place('g0'),
        message: `\`g0\` needs one oscillator of weight 1; give \`coupling\`, the frequency shift per metre`,
      },
    ])
  }
  return g0 / zeroPoint
}

/** Fixed numbers of the working point. ā = √n̄ is real: it sets the phase of every field. */
export function workingPoint(instance: Instance<Values>, coupling: number): WorkingPoint {
  const { frequency, ports, pump } = instance.values
  const kappa = [...ports.values()].reduce((sum, port) => sum + port.rate, 0)
  const carrier = {
    kappa,
    coupled: ports.get(pump.port)!.rate,
    detuning: pump.detuning,
    omega: 2 * Math.PI * frequency + pump.detuning,
  }
  const quanta = pump.quanta ?? intracavityQuanta(pump.power!, carrier)
  return {
    id: instance.id,
    kappa,
    detuning: pump.detuning,
    quanta,
    coupling,
    pumpPower: pumpPower(quanta, carrier),
    ports: [...ports].map(([id, port]) => ({ id, rate: port.rate, occupancy: portOccupancy(port, frequency, quanta) })),
    place: instance.place('pump'),
  }
}

/** Quanta of a port's bath at n̄: of its temperature, or base + rise·(n̄/at)^exponent. */
function portOccupancy(port: Port, frequency: number, quanta: number): number {
  if (port.temperature !== undefined) return occupancy(2 * Math.PI * frequency, port.temperature)
  if (port.occupancy === undefined) return 0
  const { base, rise, at, exponent } = port.occupancy
  return rise === 0 ? base : base + rise * (quanta / at) ** exponent
}

/** Mean field that leaves a port, over ā: (κ_d − κ/2 + iΔ)/√κ_d by reflection of the pump, √κ_d otherwise. */
function outgoingCarrier(point: WorkingPoint, rate: number, pumped: boolean): Complex {
  return pumped ? scale(complex(rate - point.kappa / 2, point.detuning), 1 / Math.sqrt(rate)) : complex(Math.sqrt(rate))
}

function addPort(
  instance: Instance<Values>,
  net: Assembly,
  point: WorkingPoint,
  fields: readonly [number, number],
  name: string,
): void {
  const port = instance.values.ports.get(name)!
  const pumped = instance.values.pump.port === name
  const { occupancy: quanta, rate } = point.ports.find(p => p.id === name)!
  // The squeezing angle counts from the carrier that enters, whose phase in the frame of ā is arg(κ/2 − iΔ).
  const angle = (port.squeezing?.angle ?? 0) + Math.atan2(-point.detuning, point.kappa / 2)
  const kept = 1 - (port.squeezing?.injection_loss ?? 0)
  const block = (strength: number): Covariance =>
    port.squeezing ? squeezedBlock(strength * kept, { ...port.squeezing, angle }) : thermalBlock(strength)
  const id = `${instance.id}.${name}`
  const root = complex(Math.sqrt(rate))
  net.source({
    id,
    title: `${instance.title} ${name}`,
    family: 'imprecision',
    readout: true,
    owner: instance.id,
    channel: name,
    ownUnit: 'quanta',
    ownFactor: quanta + 0.5,
    nodes: fields.map(row => ({ rows: [{ row, value: root }], direct: noDirect })),
    vacuum: addBlocks(block(0.5), thermalBlock(0.5 * (1 - kept))),
    heating: quanta > 0 ? block(quanta) : null,
    shape: { form: 'constant', value: 1 },
    parted: true,
  })
  const mean = outgoingCarrier(point, rate, pumped)
  const vanishes = magnitude(mean) < 1e-9 * Math.sqrt(point.kappa)
  net.output(id, {
    senses: () => instance.id,
    carrier: () => (vanishes ? null : phase(mean)),
    frequency: () => instance.values.frequency + point.detuning / (2 * Math.PI),
    amplified: () => false,
    read(u, v) {
      net.record(fields[0], multiply(u, root))
      net.record(fields[1], multiply(v, root))
      net.direct(id, 0, scale(u, -1))
      net.direct(id, 1, scale(v, -1))
    },
  })
}

/** Equations of the field and its conjugate, and the force of light on the modes (see the declaration's equations). */
function stampFields(
  net: Assembly,
  point: WorkingPoint,
  modes: readonly { mode: Mode; weight: number }[],
  fields: readonly [number, number],
): void {
  const mean = Math.sqrt(point.quanta)
  const push = point.coupling * mean
  net.stamp(fields[0], fields[0], { form: 'decay', half: point.kappa / 2, detuning: point.detuning })
  net.stamp(fields[1], fields[1], { form: 'decay', half: point.kappa / 2, detuning: -point.detuning })
  for (const { mode, weight } of modes) {
    net.stamp(fields[0], mode.unknown, { form: 'constant', value: complex(0, -push * weight) })
    net.stamp(fields[1], mode.unknown, { form: 'constant', value: complex(0, push * weight) })
    const force = { form: 'constant', value: complex(-reducedPlanckConstant * push * weight) } as const
    net.stamp(mode.unknown, fields[0], force)
    net.stamp(mode.unknown, fields[1], force)
  }
}

export const kernel: Kernel<Values> = {
  stage: 'field',
  assemble(instance, net) {
    const modes = sensedModes(instance, net)
    const point = workingPoint(instance, couplingPerMetre(instance, modes))
    const fields = net.field(instance.id)
    stampFields(net, point, modes, fields)
    net.workingPoint(point)
    const push = point.coupling * Math.sqrt(point.quanta)
    const force = complex(reducedPlanckConstant * push)
    net.sensing({
      id: instance.id,
      weights: modes,
      injection: {
        rows: [
          { row: fields[0], value: complex(0, push) },
          { row: fields[1], value: complex(0, -push) },
        ],
        direct: noDirect,
      },
      light: [
        { column: fields[0], value: force },
        { column: fields[1], value: force },
      ],
    })
    for (const name of instance.values.ports.keys()) addPort(instance, net, point, fields, name)
  },
}
