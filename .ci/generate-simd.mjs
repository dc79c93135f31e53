// Writes src/engine/simd-module.ts: the loops over frequency as WebAssembly with 128-bit vectors, from the recipes below.
// The same loops in TypeScript are src/engine/plain-loops.ts; a test compares the two bit by bit.
import { writeFile } from 'node:fs/promises'
import { fileURLToPath } from 'node:url'
import wabt from 'wabt'

const blockLength = 1024
const blockBytes = blockLength * 8

/** Loads of a register's first (real) and second (imaginary) array at the loop index. */
const at = name => `(i32.add (local.get $${name}) (local.get $i))`
const re = name => `(v128.load ${at(name)})`
const im = name => `(v128.load offset=${blockBytes} ${at(name)})`
const get = name => `(local.get $${name})`
const set = (name, value) => `(local.set $${name} ${value})`
const splat = name => `(f64x2.splat (local.get $${name}))`
const number = value => `(f64x2.splat (f64.const ${value}))`
const binary = op => (a, b) => `(f64x2.${op} ${a} ${b})`
const [add, sub, mul, div] = ['add', 'sub', 'mul', 'div'].map(binary)
const unary = op => a => `(f64x2.${op} ${a})`
const [neg, abs, sqrt] = ['neg', 'abs', 'sqrt'].map(unary)
const store = value => `(v128.store ${at('out')} ${value})`
const storeIm = value => `(v128.store offset=${blockBytes} ${at('out')} ${value})`

/** A loop over n points: addresses in bytes, then n, then real parameters; `scalars` are spread over both lanes first. */
function loop(name, addresses, scalars, body) {
  const locals = ['i', 'end'].map(l => `(local $${l} i32)`).join(' ')
  const vectors = ['x', 'y', 'u', 'v', 'r'].map(l => `(local $${l} v128)`).join(' ')
  const spread = scalars.map(s => `(local $v_${s} v128)`).join(' ')
  return `
  (func (export "${name}") ${addresses.map(a => `(param $${a} i32)`).join(' ')} (param $n i32) ${scalars.map(s => `(param $${s} f64)`).join(' ')}
    ${locals} ${vectors} ${spread}
    ${scalars.map(s => set(`v_${s}`, splat(s))).join('\n    ')}
    (local.set $end (i32.shl (local.get $n) (i32.const 3)))
    (block $done
      (loop $next
        (br_if $done (i32.ge_s (local.get $i) (local.get $end)))
        ${body.join('\n        ')}
        (local.set $i (i32.add (local.get $i) (i32.const 16)))
        (br $next))))`
}

const v = name => get(`v_${name}`)
const loadXY = name => [set('x', re(name)), set('y', im(name))]
const loadUV = name => [set('u', re(name)), set('v', im(name))]
const [x, y, u, w, r] = ['x', 'y', 'u', 'v', 'r'].map(get)
const square = (a, b) => add(mul(a, a), mul(b, b))
const sumOf = (out, names) =>
  names.slice(1).reduce((sum, n, k) => add(sum, mul(v(`s${k + 1}`), re(n))), mul(v('s0'), re(names[0])))

const twoPi = 2 * Math.PI

/** x coth x as a polynomial of its square, the coefficients of its Taylor series. */
const series = [1 / 3, -1 / 45, 2 / 945, -1 / 4725, 2 / 93555].reduceRight(
  (inner, c) => add(number(c), inner === null ? number(0) : mul(r, inner)),
  null,
)

