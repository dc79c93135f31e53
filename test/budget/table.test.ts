import { CsvError, parse } from 'csv-parse/sync'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { cellsOf } from '../../src/budget/curve-cells.js'
import { assess, evaluateAtFrequencies } from '../../src/engine/assess.js'
import { good, lines, read } from './read.js'
import { readTable, told, withTable } from './table-fixture.js'

const force = 'file: x.csv\nunits: [MHz, aN/√Hz]'

/** Frequencies and densities, in the units of `force`. */
function cellsRead(keys: string, file: string): number[][] {
  const { table, psd } = readTable(keys, file)
  return psd.map((S, i) => [(table.frequency[i] ?? NaN) / 1e6, Math.sqrt(S) * 1e18].map(x => Number(x.toPrecision(12))))
}

const expected = [
  [1.1, 2],
  [1.4, 3],
]

describe('the layout of a file', () => {
  it.each([
    ['commas', force, '1.1,2\n1.4,3'],
    ['semicolons', `${force}\nseparator: semicolon`, '1.1;2\n1.4; 3\n'],
    ['tabs', `${force}\nseparator: tab`, '1.1\t2\r\n1.4\t 3\r\n'],
    ['spaces, however many', `${force}\nseparator: spaces`, '  1.1 2\n1.4 \t  3  \n'],
    ['quoted cells', force, '"1.1","2"\n" 1.4 " , "3"\n'],
    ['remarks and blank lines', force, '# of 2026\n\n1.1,2\n   \n #later\n1.4,3\n'],
    ['remarks of another mark', `${force}\nremarks: "%"`, '% of 2026\n1.1,2\n1.4,3\n'],
    ['several marks', `${force}\nremarks: ["!", END]`, '! of 2026\n1.1,2\n1.4,3\nEND OF DATA\n'],
    ['lines in front', `${force}\nskip: 2`, 'anything "at all\n,,,,\n1.1,2\n1.4,3\n'],
    ['columns by number', `${force}\ncolumns: [3, 1]`, '2,x,1.1\n3,,1.4\n'],
    ['columns by name', `${force}\ncolumns: [f (MHz), noise]`, 'noise,"f (MHz)"\n2,1.1\n3,1.4\n'],
    ['names behind the mark of a remark', `${force}\ncolumns: [f, noise]`, '# noise,f\n2,1.1\n3,1.4\n'],
    ['a name that is a number', `${force}\ncolumns: [f, "2"]`, 'f,a,2\n1.1,7,2\n1.4,7,3\n'],
    [
      'names with lines around them',
      `${force}\ncolumns: [f, noise]\nheader: 2\nskip: 3`,
      'made by hand\nf,noise\nMHz,aN/rtHz\n1.1,2\n1.4,3\n',
    ],
    ['a number and a name', `${force}\ncolumns: [1, noise]`, 'f,x,noise\n1.1,9,2\n1.4,9,3\n'],
    ['rows in any order', `${force}\norder: any`, '1.4,3\n1.1,2\n'],
    ['rows that are passed over', `${force}\nkeep: 1 MHz to 1.5 MHz`, '0,\n1.1,2\n1.4,3\n1.5001,NaN\n'],
    ['other spellings of numbers', force, '+1.1e0,2.\n14E-1,.3e+1\n'],
    ['a byte order mark', `${force}\ncolumns: [f, noise]`, '\ufefff,noise\n1.1,2\n1.4,3\n'],
  ])('%s', (_name, keys, file) => {
    expect(cellsRead(keys, file)).toEqual(expected)
  })

  it('two tables may read one file in two ways', () => {
    const keys = (column: number) => `{ file: x.csv, units: [MHz, aN/√Hz], columns: [1, ${column}] }`
    const noise = (name: string, column: number) =>
      `  ${name}: { kind: force-noise, into: drum, table: ${keys(column)} }\n`
    const text = withTable(force.replace('aN/√Hz]', 'aN/√Hz]\ncolumns: [1, 2]')) + noise('other', 3)
    const { tables } = good(text, { 'x.csv': '1.1,2,5\n1.4,3,6\n' })
    expect(tables.map(({ psd }) => Number((Math.sqrt(psd[1] ?? NaN) * 1e18).toPrecision(12)))).toEqual([3, 6])
  })

  // Second opinion: a library for CSV, on lines that it can read in its strict mode. Ours says a fault where it does.
  it('parts cells as a library does', () => {
    const piece = fc.constantFrom('1.5', 'a b', '"', '""', ' ', '', 'x"y', '"a,b"', '"c""d"', '\t', 'µ')
    const line = fc
      .array(fc.array(piece, { maxLength: 3 }).map(pieces => pieces.join('')))
      .map(cells => cells.join(','))
    let faults = 0
    fc.assert(
      fc.property(line, text => {
        const ours = cellsOf(text, 'comma')
        const theirs = library(text)
        if ('message' in ours) {
          faults++
          expect(theirs).toBeNull()
        } else if (theirs !== null) expect(ours.map(cell => cell.text)).toEqual(theirs)
      }),
      { numRuns: 2000, seed: 7 },
    )
    expect(faults).toBeGreaterThan(100)
  })

  it('knows in which column of the line a cell begins', () => {
    const line = ' 1.5,\t"a,b" ,, x'
    const cells = cellsOf(line, 'comma')
    expect(cells).toEqual([
      { text: '1.5', column: 2 },
      { text: 'a,b', column: 7 },
      { text: '', column: 14 },
      { text: 'x', column: 16 },
    ])
  })
})

