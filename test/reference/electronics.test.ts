import { describe, expect, test } from 'vitest'
import { boltzmannConstant } from '../../src/physics/constants.js'
import {
  addedQuantaOfChain,
  johnsonCurrentPsd,
  johnsonVoltagePsd,
  leastAddedQuanta,
  noiseFigure,
  noiseTemperatureOfFigure,
  noiseTemperatureOfQuanta,
  quantaOfNoiseTemperature,
  quantumFlux,
  rmsInBand,
  shotCurrentPsd,
} from '../../src/physics/electronics.js'
import { intracavityQuanta } from '../../src/physics/photons.js'
import { toDeclared } from '../../src/quantity/declared.js'
import { parseQuantity } from '../../src/quantity/parse.js'
import { deviation, type Check } from './check.js'

const handbook = 'Horowitz, Hill, The Art of Electronics, ch. 8, from memory'
/** Handbook values are those of frequencies far below kT/h; at 1 kHz the quantum correction is under 1e-19. */
const low = 1e3
const watts = (text: string): number => toDeclared(parseQuantity(text), 'power').value
const rate = (text: string): number => toDeclared(parseQuantity(text), 'rate').value
const johnson = (resistance: number, temperature: number): number => johnsonVoltagePsd(resistance, low, temperature)

/** Tolerances: 1e-6 for recomputed values, otherwise the rounding of the printed number. */
const checks: readonly Check[] = [
  {
    quantity: 'voltage noise of 1 kΩ at 290 K in V/√Hz',
    computed: () => Math.sqrt(johnson(1e3, 290)),
    expected: 4.001940579269013e-9,
    tolerance: 1e-6,
    source: `${handbook}: 4 nV/√Hz`,
  },
  {
    quantity: 'voltage noise of 50 Ω at 290 K in V/√Hz',
    computed: () => Math.sqrt(johnson(50, 290)),
    expected: 8.948611177160397e-10,
    tolerance: 1e-6,
    source: `${handbook}: 0.9 nV/√Hz; the rule of thumb 1 nV is 12 % too much`,
  },
  {
    quantity: '1 kΩ at 290 K in 10 kHz, rms in V',
    computed: () => rmsInBand(johnson(1e3, 290), 1e4),
    expected: 4e-7,
    tolerance: 0.005,
    source: 'glossary of noise voltage: 400 nV',
  },
  {
    quantity: '1 kΩ at 300 K in 1 kHz, rms in V',
    computed: () => rmsInBand(johnson(1e3, 300), 1e3),
    expected: 1.2871591976131003e-7,
    tolerance: 1e-6,
    source: '√(4kTRB), recomputed; a calculator page prints a wrong value for it',
  },
  {
    quantity: '10 kΩ at 20 °C in 10 kHz, rms in V',
    computed: () => rmsInBand(johnson(1e4, 293.15), 1e4),
    expected: 1.3e-6,
    tolerance: 0.03,
    source: `${handbook}: 1.3 µV`,
  },
  {
    quantity: '4kT at 20 °C in V²/(Hz Ω)',
    computed: () => johnson(1, 293.15),
    expected: 1.62e-20,
    tolerance: 0.005,
    source: `${handbook}: 1.62e-20`,
  },
  {
    quantity: 'current noise of 1 MΩ at 300 K in A/√Hz',
    computed: () => Math.sqrt(johnsonCurrentPsd(1e6, low, 300)),
    expected: 1.2871591976131004e-13,
    tolerance: 1e-6,
    source: '√(4kT/R)',
  },
  {
    quantity: 'shot noise of 1 pA in 10 kHz, rms in A',
    computed: () => rmsInBand(shotCurrentPsd(1e-12), 1e4),
    expected: 5.7e-14,
    tolerance: 0.01,
    source: `${handbook}: 57 fA`,
  },
  {
    quantity: 'shot noise of 0.5 mA in 10 kHz, rms in A',
    computed: () => rmsInBand(shotCurrentPsd(5e-4), 1e4),
    expected: 1.266e-9,
    tolerance: 0.001,
    source: 'worked answer of an assignment: 1.266 nA',
  },
  {
    quantity: 'noise temperature of a noise figure of 0.5 dB in K',
    computed: () => noiseTemperatureOfFigure(0.5),
    expected: 35.4,
    tolerance: 0.001,
    source: 'tables of noise figure and temperature: 35.4 K',
  },
  {
    quantity: 'noise temperature of a noise figure of 7 dB in K',
    computed: () => noiseTemperatureOfFigure(7),
    expected: 1163,
    tolerance: 0.001,
    source: 'tables of noise figure and temperature: 1163 K',
  },
  {
    quantity: 'added quanta of a 4 K amplifier at 5 GHz',
    computed: () => quantaOfNoiseTemperature(4, 5e9),
    expected: 16.66929529866206,
    tolerance: 1e-6,
    source: 'kT/hf; quoted as about 17',
  },
  {
    quantity: 'least added quanta at a power gain of 100',
    computed: () => leastAddedQuanta(100),
    expected: 0.495,
    tolerance: 1e-9,
    source: 'Haus, Mullen, Phys. Rev. 128, 2407 (1962); Caves, Phys. Rev. D 26, 1817 (1982)',
  },
  {
    quantity: 'half a quantum with 20 dB of gain before a 4 K amplifier at 5 GHz',
    computed: () =>
      addedQuantaOfChain([
        { added: 0.5, gain: toDeclared(parseQuantity('20 dB'), 'power-ratio').value },
        { added: quantaOfNoiseTemperature(4, 5e9), gain: 1e4 },
      ]),
    expected: 0.6666929529866206,
    tolerance: 1e-6,
    source: 'formula of Friis in quanta',
  },
  {
    quantity: 'noise temperature of half a quantum at 5 GHz in K',
    computed: () => noiseTemperatureOfQuanta(0.5, 5e9),
    expected: 0.11998107683415551,
    tolerance: 1e-6,
    source: 'Caves, Phys. Rev. D 26, 1817 (1982): 0.12 K',
  },
  {
    quantity: 'quanta per second of -60 dBm at 5 GHz',
    computed: () => quantumFlux(watts('-60 dBm'), 5e9),
    expected: 301838035928430.44,
    tolerance: 1e-6,
    source: 'P/hf',
  },
  {
    quantity: 'quanta in a cavity of 200 kHz, 150 kHz of it coupled, -60 dBm at 5 GHz, on resonance',
    computed: () => cavityQuanta('0 Hz'),
    expected: 720585231.4673821,
    tolerance: 1e-6,
    source: 'Aspelmeyer, Kippenberg, Marquardt, Rev. Mod. Phys. 86, 1391 (2014)',
  },
  {
    quantity: 'the same, detuned by 1 MHz',
    computed: () => cavityQuanta('1 MHz'),
    expected: 7134507.242251307,
    tolerance: 1e-6,
    source: 'Aspelmeyer, Kippenberg, Marquardt, Rev. Mod. Phys. 86, 1391 (2014)',
  },
]

