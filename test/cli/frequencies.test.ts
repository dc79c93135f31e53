import { describe, expect, it } from 'vitest'
import { CallError } from '../../src/cli/call-error.js'
import { frequenciesIn, frequenciesOf, frequencyOf, pointsOf } from '../../src/cli/frequencies.js'
import { Refusal } from '../../src/model/problem.js'
import { throwaway } from '../whole/folder.js'

/** What a call is refused with. */
function refusal(call: () => unknown): unknown {
  try {
    call()
  } catch (error) {
    if (error instanceof Refusal)
      return error.problems.map(p => `${p.place.file}:${p.place.line}:${p.place.column}: ${p.message}`)
    if (error instanceof Error) return error.message
  }
  return 'nothing was refused'
}

describe('a frequency', () => {
  it.each([
    ['9e5', 9e5],
    ['1.243 MHz', 1.243e6],
    ['250 mHz', 0.25],
    ['1243000.0000001', 1243000.0000001],
  ])('is read from %s', (text, hertz) => {
    expect(frequencyOf(text)).toBe(hertz)
  })

  it.each([
    ['0', '`0` is not above 0; write a frequency such as `1.243 MHz` or `9e5`'],
    ['-3 Hz', '`-3 Hz` is not above 0; write a frequency such as `1.243 MHz` or `9e5`'],
    ['3 ng', '`3 ng` is not a frequency; write one in hertz, such as `1.243 MHz` or `9e5`'],
    ['3 rad/s', '`3 rad/s` is not a frequency; write one in hertz, such as `1.243 MHz` or `9e5`'],
    ['2π × 3 MHz', '`2π × 3 MHz` is not a frequency; write one in hertz, such as `1.243 MHz` or `9e5`'],
    ['5 %', '`5 %` is not a frequency; write one in hertz, such as `1.243 MHz` or `9e5`'],
    ['1.243(2) MHz', '`1.243(2) MHz` has an uncertainty; a point to evaluate at is exact'],
  ])('is not %s', (text, message) => {
    expect(refusal(() => frequencyOf(text))).toBe(message)
  })

  it('of the call is refused with the name of the option', () => {
    const call = () => frequenciesOf(['1 Hz', 'tern'])
    expect(call).toThrow(CallError)
    expect(refusal(call)).toMatch(/^--at: `tern` /)
  })

  it('is asked for once, ascending', () => {
    expect(pointsOf([3, 1, 3, 2])).toEqual(Float64Array.of(1, 2, 3))
  })
})

describe('a file of frequencies', () => {
  it('has one a line', () => {
    const cwd = throwaway({ 'points.txt': '\uFEFF# near the peak\n1.243 MHz\r\n\n  9e5\n' })
    expect(frequenciesIn('points.txt', cwd)).toEqual([1.243e6, 9e5])
  })

  it('is refused with every bad line in its place', () => {
    const cwd = throwaway({ 'a/points.txt': '1 Hz\n  3 ng\n-1\n' })
    expect(refusal(() => frequenciesIn('a/points.txt', cwd))).toEqual([
      'a/points.txt:2:3: `3 ng` is not a frequency; write one in hertz, such as `1.243 MHz` or `9e5`',
      'a/points.txt:3:1: `-1` is not above 0; write a frequency such as `1.243 MHz` or `9e5`',
    ])
  })

  it.each([
    ['gone.txt', '--at-file: gone.txt does not exist'],
    ['empty.txt', '--at-file: empty.txt holds no frequency; write one a line'],
    ['folder', '--at-file: folder is a folder; name a file with one frequency a line'],
  ])('is refused where it says nothing: %s', (name, message) => {
    const cwd = throwaway({ 'empty.txt': '# nothing\n', 'folder/a': '' })
    expect(refusal(() => frequenciesIn(name, cwd))).toBe(message)
  })
})
