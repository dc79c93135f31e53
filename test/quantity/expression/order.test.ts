import { describe, expect, test } from 'vitest'
import { constants } from '../../../src/physics/constants.js'
import { constantNames, constantsByName } from '../../../src/quantity/expression/constants.js'
import { CircleError, orderOf } from '../../../src/quantity/expression/order.js'

function circleOf(definitions: Record<string, string[]>): readonly string[] {
  try {
    orderOf(new Map(Object.entries(definitions)))
  } catch (error) {
    if (error instanceof CircleError) return error.circle
    throw error
  }
  throw new Error('no circle was found')
}

describe('the order of named expressions', () => {
  test('each stands behind what it names, otherwise as given', () => {
    const definitions = new Map([
      ['a', ['b', 'c']],
      ['b', ['d', 'unknown']],
      ['c', []],
      ['d', ['c', 'c']],
      ['z', []],
    ])
    expect(orderOf(definitions)).toEqual(['c', 'd', 'b', 'a', 'z'])
    expect(orderOf(new Map())).toEqual([])
  })

  test('a circle is shown from a name back to itself', () => {
    expect(circleOf({ a: ['b'], b: ['a'] })).toEqual(['a', 'b', 'a'])
    expect(circleOf({ a: ['a'] })).toEqual(['a', 'a'])
    expect(circleOf({ x: ['y'], y: ['k', 'a'], a: ['b'], b: ['c'], c: ['a'] })).toEqual(['a', 'b', 'c', 'a'])
    expect(new CircleError(['a', 'b', 'a']).message).toBe(
      '`a` → `b` → `a` goes in a circle; one of them needs a value of its own',
    )
  })

  test('a chain of a hundred thousand is put in order', () => {
    const chain = Array.from({ length: 100_000 }, (_, index): [string, string[]] => [`p${index}`, [`p${index + 1}`]])
    expect(orderOf(new Map(chain))[0]).toBe('p99999')
  })
})

test('every constant of the table has a name', () => {
  const found = constantsByName(constants)
  expect(found.size).toBe(constants.length)
  expect(new Set(found.keys())).toEqual(constantNames)
  expect(found.get('k_B')?.value).toBe(1.380649e-23)
})