function cavityQuanta(detuning: string): number {
  return intracavityQuanta(watts('-60 dBm'), {
    kappa: rate('200 kHz'),
    coupled: rate('150 kHz'),
    detuning: rate(detuning),
    omega: rate('5 GHz'),
  })
}

describe('noise of electronics against handbooks', () => {
  test.each(checks)('$quantity', check => {
    expect(deviation(check), check.source).toBeLessThanOrEqual(check.tolerance)
  })

  test('a wrong value of a calculator page is not met: 1.28e-8 nV/√Hz for 1 kΩ at 300 K in 1 kHz', () => {
    expect(rmsInBand(johnson(1e3, 300), 1e3) / 1.28e-17).toBeGreaterThan(1e9)
  })

  test('noise figure and temperature, quanta and temperature invert each other', () => {
    for (const figure of [1e-6, 0.5, 7, 60])
      expect(noiseFigure(noiseTemperatureOfFigure(figure)) / figure).toBeCloseTo(1, 9)
    expect(noiseTemperatureOfQuanta(quantaOfNoiseTemperature(3.7, 6e9), 6e9)).toBeCloseTo(3.7, 12)
  })

  test('limits: Johnson noise is 4kTR at low frequency and 2Rhf at absolute zero', () => {
    expect(johnsonVoltagePsd(50, 1, 300) / (4 * boltzmannConstant * 300 * 50)).toBeCloseTo(1, 14)
    expect(johnsonVoltagePsd(50, 5e9, 0) / (2 * 50 * 6.62607015e-34 * 5e9)).toBeCloseTo(1, 14)
    expect(johnsonVoltagePsd(0, 1, 300)).toBe(0)
  })

  test('an amplifier of gain 1 may add nothing, one of infinite gain at least half a quantum', () => {
    expect(leastAddedQuanta(1)).toBe(0)
    expect(leastAddedQuanta(Infinity)).toBe(0.5)
    expect(addedQuantaOfChain([])).toBe(0)
  })
})
