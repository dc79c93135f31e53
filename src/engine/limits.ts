import type { LimitCurve } from '../model/evaluation.js'
import type { Network } from '../model/network.js'
import { reducedPlanckConstant as hbar } from '../physics/constants.js'
import { transfer, type Adjoint } from './adjoint.js'
import { quadratic } from './densities.js'
import { addForms, constantForm, isZeroForm, negateForm, scaleForm, zeroForm, type Form } from './form.js'
import { oscillator } from './oscillator.js'
import { constantReal, scaleReal, type Real } from './real.js'
import type { Tape } from './tape.js'

export type LimitPlan = Pick<LimitCurve, 'id' | 'title' | 'bounds' | 'about'> & { readonly psd: Real }

/** χ_s = Σ c_k²χ_k, response of the sensed coordinate to a force on it, light off. */
function bareResponse(tape: Tape, network: Network): Form {
  return network.sensing.weights.reduce((sum, { mode, weight }) => {
    const { mass, frequency, gamma, phi } = mode
    const response = tape.reciprocal(oscillator(tape, { mass, frequency, gamma, phi }))
    return addForms(sum, scaleForm(response, { re: weight * weight, im: 0 }))
  }, zeroForm)
}

const texts = {
  sql: {
    title: 'Standard quantum limit',
    bounds: 'none',
    about: 'The least noise that a detector without correlations adds at its best strength; correlations can pass it.',
  },
  correlation_limit: {
    title: 'Correlation limit',
    bounds: 'added',
    about: 'The least noise that any stationary linear detector adds, correlations included.',
  },
  zero_point: {
    title: 'Zero-point noise',
    bounds: 'none',
    about: 'The noise of the mechanical bath at zero temperature.',
  },
  energy_bound: {
    title: 'Energy-fluctuation bound',
    bounds: 'added',
    about: 'What the fluctuations of the force of light leave open; no detector that uses this light adds less.',
  },
} as const

/** The limits of a network, referred to the measurand like a displacement of the sensed coordinate. */
export function planLimits(tape: Tape, network: Network, adjoint: Adjoint, inverseResponse: Real): LimitPlan[] {
  const { sensing } = network
  const chi = bareResponse(tape, network)
  const coordinate = coordinateTransfer(tape, network, adjoint, chi)
  if (isZeroForm(chi) || isZeroForm(coordinate)) return []
  const referred = (displacement: Real): Real =>
    tape.product(displacement, tape.product(tape.abs2(coordinate), inverseResponse))
  const damped = sensing.weights.some(({ mode }) => mode.gamma > 0 || mode.phi > 0)
  const limits: LimitPlan[] = [{ id: 'sql', ...texts.sql, psd: referred(scaleReal(tape.modulus(chi), 2 * hbar)) }]
  if (damped) {
    const dissipative = referred(scaleReal(tape.absImaginary(chi), 2 * hbar))
    limits.push({ id: 'correlation_limit', ...texts.correlation_limit, psd: dissipative })
    limits.push({ id: 'zero_point', ...texts.zero_point, psd: dissipative })
  }
  const bound = energyBound(tape, network, adjoint, chi)
  if (bound !== null) limits.push({ id: 'energy_bound', ...texts.energy_bound, psd: referred(bound) })
  return limits
}

/**
 * R_x, what the record makes of a displacement of the sensed coordinate. Where the light is far stiffer than a mode at its resonance, the
 * motion undoes the displacement, and in clamped + moved all digits cancel: with one cavity it is the clamped transfer over 1 − k_opt χ_s.
 */
function coordinateTransfer(tape: Tape, network: Network, adjoint: Adjoint, chi: Form): Form {
  const { light, injection } = network.sensing
  if (light === null || network.cavities.length !== 1) return transfer(tape, adjoint.full, injection, true)
  const stiffness = transfer(tape, adjoint.clampedRow(light), injection, false)
  return tape.divide(transfer(tape, adjoint.clamped, injection, true), loopForm(tape, stiffness, chi))
}

/** 1 − k_opt χ_s. */
function loopForm(tape: Tape, stiffness: Form, chi: Form): Form {
  return addForms(constantForm({ re: 1, im: 0 }), negateForm(tape.multiply(stiffness, chi)))
}

/** ħ²/S_F of a readout that states the force with which it pushes. */
function statedBound(tape: Tape, network: Network): Real | null {
  const force = (network.sensing.push ?? []).map(({ source, force }) => {
    const { vacuum } = network.sources.find(each => each.id === source)!
    const none = network.unknowns.map(() => zeroForm)
    return quadratic(
      tape,
      force.map(node => transfer(tape, none, { rows: [], ...node }, true)),
      vacuum,
    )
  })
  const shaken = tape.sum(force)
  return shaken.scale === 0 ? null : tape.ratio(constantReal(hbar * hbar), shaken)
}

/** ħ²|1 − k_opt χ_s|²/S_F^ba as a displacement [Braginsky, Khalili 1992; Tsang et al. 2011]; null without light. */
function energyBound(tape: Tape, network: Network, adjoint: Adjoint, chi: Form): Real | null {
  const { light, injection } = network.sensing
  if (light === null) return statedBound(tape, network)
  const row = adjoint.clampedRow(light)
  const stiffness = transfer(tape, row, injection, false)
  const force = network.sources
    .filter(source => source.parted && source.nodes.some(node => node.rows.length > 0))
    .flatMap(source => {
      const t = source.nodes.map(node => transfer(tape, row, node, false))
      return [source.vacuum, ...(source.heating === null ? [] : [source.heating])].map(block =>
        quadratic(tape, t, block),
      )
    })
  const loop = loopForm(tape, stiffness, chi)
  const shaken = tape.sum(force)
  if (shaken.scale === 0) return null
  return tape.ratio(tape.product(constantReal(hbar * hbar), tape.abs2(loop)), shaken)
}
