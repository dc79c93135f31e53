import type { Assessment, CavityState, ModeState } from '../model/assessment.js'
import { occupancyText } from './headlines.js'
import { densityText, frequencyText, numberText, percentText } from './numbers.js'
import { formatQuantity } from '../quantity/format.js'

/** One fact about a mode or a cavity at the working point. */
export interface Fact {
  readonly label: string
  readonly value: string
}

export interface StateBlock {
  readonly id: string
  readonly facts: readonly Fact[]
}

const fact = (label: string, value: string): Fact => ({ label, value })

export function modeBlocks({ modes }: Assessment): readonly StateBlock[] {
  return modes.map(mode => ({ id: mode.id, facts: modeFacts(mode) }))
}

function modeFacts(mode: ModeState): readonly Fact[] {
  const optional = (label: string, value: number | null, text: (value: number) => string): readonly Fact[] =>
    value === null ? [] : [fact(label, text(value))]
  return [
    fact('Frequency, bare', frequencyText(mode.frequency, 7)),
    fact('Frequency, light on', frequencyText(mode.effectiveFrequency, 7)),
    ...shifted('Optical spring', mode.effectiveFrequency - mode.frequency, mode.linewidth),
    fact('Linewidth, bare', frequencyText(mode.linewidth, 3)),
    fact('Linewidth, light on', frequencyText(mode.effectiveLinewidth, 3)),
    ...shifted('Optical damping', mode.effectiveLinewidth - mode.linewidth, mode.linewidth),
    fact('Quanta of its bath', occupancyText(mode.thermalOccupancy)),
    ...optional('Final occupancy', mode.finalOccupancy, quanta =>
      occupancyText(quanta, mode.finalOccupancySpread?.combined),
    ),
    ...optional('In the ground state', mode.finalOccupancy, quanta => percentText(1 / (1 + quanta))),
    ...optional('Zero-point motion', mode.zeroPoint, value => formatQuantity(value, 'm')),
    ...optional('Cooperativity 4g²/κΓ', mode.cooperativity, value => numberText(value, 3)),
    ...optional('Cooperativity over n_th + ½', mode.cooperativity, value =>
      numberText(value / (mode.thermalOccupancy + 0.5), 3),
    ),
    ...optional('Measurement rate Γ_meas/2π', mode.measurementRate, value => frequencyText(value, 3)),
    fact('Decoherence rate Γ(n_th + ½)/2π', frequencyText(mode.decoherenceRate, 3)),
  ]
}

/** A shift by the light, signed; left out where it is below a millionth of the bare linewidth. */
function shifted(label: string, hertz: number, linewidth: number): readonly Fact[] {
  if (Math.abs(hertz) <= 1e-6 * linewidth) return []
  return [fact(label, `${hertz < 0 ? '−' : '+'}${frequencyText(Math.abs(hertz), 3)}`)]
}

export function cavityBlocks(assessment: Assessment): readonly StateBlock[] {
  const { cavities } = assessment
  return cavities.map(cavity => ({
    id: cavity.id,
    facts: [...cavityFacts(cavity), ...(cavities.length === 1 ? pumpFacts(assessment) : [])],
  }))
}

/** The best pump and the end of stability, as factors of the present one. */
function pumpFacts({ pumpRange, unit }: Assessment): readonly Fact[] {
  if (pumpRange === null) return []
  const { best, frequency, stableUpTo, farthest } = pumpRange
  const least =
    best === null
      ? 'outside of the range looked at'
      : `${numberText(best.factor, 2)} times the present: ${densityText(best.asd, unit)}`
  const edge =
    stableUpTo === null
      ? `up to ${numberText(farthest, 2)} times the present at least`
      : `up to ${numberText(stableUpTo, 3)} times the present`
  return [fact(`Best pump at ${frequencyText(frequency)}`, least), fact('Stable with a pump', edge)]
}

function cavityFacts(cavity: CavityState): readonly Fact[] {
  return [
    fact('Linewidth κ/2π', frequencyText(cavity.linewidth, 4)),
    fact('Quanta of the pump', numberText(cavity.quanta, 3)),
    fact('Power at the port', formatQuantity(cavity.pumpPower, 'W')),
    fact('Detuning Δ/2π', frequencyText(cavity.detuning, 4)),
    ...(cavity.linearity === null
      ? []
      : [fact('Rms motion times G over κ/2, without a lock', numberText(cavity.linearity, 2))]),
    ...cavity.ports.map(port =>
      fact(
        `Port ${port.id}`,
        `κ/2π ${frequencyText(port.rate, 4)}, ${port.occupancy === 0 ? 'vacuum' : `${occupancyText(port.occupancy)} quanta`}`,
      ),
    ),
  ]
}