function library(text: string): string[] | null {
  try {
    const rows: unknown = parse(text, { trim: true, relax_column_count: true, skip_empty_lines: false })
    const [row] = rows as string[][]
    return row === undefined ? [''] : row.map(cell => cell.trim())
  } catch (error) {
    if (error instanceof CsvError) return null
    throw error
  }
}

describe('what stays with a table', () => {
  it('keeps averages and what happens outside', () => {
    expect(readTable(`${force}\naverages: 100`, '1.1,2\n1.4,3\n').table).toMatchObject({
      averages: 100,
      outside: 'refuse',
      file: 'x.csv',
    })
    expect(readTable(`${force}\noutside: slope`, '1.1,2\n1.4,3\n').table).toMatchObject({
      averages: null,
      outside: 'slope',
    })
  })

  it('takes a scale as a root with its uncertainty, shared by name', () => {
    const scale = 'file: x.csv\nunits: [MHz, V/√Hz]\nscale: gauge'
    const second =
      '  other: { kind: force-noise, into: drum, table: { file: x.csv, units: [MHz, mV/√Hz], scale: gauge } }\n'
    const budget = good(withTable(scale, 'gauge: 2.5(1) pN/V') + second, { 'x.csv': '1.1,2\n1.4,3\n' })
    const roots = budget.roots.filter(({ id }) => id === 'gauge')
    expect(roots).toMatchObject([{ value: 2.5e-12, uncertainty: 1e-13, text: '2.5(1) pN/V' }])
    const inline = good(withTable(scale.replace('gauge', '2.5(1) pN/V')), { 'x.csv': '1.1,2\n1.4,3\n' })
    expect(inline.roots.map(({ id }) => id)).toContain('stray.table.scale')
  })

  it('says it where a scale is written wrongly', () => {
    const keys = 'file: x.csv\nunits: [MHz, V/√Hz]\nscale: gage'
    expect(told(keys, '1.1,2\n1.4,3\n', 'gauge: 2.5 pN/V')).toContain(
      'budget.yaml:25:14: no parameter is called `gage`: `parameters` has `gauge`; did you mean `gauge`?',
    )
  })
})

