import { describe, expect, it } from 'vitest'
import { noiseBandwidthInBins } from '../../src/physics/windows.js'
import { uniformNumbers } from '../reference/uniform.js'
import { readTable } from './table-fixture.js'

/** One noise: frequencies in Hz over the band and around it, one-sided force density in N²/Hz. */
const random = uniformNumbers(20261201)
const noise = Array.from({ length: 60 }, (_, i) => ({
  f: 1.15e6 + 2.9e3 * i + 1e3 * random(),
  S: 4e-36 * (1.24e6 / (1.15e6 + 2.9e3 * i)) * Math.exp(2 * (random() - 0.5)),
}))

/** The transducer: 2.5 pN/V, so that V²/Hz is S/k². */
const k = 2.5e-12
const R = 50
const B = 30
const log = (x: number) => 10 * Math.log10(x)

interface Convention {
  readonly name: string
  readonly keys: string
  readonly row: (point: { f: number; S: number }) => string
  readonly head?: string
}

const columns = (f: number, value: number) => `${f},${value}`
const bins = noiseBandwidthInBins('hft116d', 4096)

/** How instruments write it; numbers are computed here by the definitions of each, without the code under test. */
const conventions: readonly Convention[] = [
  { name: 'amplitude density of force', keys: 'units: [Hz, N/√Hz]', row: ({ f, S }) => columns(f, Math.sqrt(S)) },
  { name: 'power density of force', keys: 'units: [MHz, aN²/Hz]', row: ({ f, S }) => columns(f / 1e6, S / 1e-36) },
  {
    name: 'amplitude density in V/√Hz',
    keys: 'units: [kHz, V/√Hz]\nscale: 2.5 pN/V',
    row: ({ f, S }) => columns(f / 1e3, Math.sqrt(S) / k),
  },
  {
    name: 'power density in V²/Hz',
    keys: 'units: [Hz, V²/Hz]\nscale: 2.5 pN/V',
    row: ({ f, S }) => columns(f, S / k ** 2),
  },
  {
    name: 'V rms in a bandwidth',
    keys: 'units: [Hz, mV]\nbandwidth: 30 Hz\nscale: 2.5 pN/V',
    row: ({ f, S }) => columns(f, (1e3 * Math.sqrt(S * B)) / k),
  },
  {
    name: 'V peak in a bandwidth',
    keys: 'units: [Hz, V]\nvalues: peak\nbandwidth: 30 Hz\nscale: 2.5 pN/V',
    row: ({ f, S }) => columns(f, (Math.SQRT2 * Math.sqrt(S * B)) / k),
  },
  {
    name: 'V pk as a unit, in a bandwidth',
    keys: 'units: [Hz, V pk]\nbandwidth: 30 Hz\nscale: 2.5 pN/V',
    row: ({ f, S }) => columns(f, (Math.SQRT2 * Math.sqrt(S * B)) / k),
  },
  {
    name: 'V² of a flat top of 4096 samples at 1 MHz, tabs and names',
    keys: 'units: [Hz, V²]\nseparator: tab\ncolumns: [f, power]\nbandwidth: { window: HFT116D, rate: 1 MHz, samples: 4096 }\nscale: 2.5 pN/V',
    head: 'index\tf\tpower\n',
    row: ({ f, S }) => `7\t${f}\t${((S / k ** 2) * bins * 1e6) / 4096}`,
  },
  {
    name: 'dBV in a bandwidth',
    keys: 'units: [Hz, dBV]\nbandwidth: 30 Hz\nscale: 2.5 pN/V',
    row: ({ f, S }) => columns(f, log((S * B) / k ** 2)),
  },
  {
    name: 'dBV/√Hz, semicolons',
    keys: 'units: [Hz, dBV/√Hz]\nseparator: semicolon\nscale: 2.5 pN/V',
    row: ({ f, S }) => `${f}; ${log(S / k ** 2)}`,
  },
  {
    name: 'dBm in 50 Ω in a bandwidth',
    keys: 'units: [Hz, dBm]\nbandwidth: 30 Hz\nresistance: 50 Ω\nscale: 2.5 pN/V',
    row: ({ f, S }) => columns(f, log(((S * B) / k ** 2 / R) * 1e3)),
  },
  {
    name: 'dBm/Hz in 50 Ω, spaces and a third column',
    keys: 'units: [Hz, dBm/Hz]\nseparator: spaces\ncolumns: [1, 3]\nresistance: 50 Ω\nscale: 2.5 pN/V',
    row: ({ f, S }) => `  ${f}   0.5 \t ${log((S / k ** 2 / R) * 1e3)}`,
  },
  {
    name: 'dBm/Hz with a scale from the root of the power',
    keys: 'units: [Hz, dBm/Hz]\nscale: 2.5 pN/√W',
    row: ({ f, S }) => columns(f, log((S / k ** 2) * 1e3)),
  },
  {
    name: 'two-sided power density',
    keys: 'units: [Hz, V²/Hz]\nsides: two\nscale: 2.5 pN/V',
    row: ({ f, S }) => columns(f, S / 2 / k ** 2),
  },
  {
    name: 'phase noise in dBc/Hz',
    keys: 'units: [Hz, dBc/Hz]\nscale: 2.5 pN/rad',
    row: ({ f, S }) => columns(f, log(S / k ** 2 / 2)),
  },
  {
    name: 'phase in rad²/Hz',
    keys: 'units: [Hz, rad²/Hz]\nscale: 2.5 pN/rad',
    row: ({ f, S }) => columns(f, S / k ** 2),
  },
  {
    name: 'relative intensity in dB/Hz',
    keys: 'units: [Hz, dB/Hz]\nscale: 2.5 pN',
    row: ({ f, S }) => columns(f, log(S / k ** 2)),
  },
  {
    name: 'relative intensity in dB in a bandwidth',
    keys: 'units: [Hz, dB]\nbandwidth: 30 Hz\nscale: 2.5 pN',
    row: ({ f, S }) => columns(f, log((S * B) / k ** 2)),
  },
  {
    name: 'frequency noise in Hz/√Hz',
    keys: 'units: [Hz, Hz/√Hz]\nscale: 2.5 pN/Hz',
    row: ({ f, S }) => columns(f, Math.sqrt(S) / k),
  },
  {
    name: 'dB over 1 V²/Hz',
    keys: 'units: [Hz, dB(V²/Hz)]\nscale: 2.5 pN/V',
    row: ({ f, S }) => columns(f, log(S / k ** 2)),
  },
  {
    name: 'volts that are meant per root hertz',
    keys: 'units: [Hz, V]\ndensity: amplitude\nscale: 2.5 pN/V',
    row: ({ f, S }) => columns(f, Math.sqrt(S) / k),
  },
]

