import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { good, lines, read as readFiles, small } from '../budget/read.js'
import { fastest } from './fastest.js'

const million = 1024 * 1024
const noise = (name: string) =>
  `  ${name}: { kind: force-noise, into: drum, table: { file: x.csv, units: [MHz, aN/√Hz] } }\n`
const text = `${small}contributions:\n${noise('stray')}`

function told(csv: string): string[] {
  return lines(readFiles(text, { 'x.csv': csv }))
}

describe('a hostile CSV file', () => {
  it.each([
    ['one line of 32 MB', '1'.repeat(32 * million - 1), 'x.csv:1:1: this line is longer than 2000 characters'],
    ['32 million commas', ','.repeat(32 * million - 1), 'x.csv:1:1: this line is longer than 2000 characters'],
    ['32 million empty lines', '\n'.repeat(32 * million - 1), 'x.csv:200001:1: the file has more than 200000 lines'],
    ['32 MB of quotation marks', '"\n'.repeat(16 * million - 1), 'x.csv:200001:1: the file has more than 200000 lines'],
    ['a quotation mark that stays open', '1.1,"2\n1.4,3\n', 'x.csv:1:5: a quotation mark is not closed in its line'],
    [
      '150,000 rows',
      '1.1,2\n'.repeat(150_000),
      'budget.yaml:18:58: the tables of one budget have at most 100000 rows in all; thin them out',
    ],
  ])('%s is refused within three seconds', (_name, csv, line) => {
    expect(told(csv)).toEqual([line])
    expect(fastest(() => told(csv))).toBeLessThan(3000)
  })

  it.each(['comma', 'spaces'])('of 99,999 long rows parted by %s is read within three seconds', by => {
    const mark = by === 'comma' ? ',' : '    '
    const row = (i: number): string => [1e6 + i * 10, ...new Array<number>(50).fill(1)].join(mark)
    const csv = Array.from({ length: 99_999 }, (_, i) => row(i)).join('\n')
    const keys = `file: x.csv, units: [Hz, aN/√Hz], separator: ${by}, columns: [1, 51]`
    const budget = text.replace('file: x.csv, units: [MHz, aN/√Hz]', keys)
    expect(lines(readFiles(budget, { 'x.csv': csv }))).toEqual([])
    expect(fastest(() => readFiles(budget, { 'x.csv': csv }))).toBeLessThan(3000)
  })

  it.each([
    ['empty', ''],
    ['infinity', 'inf'],
    ['too large', '1e400'],
    ['its square too large', '1e200'],
    ['its square zero', '1e-190'],
    ['not a number', 'NaN'],
    ['hexadecimal', '0x10'],
    ['a formula', '=1+1'],
    ['a decimal comma in quotes', '"1,5"'],
    ['zero', '0'],
    ['negative', '-2'],
    ['digits of another script', '٣'],
    ['a hidden character', '2\u202e'],
  ])('a cell that is %s is refused at its row', (_name, cell) => {
    expect(told(`1.1,2\n1.2,${cell}\n1.4,3\n`)).toEqual([expect.stringMatching(/^x\.csv:2:5: /)])
  })

  it('is read once, however many lines name it', () => {
    const many = Array.from({ length: 100 }, (_, i) => noise(`s${i}`)).join('')
    const csv = Array.from({ length: 900 }, (_, i) => `${1.1 + i * 0.001},2\n`).join('')
    expect(good(`${small}contributions:\n${many}`, { 'x.csv': csv }).tables).toHaveLength(100)
  })

  it('may have a byte order mark, Windows line ends, remarks and spaces', () => {
    const { tables } = good(text, { 'x.csv': '\ufeff# floor\r\n\r\n 1.1 , 2 \r\n1.4,3\r\n' })
    expect([...(tables[0]?.frequency ?? [])]).toEqual([1.1e6, 1.4e6])
  })
})

describe('any file under any mapping', () => {
  const line = fc
    .array(fc.constantFrom('1.1e6', '1.4e6', '2', '-3', '"', ',', ';', '\t', ' ', '#', 'NaN', '1e999', '\u202e', 'f'), {
      maxLength: 8,
    })
    .map(pieces => pieces.join(''))
  const file = fc.array(fc.oneof(line, fc.constantFrom('1.1e6,2', '1.2e6,3', '1.4e6,4')), { maxLength: 12 })
  const keys = fc.record(
    {
      skip: fc.constantFrom('0', '1', '9'),
      header: fc.constantFrom('1', '2'),
      remarks: fc.constantFrom('"%"', '[f, "1"]'),
      separator: fc.constantFrom('comma', 'semicolon', 'tab', 'spaces'),
      columns: fc.constantFrom('[1, 2]', '[2, 1]', '[f, 2]', '[64, 1]', '[65, 1]'),
      density: fc.constantFrom('amplitude', 'power'),
      values: fc.constantFrom('rms', 'peak'),
      sides: fc.constantFrom('one', 'two'),
      bandwidth: fc.constantFrom('10 Hz', '1e-300 Hz', '{ window: hann, rate: 1 Hz, samples: 2 }'),
      resistance: fc.constantFrom('50 Ω', '1e300 Ω'),
      scale: fc.constantFrom('1 N/V', '1e-300 N/V', '1 N'),
      keep: fc.constantFrom('1 Hz to 1 MHz', '1 kHz to 1.5 MHz'),
      order: fc.constantFrom('ascending', 'any'),
      outside: fc.constantFrom('constant', 'slope'),
    },
    { requiredKeys: [] },
  )
  const unit = fc.constantFrom('N/√Hz', 'N', 'V', 'V²/Hz', 'dBm', 'dBV', 'dBc/Hz', 'dB', '"1"', 'rad')

  it('is read, or refused at a place, and never throws', () => {
    let read = 0
    let refused = 0
    const check = (rows: readonly string[], mapping: Readonly<Record<string, string>>, of: string): void => {
      const stated = Object.entries(mapping).map(([key, value]) => `, ${key}: ${value}`)
      const table = `{ file: x.csv, units: [Hz, ${of}]${stated.join('')} }`
      const budget = `${small}contributions:\n  stray: { kind: force-noise, into: drum, table: ${table} }\n`
      const result = readFiles(budget, { 'x.csv': rows.join('\n') })
      for (const told of lines(result)) expect(told).toMatch(/^(?:budget\.yaml|x\.csv):[1-9]\d*:[1-9]\d*: ./)
      if (result.budget === null) {
        refused++
        expect(result.problems.length).toBeGreaterThan(0)
        return
      }
      read++
      for (const { frequency, psd } of result.budget.tables) {
        expect([...psd].every(value => value > 0 && Number.isFinite(value))).toBe(true)
        expect([...frequency].every((f, i) => f > (frequency[i - 1] ?? 0))).toBe(true)
      }
    }
    fc.assert(fc.property(file, keys, unit, check), { numRuns: 600, seed: 11 })
    const plain = fc.array(fc.constantFrom('1.1e6,2', '1.2e6,3', '1.4e6,4', '#', ''), { minLength: 3, maxLength: 5 })
    const order = fc.record({ order: fc.constantFrom('any', 'ascending') })
    fc.assert(fc.property(plain, order, fc.constant('N/√Hz'), check), { numRuns: 300, seed: 12 })
    expect([read > 20, refused > 400]).toEqual([true, true])
  })
})