describe('a table of another field', () => {
  const dark = (keys: string) =>
    withTable(force) +
    `  dark: { kind: detector-noise, into: detector, table: { file: dark.csv, outside: constant, ${keys} } }\n`
  const psdOf = (keys: string, value: number): number => {
    const budget = good(dark(keys), { 'x.csv': '1.1,2\n1.4,3\n', 'dark.csv': `1,${value}\n2,${value}\n` })
    const claims = budget.lines.at(-1)?.claims
    const spec = claims !== undefined && 'kind' in claims ? claims.parameters['density'] : undefined
    const { scale } = spec as { scale?: { factor: { root: number }; power: boolean } }
    expect(scale === undefined || scale.power).toBe(true)
    return (
      (budget.tables[1]?.psd[0] ?? NaN) * (scale === undefined ? 1 : (budget.roots[scale.factor.root]?.value ?? NaN))
    )
  }

  it('reads quanta as they are, and powers by what a quantum is', () => {
    expect(psdOf('units: [MHz, "1"]', 0.25)).toBe(0.25)
    expect(psdOf('units: [MHz, quanta]', 0.25)).toBe(0.25)
    // A quantum at 5 GHz is 3.313e-24 J; -204.8 dBm are 3.311e-24 W.
    expect(psdOf('units: [MHz, W/Hz], scale: 3.018e23 1/J', 6.626e-24)).toBeCloseTo(1.9997, 4)
    expect(psdOf('units: [MHz, dBm/Hz], scale: 3.018e23 1/J', -204.8)).toBeCloseTo(0.99935, 5)
    expect(psdOf('units: [MHz, V²/Hz], scale: 4 Hz/V²', 0.5)).toBe(2)
  })

  it('has no amplitude of quanta', () => {
    const files = { 'x.csv': '1.1,2\n1.4,3\n', 'dark.csv': '1,2\n2,2\n' }
    expect(lines(read(dark('units: [MHz, "1"], density: amplitude'), files))[0]).toMatch(
      /: `1` is a unit of power, which `density: amplitude` contradicts; delete it or correct the unit$/,
    )
  })
})

describe('the engine with a table', () => {
  const strayAt = (text: string, file: string, frequency: number): number => {
    const budget = good(text, { 'x.csv': file })
    const { lines } = evaluateAtFrequencies(budget, [frequency])
    return lines.find(({ id }) => id === 'stray')?.psd[0] ?? NaN
  }

  // S ∝ f⁻⁴ in amplitude f⁻²: a straight line in log–log, so that every frequency is known exactly.
  const law = (f: number) => 4e-36 * f ** -4
  const steep = [1.22, 1.25, 1.28].map(f => `${f},${2 * f ** -2}`).join('\n')

  it.each([1.22, 1.23, 1.2499, 1.25, 1.27, 1.28])('goes straight in log–log at %d MHz', f => {
    expect(Math.abs(strayAt(withTable(`${force}\noutside: constant`), steep, f * 1e6) / law(f) - 1)).toBeLessThan(1e-12)
  })

  it.each([
    ['constant', 1.2, law(1.22)],
    ['constant', 1.3, law(1.28)],
    ['slope', 1.2, law(1.2)],
    ['slope', 1.3, law(1.3)],
  ])('%s outside at %d MHz', (outside, f, expected) => {
    const text = withTable(`${force}\noutside: ${outside}`)
    expect(Math.abs(strayAt(text, steep, f * 1e6) / expected - 1)).toBeLessThan(1e-12)
  })

  it('goes on by the two last rows at each end', () => {
    const bent = '1.22,1\n1.25,2\n1.28,1\n'
    const slope = Math.log(2) / Math.log(1.25 / 1.22)
    const low = 1e-36 * (1.2 / 1.22) ** (2 * slope)
    expect(strayAt(withTable(`${force}\noutside: slope`), bent, 1.2e6) / low).toBeCloseTo(1, 10)
  })

  // Road: exact. The amplitude density is proportional to the scale: 4 % of one are 4 % of the other.
  it('passes the uncertainty of the scale on to the line', () => {
    const text = withTable('file: x.csv\nunits: [MHz, V/√Hz]\nscale: 2.5(1) pN/V')
    const { lineSpreads, atReference } = assess(good(text, { 'x.csv': '1.1,2\n1.4,2\n' }), 'glance')
    const stray = atReference.lines.findIndex(({ id }) => id === 'stray')
    const asd = Math.sqrt(atReference.lines[stray]?.psd[0] ?? NaN)
    expect(asd).toBeCloseTo(5e-12, 20)
    expect((lineSpreads[stray]?.combined ?? NaN) / asd).toBeCloseTo(0.04, 6)
  })
})
