import { describe, expect, it } from 'vitest'
import { good, lines, read, small } from '../budget/read.js'
import { fastest } from './fastest.js'

const million = 1024 * 1024
const noise = (name: string) =>
  `  ${name}: { kind: force-noise, into: drum, table: { file: x.csv, units: [MHz, aN/√Hz] } }\n`
const text = `${small}contributions:\n${noise('stray')}`

function told(csv: string): string[] {
  return lines(read(text, { 'x.csv': csv }))
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
