import { describe, expect, it } from 'vitest'
import { firstLine, told } from './table-fixture.js'

// Wording by case: keys of the table, the file, and every line that is said. `@` stands for the budget and the line of the
// first key; `@1` for the next one, and so on.
const fine = '1.1e6,2\n1.4e6,3\n'
const named = 'f,noise,noise 2\n1.1e6,2,3\n1.4e6,3,4\n'
const volts = 'file: x.csv\nunits: [Hz, V]'

const cases: readonly (readonly [string, string, string, readonly string[]])[] = [
  // How rows are written.
  [
    'a separator that is none',
    'file: x.csv\nunits: [Hz, N/√Hz]\nseparator: commas',
    fine,
    [
      '@2:18: `commas` is not allowed for `separator`; allowed are `comma`, `semicolon`, `tab`, `spaces`; did you mean `comma`?',
    ],
  ],
  [
    'semicolons that are not stated',
    'file: x.csv\nunits: [Hz, N/√Hz]',
    '1.1e6;2\n1.4e6;3\n',
    [
      'x.csv:1:1: this row has one cell; frequency and density are two, with a comma between them; if a semicolon parts its cells, state `separator: semicolon`',
      'x.csv:2:1: this row has one cell; frequency and density are two, with a comma between them; if a semicolon parts its cells, state `separator: semicolon`',
    ],
  ],
  [
    'decimal commas between semicolons',
    'file: x.csv\nunits: [MHz, aN/√Hz]\nseparator: semicolon',
    '1,1;2\n1.4;2,5e0\n',
    [
      'x.csv:1:1: `1,1` has a decimal comma; only decimal points are read, so export the file with points',
      'x.csv:2:5: `2,5e0` has a decimal comma; only decimal points are read, so export the file with points',
    ],
  ],
  [
    'decimal commas between semicolons that are not stated',
    'file: x.csv\nunits: [MHz, aN/√Hz]',
    '1,1;2,5\n',
    [
      'x.csv:1:1: this row has 3 cells; frequency and density are two; if a semicolon parts its cells, state `separator: semicolon`',
    ],
  ],
  [
    'tabs that are not stated',
    'file: x.csv\nunits: [Hz, N/√Hz]',
    '1.1e6\t2\n',
    [
      'x.csv:1:1: this row has one cell; frequency and density are two, with a comma between them; if a tab parts its cells, state `separator: tab`',
    ],
  ],
  [
    'a third column that nobody spoke of',
    'file: x.csv\nunits: [Hz, N/√Hz]',
    '1.1e6,2,3\n',
    [
      'x.csv:1:1: this row has 3 cells; frequency and density are two; say which two with `columns`, such as `columns: [1, 3]`',
    ],
  ],
  [
    'a row that is too short',
    'file: x.csv\nunits: [Hz, N/√Hz]\ncolumns: [1, 3]',
    '1.1e6,2,3\n1.2e6,2\n',
    ['x.csv:2:1: this row has 2 cells, but column 3 is wanted'],
  ],
  [
    'a column 0',
    'file: x.csv\nunits: [Hz, N/√Hz]\ncolumns: [0, 1]',
    fine,
    ['@2:17: there is no column 0; columns are counted from 1 to 64'],
  ],
  [
    'one column for both',
    'file: x.csv\nunits: [Hz, N/√Hz]\ncolumns: [2, 2]',
    fine,
    ['@2:20: frequency and density are both taken from column `2`; name the column of each'],
  ],
  ['one column', 'file: x.csv\nunits: [Hz, N/√Hz]\ncolumns: [2]', fine, ['@2:7: `columns` must have at least 2 items']],
  [
    'a name that the header lacks',
    'file: x.csv\nunits: [Hz, N/√Hz]\ncolumns: [f, nois]',
    named,
    ['@2:20: no column is called `nois`; the header has `f`, `noise`, `noise 2`; did you mean `noise`?'],
  ],
  [
    'a name that the header has twice',
    'file: x.csv\nunits: [Hz, N/√Hz]\ncolumns: [f, noise]',
    'f,noise,noise\n1.1e6,2,3\n1.4e6,3,4\n',
    ['@2:20: 2 columns are called `noise`; give the number of the one that is meant'],
  ],
  [
    'a name, but no line for it',
    'file: x.csv\nunits: [Hz, N/√Hz]\ncolumns: [f, noise]\nskip: 0',
    named,
    ['@2:17: `f` is the name of a column, but `skip: 0` leaves no line for names; skip the header'],
  ],
  [
    'a header among the rows',
    'file: x.csv\nunits: [Hz, N/√Hz]\ncolumns: [f, noise]\nskip: 2\nheader: 3',
    named,
    ['@4:15: the header in line 3 must be one of the lines that `skip` passes over, 1 to 2'],
  ],
  [
    'a header for nothing',
    'file: x.csv\nunits: [Hz, N/√Hz]\nheader: 1\nskip: 1',
    named,
    ['@2:15: `header` is the line with the names of columns, but `columns` names none; delete one or name the other'],
  ],
  [
    'a headline that is not skipped',
    'file: x.csv\nunits: [Hz, N/√Hz]',
    'frequency,density\n1.1e6,2\n1.4e6,3\n',
    ['x.csv:1:1: `frequency` is no number with a decimal point; if this is a headline, pass over it with `skip: 1`'],
  ],
  [
    'everything skipped',
    'file: x.csv\nunits: [Hz, N/√Hz]\nskip: 9',
    fine,
    ['@:13: `x.csv` has no rows to read; a table needs two'],
  ],
  [
    'a quotation mark inside a cell',
    'file: x.csv\nunits: [Hz, N/√Hz]',
    '1.1e6,2\n1.4e6,3"\n',
    ['x.csv:2:8: a quotation mark stands inside a cell'],
  ],
  [
    'text behind a closing quotation mark',
    'file: x.csv\nunits: [Hz, N/√Hz]',
    '1.1e6,2\n"1.4e6"7,3\n',
    ['x.csv:2:8: something stands between a closing quotation mark and the end of its cell'],
  ],
  [
    '65 cells',
    'file: x.csv\nunits: [Hz, N/√Hz]\ncolumns: [1, 2]',
    '1,'.repeat(65),
    ['x.csv:1:1: this row has more than 64 cells'],
  ],

  // Numbers.
  [
    'rows out of order',
    'file: x.csv\nunits: [MHz, aN/√Hz]',
    '1.1,2\n1.4,3\n1.3,4\n',
    ['x.csv:3:1: the frequency `1.3` is below that of line 2; state `order: any` where rows are to be sorted'],
  ],
  [
    'a frequency twice, far apart, in rows that are sorted',
    'file: x.csv\nunits: [MHz, aN/√Hz]\norder: any',
    '1.4,3\n1.1,2\n1.40,4\n',
    ['x.csv:3:1: the frequency `1.40` stands in line 1 already; a table has one row for each frequency'],
  ],
  [
    'an empty cell',
    'file: x.csv\nunits: [MHz, aN/√Hz]',
    '1.1,2\n1.2,\n1.4,3\n',
    [
      'x.csv:2:5: this cell is empty, which is not 0; `keep` can leave out its frequency, or correct the export of the file',
    ],
  ],
  [
    'a cell of spaces',
    'file: x.csv\nunits: [MHz, aN/√Hz]\ncolumns: [2, 3]',
    '0,1.1,2\n0,  ,3\n',
    [
      'x.csv:2:5: this cell is empty, which is not 0; `keep` can leave out its frequency, or correct the export of the file',
    ],
  ],
  [
    'no number, infinity',
    'file: x.csv\nunits: [MHz, aN/√Hz]',
    '1.1,NaN\n1.4,-inf\n',
    [
      'x.csv:1:5: `NaN` is no finite number; `keep` can leave out its frequency',
      'x.csv:2:5: `-inf` is no finite number; `keep` can leave out its frequency',
    ],
  ],
  [
    'the bin at 0 Hz',
    'file: x.csv\nunits: [MHz, aN/√Hz]',
    '0,2\n1.4,3\n',
    [
      'x.csv:1:1: the frequency `0` must be greater than 0 and finite; `keep` passes over rows outside a stretch, such as `1 Hz to 1 MHz`',
    ],
  ],
  [
    'negative and zero densities',
    'file: x.csv\nunits: [MHz, aN/√Hz]',
    '1.1,-2\n1.4,0\n',
    [
      'x.csv:1:5: the density `-2` must be greater than 0 and finite',
      'x.csv:2:5: the density `0` must be greater than 0 and finite',
    ],
  ],
  [
    'a level beyond all numbers',
    'file: x.csv\nunits: [MHz, dBV/√Hz]\nscale: 1 N/V',
    '1.1,-2\n1.4,1e5\n',
    ['x.csv:2:5: the level `1e5` is beyond the numbers that are read'],
  ],
  [
    'more faults than anybody reads',
    'file: x.csv\nunits: [MHz, aN/√Hz]',
    '1.1,x\n'.repeat(50),
    [1, 2, 3, 4, 5].map(
      line =>
        `x.csv:${line}:5: \`x\` is no number with a decimal point${line === 1 ? '; if this is a headline, pass over it with `skip: 1`' : ', such as `2.5e-18`'}`,
    ),
  ],
  [
    'nothing within what is kept',
    'file: x.csv\nunits: [Hz, N/√Hz]\nkeep: 1 Hz to 1.2 MHz',
    fine,
    ['@:13: `x.csv` has one row to read; a table needs two'],
  ],
  [
    'what is kept, written as a dash',
    'file: x.csv\nunits: [Hz, N/√Hz]\nkeep: 1 Hz - 1 MHz',
    fine,
    ['@2:13: `1 Hz - 1 MHz` is no band; write two frequencies with `to` between them: `1.20 MHz to 1.30 MHz`'],
  ],

  // Files.
  ['a file that is not there', 'file: y.csv\nunits: [Hz, N/√Hz]', fine, ['@:13: the file `y.csv` does not exist']],
  [
    'a file outside',
    'file: ../../x.csv\nunits: [Hz, N/√Hz]',
    fine,
    ['@:13: `../../x.csv` must be a path from the folder of this file that stays inside the project'],
  ],
  [
    'a table that ends within the band',
    'file: x.csv\nunits: [Hz, N/√Hz]',
    '1.25e6,2\n1.4e6,3\n',
    [
      '@:13: `x.csv` goes from 1250000 Hz to 1400000 Hz, but the band from 1200000 Hz to 1300000 Hz; narrow the band, or say how the table goes on: `outside: constant` or `outside: slope`',
    ],
  ],

  // What the numbers mean.
  [
    'volts without a scale',
    'file: x.csv\nunits: [Hz, V/√Hz]',
    fine,
    [
      '@1:19: `V/√Hz` is an amplitude density of voltage; a density of force is wanted, such as `aN/√Hz` or `aN²/Hz`, or a `scale` from one to the other',
    ],
  ],
  [
    'a scale to something else',
    'file: x.csv\nunits: [Hz, V/√Hz]\nscale: 3 nm/V',
    fine,
    [
      '@1:19: `V/√Hz` times the scale is an amplitude density of displacement; a density of force is wanted, such as `aN/√Hz` or `aN²/Hz`',
    ],
  ],
  [
    'a scale of nothing',
    'file: x.csv\nunits: [Hz, V/√Hz]\nscale: 0 N/V',
    fine,
    ['@2:14: `0 N/V` must be greater than 0'],
  ],
  [
    'radians per second in the root',
    'file: x.csv\nunits: [Hz, N/√(rad/s)]',
    fine,
    [
      '@1:19: `N/√(rad/s)` is not per hertz, so that a factor 2π stays open; a density of force is wanted, such as `aN/√Hz` or `aN²/Hz`',
    ],
  ],
  [
    'a spectrum whose bandwidth nobody states',
    `${volts}\nscale: 1 N/V`,
    fine,
    [
      '@1:19: `V` is no density; state the `bandwidth` in which it was measured, or `density: amplitude` where the numbers are per √Hz',
    ],
  ],
  [
    'a power spectrum whose bandwidth nobody states',
    'file: x.csv\nunits: [Hz, dBm]\nresistance: 50 Ω\nscale: 1 N/V',
    fine,
    [
      '@1:19: `dBm` is no density; state the `bandwidth` in which it was measured, or `density: power` where the numbers are per Hz',
    ],
  ],
  [
    'a density in a bandwidth',
    'file: x.csv\nunits: [Hz, N/√Hz]\nbandwidth: 10 Hz',
    fine,
    ['@2:18: `N/√Hz` is a density already; delete `bandwidth`, which would divide it once more'],
  ],
  [
    'a density against its unit',
    'file: x.csv\nunits: [Hz, N/√Hz]\ndensity: power',
    fine,
    ['@2:16: `N/√Hz` is a unit of amplitude, which `density: power` contradicts; delete it or correct the unit'],
  ],
  [
    'radians that are amplitude or power',
    'file: x.csv\nunits: [Hz, rad]\nbandwidth: 10 Hz\nscale: 1 N',
    fine,
    ['@1:19: `rad` does not tell amplitude from power; state `density: amplitude` or `density: power`'],
  ],
  [
    'dBm without its resistance',
    'file: x.csv\nunits: [Hz, dBm]\nbandwidth: 10 Hz\nscale: 1 N/V',
    fine,
    [
      '@1:19: `dBm` is a power, but the scale is of volts; state the `resistance` in which it was measured, such as `50 Ω`',
    ],
  ],
  [
    'volts, and a scale of watts',
    'file: x.csv\nunits: [Hz, V/√Hz]\nscale: 1 N/√W',
    fine,
    [
      '@1:19: `V/√Hz` is a voltage, but the scale is of watts; state the `resistance` in which it was measured, such as `50 Ω`',
    ],
  ],
  [
    'a resistance that nothing needs',
    'file: x.csv\nunits: [Hz, dBV/√Hz]\nresistance: 50 Ω\nscale: 1 N/V',
    fine,
    ['@2:19: `dBV/√Hz` needs no `resistance` here; delete it'],
  ],
  [
    'a resistance of 50 metres',
    'file: x.csv\nunits: [Hz, dBm]\nbandwidth: 10 Hz\nresistance: 50 m\nscale: 1 N/V',
    fine,
    ['@3:19: `50 m` is no resistance; write one such as `50 Ω`'],
  ],
  ['a bandwidth of nothing', `${volts}\nbandwidth: 0 Hz\nscale: 1 N/V`, fine, ['@2:18: `0 Hz` must be greater than 0']],
  [
    'a bandwidth whose uncertainty would be lost',
    `${volts}\nbandwidth: 10(1) Hz\nscale: 1 N/V`,
    fine,
    ['@2:18: `10(1) Hz` has an uncertainty, which would be lost here; state it with `scale`'],
  ],
  [
    'a window that is none',
    `${volts}\nbandwidth: { window: hanning, rate: 1 kHz, samples: 100 }\nscale: 1 N/V`,
    fine,
    ['@2:28: `hanning` is no window; write `hann`'],
  ],
  [
    'a window that nobody knows',
    `${volts}\nbandwidth: { window: hft70d, rate: 1 kHz, samples: 100 }\nscale: 1 N/V`,
    fine,
    [
      '@2:28: `hft70d` is no window; there are `rectangular`, `bartlett`, `welch`, `hann`, `hamming`, `blackman`, `exact-blackman`, `blackman-harris`, `nuttall3`, `nuttall3a`, `nuttall3b`, `nuttall4`, `nuttall4a`, `nuttall4b`, `nuttall4c`, `flat-top`, `sft3f`, `sft4f`, `sft5f`, `sft3m`, `sft4m`, `sft5m`, `hft70`, `hft90d`, `hft95`, `hft116d`, `hft144d`, `hft169d`, `hft196d`, `hft223d`, `hft248d`; did you mean `hft70`?',
    ],
  ],
  [
    'a window without its record',
    `${volts}\nbandwidth: { window: hann, rate: 1 kHz }\nscale: 1 N/V`,
    fine,
    [
      '@2:7: `bandwidth` needs the key `samples` (samples of the record that one spectrum is made of, without zero padding)',
    ],
  ],
  [
    'a record of one sample',
    `${volts}\nbandwidth: { window: hann, rate: 1 kHz, samples: 1 }\nscale: 1 N/V`,
    fine,
    ['@2:56: `1` is out of range for `samples`; it must be at least 2'],
  ],
  [
    'the peak of a power',
    'file: x.csv\nunits: [Hz, dBm/Hz]\nvalues: peak\nscale: 1 N/√W',
    fine,
    ['@2:15: `dBm/Hz` is a power, which has no peak value; delete `values`'],
  ],
  [
    'peak in the unit and once more',
    'file: x.csv\nunits: [Hz, V pk/√Hz]\nvalues: peak\nscale: 1 N/V',
    fine,
    ['@2:15: `V pk/√Hz` says `pk` already; delete `values`'],
  ],
  [
    'a level that is none',
    'file: x.csv\nunits: [Hz, dBx]\nscale: 1 N/V',
    fine,
    [
      '@1:19: `dBx` is no level; there are `dBm`, `dBW`, `dBV`, `dBmV`, `dBµV`, `dBc`, `dB`, and `dB(V²/Hz)` over any unit',
    ],
  ],
  [
    'a unit inside a level that is none',
    'file: x.csv\nunits: [Hz, dB(nq/Hz)]\nscale: 1 N/V',
    fine,
    ['@1:22: `nq` is not a known unit; write `Bq`'],
  ],
  [
    'no averages',
    'file: x.csv\nunits: [Hz, N/√Hz]\naverages: 0',
    fine,
    ['@2:17: `0` is out of range for `averages`; it must be at least 1'],
  ],
  [
    'both sides by a number',
    'file: x.csv\nunits: [Hz, N/√Hz]\nsides: 2',
    fine,
    ['@2:14: `2` is not allowed for `sides`; allowed are `one`, `two`'],
  ],
  [
    'a word for what lies outside',
    'file: x.csv\nunits: [Hz, N/√Hz]\noutside: extrapolate',
    fine,
    ['@2:16: `extrapolate` is not allowed for `outside`; allowed are `refuse`, `constant`, `slope`'],
  ],
  [
    'an unknown key',
    'file: x.csv\nunits: [Hz, N/√Hz]\ncolumn: [1, 2]',
    fine,
    [
      '@2:7: unknown key `column` in `table`; allowed are `file`, `skip`, `header`, `remarks`, `separator`, `columns`, `units`, `density`, `values`, `sides`, `bandwidth`, `resistance`, `scale`, `averages`, `keep`, `order`, `outside`; did you mean `columns`?',
    ],
  ],
]

describe('a table that is refused', () => {
  it.each(cases)('%s', (_name, keys, file, expected) => {
    const lines = expected.map(line =>
      line.replace(/^@(\d*)/, (_all, down: string) => `budget.yaml:${firstLine + Number(down)}`),
    )
    expect(told(keys, file)).toEqual(lines)
  })

  it('has each wording once', () => {
    expect(new Set(cases.map(([name]) => name)).size).toBe(cases.length)
    expect(cases.length).toBeGreaterThan(50)
  })
})