const loops = [
  loop(
    'multiply',
    ['out', 'a', 'b'],
    [],
    [...loadXY('a'), ...loadUV('b'), store(sub(mul(x, u), mul(y, w))), storeIm(add(mul(x, w), mul(y, u)))],
  ),
  loop(
    'reciprocal',
    ['out', 'a'],
    [],
    [...loadXY('a'), set('r', div(number(1), square(x, y))), store(mul(x, r)), storeIm(mul(neg(y), r))],
  ),
  loop(
    'divide',
    ['out', 'a', 'b'],
    [],
    [
      ...loadUV('b'),
      set('r', div(number(1), square(u, w))),
      set('x', mul(re('a'), r)),
      set('y', mul(im('a'), r)),
      store(add(mul(x, u), mul(y, w))),
      storeIm(sub(mul(y, u), mul(x, w))),
    ],
  ),
  loop(
    'affine',
    ['out', 'a'],
    ['sr', 'si', 'cr', 'ci'],
    [
      ...loadXY('a'),
      store(add(sub(mul(v('sr'), x), mul(v('si'), y)), v('cr'))),
      storeIm(add(add(mul(v('sr'), y), mul(v('si'), x)), v('ci'))),
    ],
  ),
  loop(
    'combine',
    ['out', 'a', 'b'],
    ['sr', 'si', 'tr', 'ti', 'cr', 'ci'],
    [
      ...loadXY('a'),
      ...loadUV('b'),
      store(add(add(sub(mul(v('sr'), x), mul(v('si'), y)), sub(mul(v('tr'), u), mul(v('ti'), w))), v('cr'))),
      storeIm(add(add(add(mul(v('sr'), y), mul(v('si'), x)), add(mul(v('tr'), w), mul(v('ti'), u))), v('ci'))),
    ],
  ),
  loop(
    'addScaled',
    ['out', 'a'],
    ['sr', 'si'],
    [
      ...loadXY('a'),
      store(add(re('out'), sub(mul(v('sr'), x), mul(v('si'), y)))),
      storeIm(add(im('out'), add(mul(v('sr'), y), mul(v('si'), x)))),
    ],
  ),
  loop('abs2', ['out', 'a'], [], [...loadXY('a'), store(square(x, y))]),
  loop('inverseAbs2', ['out', 'a'], [], [...loadXY('a'), store(div(number(1), square(x, y)))]),
  loop('absImaginary', ['out', 'a'], [], [store(abs(im('a')))]),
  loop(
    'pair',
    ['out', 'a', 'b'],
    ['ratio'],
    [...loadXY('a'), ...loadUV('b'), store(add(square(x, y), mul(v('ratio'), square(u, w))))],
  ),
  loop(
    'cross',
    ['out', 'a', 'b'],
    ['cr', 'ci'],
    [
      ...loadXY('a'),
      ...loadUV('b'),
      store(sub(mul(v('cr'), add(mul(x, u), mul(y, w))), mul(v('ci'), sub(mul(y, u), mul(x, w))))),
    ],
  ),
  loop(
    'addCross',
    ['out', 'a', 'b'],
    ['cr', 'ci'],
    [
      ...loadXY('a'),
      ...loadUV('b'),
      store(add(re('out'), sub(mul(v('cr'), add(mul(x, u), mul(y, w))), mul(v('ci'), sub(mul(y, u), mul(x, w)))))),
    ],
  ),
  loop('product', ['out', 'a', 'b'], [], [store(mul(re('a'), re('b')))]),
  loop('ratio', ['out', 'a', 'b'], [], [store(div(re('a'), re('b')))]),
  loop('root', ['out', 'a'], [], [store(sqrt(re('a')))]),
  loop('sum1', ['out', 'a'], ['s0'], [store(sumOf('out', ['a']))]),
  loop('sum2', ['out', 'a', 'b'], ['s0', 's1'], [store(sumOf('out', ['a', 'b']))]),
  loop('sum4', ['out', 'a', 'b', 'c', 'd'], ['s0', 's1', 's2', 's3'], [store(sumOf('out', ['a', 'b', 'c', 'd']))]),
  loop('constant', ['out'], ['value'], [store(v('value'))]),
  loop(
    'oscillator',
    ['out', 'f', 'base', 'offset'],
    ['stiffness', 'frequency', 'slope', 'level'],
    [
      set('x', re('f')),
      store(mul(mul(v('stiffness'), sub(sub(v('frequency'), re('base')), re('offset'))), add(v('frequency'), x))),
      storeIm(add(mul(v('slope'), x), v('level'))),
    ],
  ),
  loop(
    'decayReciprocal',
    ['out', 'f'],
    ['half', 'detuning'],
    [
      set('x', add(v('detuning'), mul(number(twoPi), re('f')))),
      set('r', div(number(1), add(mul(v('half'), v('half')), mul(x, x)))),
      store(mul(v('half'), r)),
      storeIm(mul(x, r)),
    ],
  ),
  loop(
    'warmBath',
    ['out', 'f'],
    ['classical', 'ratio'],
    [
      set('x', mul(v('ratio'), re('f'))),
      set('r', mul(x, x)),
      store(mul(v('classical'), add(number(1), mul(r, series)))),
    ],
  ),
]

const text = `(module (import "floorbook" "memory" (memory 1))${loops.join('')}\n)`
const { parseWat } = await wabt()
const module = parseWat('loops.wat', text, { simd: true })
const { buffer } = module.toBinary({})
const source = `// Generated by .ci/generate-simd.mjs; do not edit.

/** Points a block; the module has it built in. */
export const blockLength = ${blockLength}

/** The module in base64, ${buffer.length} bytes. */
export const simdModule =
  '${Buffer.from(buffer).toString('base64')}'
`
const target = process.argv[2] ?? fileURLToPath(new URL('../src/engine/simd-module.ts', import.meta.url))
await writeFile(target, source)
