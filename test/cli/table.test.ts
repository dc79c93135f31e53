import { expect, it } from 'vitest'
import { printedTable } from '../../src/cli/table.js'

const table = {
  head: ['', '1.243 MHz', 'share'],
  rows: [
    ['total', '8.31 aN/√Hz', '100 %'],
    ['thermal', '810 zN/√Hz', '1.0 %'],
    ['a\u001b[2Jb', '', ''],
  ],
  numeric: [1, 2],
}

it('sets text flush left and numbers flush right, without control characters', () => {
  expect(printedTable(table, false)).toBe(
    [
      '               1.243 MHz  share',
      'total        8.31 aN/√Hz  100 %',
      'thermal       810 zN/√Hz  1.0 %',
      'a\\u{1b}[2Jb',
      '',
    ].join('\n'),
  )
})

it('is coloured only where a terminal shows it, and then as wide', () => {
  const colored = printedTable(table, true)
  expect(colored).toContain('\u001b[1mtotal')
  const codes = new RegExp(`${String.fromCharCode(27)}\\[\\d+m`, 'g')
  expect(colored.replace(codes, '').replace(/ +$/gm, '')).toBe(printedTable(table, false))
})
