import type { Assessment, CavityState, ModeState } from '../model/assessment.js'
import { occupancyText } from './headlines.js'
import { frequencyText, numberText } from './numbers.js'
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
    fact('Linewidth, bare', frequencyText(mode.linewidth, 3)),
    fact('Linewidth, light on', frequencyText(mode.effectiveLinewidth, 3)),
    fact('Quanta of its bath', occupancyText(mode.thermalOccupancy)),
    ...optional('Final occupancy', mode.finalOccupancy, quanta =>
      occupancyText(quanta, mode.finalOccupancySpread?.combined),
    ),
    ...optional('Zero-point motion', mode.zeroPoint, value => formatQuantity(value, 'm')),
    ...optional('Cooperativity 4g²/κΓ', mode.cooperativity, value => numberText(value, 3)),
  ]
}

export function cavityBlocks({ cavities }: Assessment): readonly StateBlock[] {
  return cavities.map(cavity => ({ id: cavity.id, facts: cavityFacts(cavity) }))
}

function cavityFacts(cavity: CavityState): readonly Fact[] {
  return [
    fact('Linewidth κ/2π', frequencyText(cavity.linewidth, 4)),
    fact('Quanta of the pump', numberText(cavity.quanta, 3)),
    fact('Power at the port', formatQuantity(cavity.pumpPower, 'W')),
    fact('Detuning Δ/2π', frequencyText(cavity.detuning, 4)),
    ...cavity.ports.map(port =>
      fact(
        `Port ${port.id}`,
        `κ/2π ${frequencyText(port.rate, 4)}, ${port.occupancy === 0 ? 'vacuum' : `${occupancyText(port.occupancy)} quanta`}`,
      ),
    ),
  ]
}
