import fc from 'fast-check'

/** Variables of random expressions and their values. */
export const variables: ReadonlyMap<string, number> = new Map([
  ['a', 0.7],
  ['b', -1.3],
  ['x', 2.1],
  ['y', 1e-3],
])

// Without coth, in which mathjs loses half of its digits where the argument is small.
const single = [
  'sqrt',
  'abs',
  'sign',
  'exp',
  'log10',
  'sin',
  'cos',
  'tan',
  'asin',
  'acos',
  'atan',
  'sinh',
  'cosh',
  'tanh',
]
const double = ['atan2', 'hypot', 'min', 'max']

/** Texts of expressions in plain numbers, in the spelling that mathjs reads as well. */
export const randomExpression: fc.Arbitrary<string> = fc.letrec<{ node: string }>(tie => ({
  node: fc.oneof(
    { depthSize: 'small', withCrossShrink: true },
    fc.constantFrom('a', 'b', 'x', 'y', 'f', 'pi', '1', '2', '0.5', '3e-2', '17'),
    fc.tuple(tie('node'), fc.constantFrom('+', '-', '*', '/', ' - ', ' * '), tie('node')).map(parts => parts.join('')),
    fc.tuple(tie('node'), tie('node')).map(([a, b]) => `(${a})^(${b})`),
    fc.tuple(tie('node'), fc.constantFrom('2', '3', '-1', '-2', '0.5')).map(([a, b]) => `(${a})^${b}`),
    tie('node').map(a => `(${a})`),
    tie('node').map(a => `-(${a})^2`),
    fc.tuple(fc.constantFrom(...single), tie('node')).map(([name, a]) => `${name}(${a})`),
    fc.tuple(fc.constantFrom(...double), tie('node'), tie('node')).map(([name, a, b]) => `${name}(${a}, ${b})`),
  ),
})).node