describe('one noise in the conventions of instruments', () => {
  it.each(conventions)('$name', ({ keys, row, head = '' }) => {
    const file = head + noise.map(row).join('\n')
    const { table, psd } = readTable(`file: x.csv\n${keys}`, file)
    expect(psd).toHaveLength(noise.length)
    noise.forEach(({ f, S }, i) => {
      expect(Math.abs((table.frequency[i] ?? NaN) / f - 1)).toBeLessThan(1e-15)
      expect(Math.abs((psd[i] ?? NaN) / S - 1)).toBeLessThan(1e-9)
    })
  })

  it('upside down and with what lies outside the band of the instrument', () => {
    const { table, psd } = readTable(
      'file: x.csv\nunits: [Hz, N²/Hz]\norder: any\nkeep: 1 MHz to 2 MHz',
      ['0,0', '-5,', ...noise.map(({ f, S }) => `${f},${S}`), '3e6,NaN'].reverse().join('\n'),
    )
    expect([...table.frequency]).toEqual(noise.map(({ f }) => f))
    expect(psd).toEqual(noise.map(({ S }) => S))
  })
})

describe('published conversions', () => {
  const density = (keys: string, value: number) =>
    readTable(`file: x.csv\noutside: constant\n${keys}`, `1e6,${value}\n2e6,${value}\n`).psd[0] ?? NaN

  // sqrt(1 mW 10^(x/10) R): standard; half of the open-circuit noise of 50 Ω at 290 K, into a matched load.
  it('-174 dBm/Hz in 50 Ω is 0.446 nV/√Hz', () => {
    const psd = density('units: [Hz, dBm/Hz]\nresistance: 50 Ω\nscale: 1 N/V', -174)
    expect(Math.abs(Math.sqrt(psd) / 4.461542169214018e-10 - 1)).toBeLessThan(1e-6)
  })

  // P − 10 log₁₀(B): standard, B being the noise bandwidth.
  it('-100 dBm in 10 kHz is -140 dBm/Hz', () => {
    const psd = density('units: [Hz, dBm]\nbandwidth: 10 kHz\nscale: 1 N/√W', -100)
    expect(Math.abs((10 * Math.log10(psd / 1e-3)) / -140 - 1)).toBeLessThan(1e-9)
  })

  // A_rms/√(ENBW · bin) [Heinzel, Rüdiger, Schilling 2002].
  it('a line of 1 nm peak in bins of 1 Hz with a Hann window looks like 0.577 nm/√Hz', () => {
    const window = 'bandwidth: { window: hann, rate: 1000 Hz, samples: 1000 }'
    const psd = density(`units: [Hz, nm]\nvalues: peak\n${window}\nscale: 1 N/m`, 1)
    expect(Math.abs(Math.sqrt(psd) / 5.773502691896259e-10 - 1)).toBeLessThan(1e-9)
  })
})
