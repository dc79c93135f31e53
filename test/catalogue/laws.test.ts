import katex from 'katex'
import { describe, expect, test } from 'vitest'
import type { Declaration, Field, Fields } from '../../src/catalogue/declaration.js'
import { declarations } from '../../src/catalogue/declarations.js'
import { kernels } from '../../src/catalogue/kernels.js'
import { references } from '../../src/catalogue/references.js'
import { assemble } from '../../src/engine/assemble.js'
import { evaluateAtFrequencies } from '../../src/engine/assess.js'
import type { Budget, ComponentSpec, DensitySpec, LineSpec } from '../../src/model/budget.js'
import type { Evaluation } from '../../src/model/evaluation.js'
import { canonicalUnit, isDeclaredName, toDeclared } from '../../src/quantity/declared.js'
import { parseQuantity } from '../../src/quantity/parse.js'
import { budgetOf, component, place, slot } from '../engine/budget-of.js'

/* Laws that every kind of the catalogue must pass, whatever it is. */

const all = [...declarations.values()]

/** Every field of a declaration, groups and maps entered, with its path. */
function fieldsOf(fields: Fields, above = ''): [string, Field][] {
  return Object.entries(fields).flatMap(([name, field]) => {
    const path = above === '' ? name : `${above}.${name}`
    const inner = field.type === 'group' || field.type === 'map' ? fieldsOf(field.fields, path) : []
    return [[path, field] as [string, Field], ...inner]
  })
}

const render = (tex: string): string =>
  katex.renderToString(tex, { displayMode: true, throwOnError: true, strict: 'error', trust: false })

describe.each(all.map(d => [d.kind, d] as const))('%s', (kind, declaration: Declaration) => {
  const fields = fieldsOf(declaration.fields)

  test('has a kernel of the stage that its nature asks for', () => {
    const stages = { mechanical: 'mechanical', field: 'field', chain: 'chain', detector: 'detector', noise: 'noise' }
    expect(kernels[kind as keyof typeof kernels].stage).toBe(stages[declaration.nature])
    expect(declaration.role).toBe(declaration.nature === 'noise' ? 'contribution' : 'component')
  })

  test('typesets: equations, symbols of fields and of equations', () => {
    expect(declaration.equations.length).toBeGreaterThan(0)
    for (const { tex } of declaration.equations) expect(render(tex)).toContain('katex')
    for (const tex of Object.keys(declaration.symbols)) expect(render(tex)).toContain('katex')
    for (const [, field] of fields) {
      if (field.type === 'quantity' && field.symbol !== undefined) expect(render(field.symbol)).toContain('katex')
    }
    // Meanings may hold TeX between dollar signs.
    for (const meaning of Object.values(declaration.symbols)) {
      for (const [, tex] of meaning.matchAll(/\$([^$]+)\$/g)) expect(render(tex)).toContain('katex')
    }
  })

  test('its declared symbols stand in its equations', () => {
    const text = declaration.equations.map(e => e.tex).join(' ')
    for (const symbol of Object.keys(declaration.symbols)) {
      for (const each of symbol.split(/,\s(?=[a-z])/)) expect(squeeze(text), symbol).toContain(squeeze(each))
    }
  })

  test('every letter of its equations is declared', () => {
    const known = knownLetters(declaration, fields)
    for (const { name, tex } of declaration.equations) {
      expect(
        lettersOf(tex).filter(letter => !known.has(letter)),
        `${name}: ${tex}`,
      ).toEqual([])
    }
  })

  test('cites what the list of references holds', () => {
    expect(declaration.references.filter(key => !Object.hasOwn(references, key))).toEqual([])
  })

  test('its fields have dimensions that quantities know, and defaults that fit them', () => {
    for (const [path, field] of fields) {
      if (field.type !== 'quantity') continue
      expect(isDeclaredName(field.dimension), path).toBe(true)
      if (!isDeclaredName(field.dimension)) continue
      expect(typeof canonicalUnit(field.dimension)).toBe('string')
      if (field.default === undefined) continue
      const { value } = toDeclared(parseQuantity(field.default), field.dimension)
      const allowed = {
        positive: value > 0,
        'non-negative': value >= 0,
        any: Number.isFinite(value),
        fraction: value >= 0 && value <= 1,
        'positive-fraction': value > 0 && value <= 1,
      }
      expect(allowed[field.range], `${path}: ${field.default}`).toBe(true)
    }
  })

  test('says what it is in sentences, and what its fields are without a full stop', () => {
    expect(declaration.title).toMatch(/^[A-Z][^.]*$/)
    expect(declaration.summary).toMatch(/\.$/)
    expect(declaration.validity).toMatch(/\.$/)
    for (const [path, field] of fields) expect(field.meaning, path).toMatch(/^[^A-Z.].*[^.]$/)
  })
})

/** TeX without spacing, and with one form of scripts: `{n}` is `n`. */
function squeeze(tex: string): string {
  return tex.replaceAll(/\\[,;!]|\s/g, '').replaceAll(/\{([A-Za-z])\}/g, '$1')
}

/** Symbols of mathematics and constants of nature, which no kind declares. */
const common = new Set(['\\hbar', 'k_B', 'i', 'e', '\\pi', '\\omega', 'f', '\\sum', '\\coth', '\\infty', 'd'])

const notation = new Set(
  [
    'frac',
    'tfrac',
    'left',
    'right',
    'big',
    'Big',
    'quad',
    'sqrt',
    'mathrm',
    'mathcal',
    'mathbb',
    'bar',
    'sum',
    'ge',
    'le',
    'cdot',
    'dagger',
    'dots',
    'text',
    'dot',
    'cos',
    'times',
    'coth',
  ].map(word => `\\${word}`),
)

/** Letters and Greek letters of an equation, without commands, roman words, texts and subscripts. */
function lettersOf(tex: string): string[] {
  const bare = tex
    .replaceAll(/\\(?:mathrm|text)\{[^}]*\}/g, ' ')
    .replaceAll(/[_^]\\?[a-zA-Z]+|[_^]\{[^{}]*\}/g, ' ')
    .replaceAll('\\mathbb 1', ' ')
    .replaceAll(/\\(?:begin|end)\{[a-z]+\}/g, ' ')
  return [...new Set(bare.match(/\\[a-zA-Z]+|[a-zA-Z]/g) ?? [])].filter(
    letter => !notation.has(letter) && !common.has(letter),
  )
}

function knownLetters(declaration: Declaration, fields: readonly [string, Field][]): Set<string> {
  const symbols = [
    ...Object.keys(declaration.symbols),
    ...fields.flatMap(([, field]) => (field.type === 'quantity' && field.symbol !== undefined ? [field.symbol] : [])),
  ]
  // The quantity that an equation defines stands alone before its equals sign.
  const defined = declaration.equations.flatMap(({ tex }) =>
    tex.split(/\\quad|,\\ /).map(part => part.split(/=|\\ge/)[0]),
  )
  return new Set([...symbols, ...defined].flatMap(lettersOf))
}

/* Laws of the numbers: one network that holds every kind, and changes of it. */

const level = (value: number): Extract<DensitySpec, { density: 'level' }> => ({
  density: 'level',
  level: slot(value),
  power: false,
  exponent: slot(0),
  reference: null,
})

const own = (id: string, kind: string, into: string, density: DensitySpec): LineSpec => ({
  id,
  title: null,
  about: null,
  evidence: null,
  place,
  claims: { kind, parameters: { into, density }, places: new Map() },
})

interface Changes {
  readonly temperature?: number
  readonly quality?: number
  readonly quanta?: number
  readonly detector?: 'homodyne' | 'sideband'
  readonly force?: number
  readonly shift?: number
  readonly electronics?: number
}

const noisyLines = ({ force = 1e-17, shift = 1e-18, electronics = 0.1 }: Changes): LineSpec[] => [
  own('stray', 'force-noise', 'drum', level(force)),
  own('coating', 'displacement-noise', 'cavity', level(shift)),
  own('electronics', 'detector-noise', 'detector', { ...level(electronics), power: true }),
]

function everything(changes: Changes = {}): Budget {
  const { temperature = 4, quality = 1e6, quanta = 1e4, detector = 'homodyne' } = changes
  const mode = { mass: slot(1e-12), quality: slot(quality), law: 'viscous', temperature: slot(temperature) }
  const components: ComponentSpec[] = [
    component('drum', 'resonator', { ...mode, frequency: slot(1e6) }),
    component('mirror', 'rigid', { ...mode, frequency: slot(1e5) }),
    component('end', 'free-mass', { mass: slot(1e-6) }),
    component('cavity', 'cavity', {
      frequency: slot(2.8e14),
      modes: new Map(['drum', 'mirror', 'end'].map(id => [id, slot(1)])),
      coupling: slot(1e17),
      ports: new Map([
        ['front', { rate: slot(1e7), occupancy: { base: slot(0.1), rise: slot(0), at: slot(1), exponent: slot(1) } }],
        ['inner', { rate: slot(1e6) }],
      ]),
      pump: { port: 'front', quanta: slot(quanta), detuning: slot(0) },
    }),
    component('cable', 'loss', { reads: 'cavity.front', transmission: slot(0.8), occupancy: slot(0.2) }),
    component('first', 'amplifier', { reads: 'cable', added: slot(0.7), gain: slot(30) }),
    component('detector', detector, {
      reads: 'first',
      efficiency: slot(0.9),
      ...(detector === 'homodyne' ? { angle: slot(Math.PI / 2) } : { side: 'upper' }),
    }),
  ]
  return budgetOf(components, { lines: noisyLines(changes), band: { low: 1e4, high: 1e7, place } })
}

const plain: Budget = budgetOf(
  [
    component('drum', 'resonator', {
      mass: slot(1e-12),
      frequency: slot(1e6),
      quality: slot(1e6),
      law: 'structural',
      temperature: slot(4),
    }),
    component('detector', 'displacement', { modes: new Map([['drum', slot(1)]]), noise: level(1e-15) }),
  ],
  { lines: [own('stray', 'force-noise', 'drum', level(1e-17))], band: { low: 1e4, high: 1e7, place } },
)

/** The same mode read by a detector of another kind. */
const readBy = (kind: string, parameters: ComponentSpec['parameters']): Budget => ({
  ...plain,
  components: [
    plain.components[0],
    component('detector', kind, { modes: new Map([['drum', slot(1)]]), ...parameters }),
  ],
})

const partly = { real: slot(0.3), imaginary: slot(-0.2) }
const beam = { power: slot(1e-3), wavelength: slot(1e-6), efficiency: slot(0.7) }

const arms: Budget = budgetOf(
  [
    component('arms', 'interferometer', {
      arm_length: slot(4e3),
      mirror_mass: slot(40),
      arm_power: slot(1e5),
      wavelength: slot(1e-6),
      bandwidth: slot(600),
      detuning: slot(0),
      ports: new Map([
        ['dark', { share: slot(0.9), squeezing: { level: slot(6), angle: slot(1.2) } }],
        ['lost', { share: slot(0.1) }],
      ]),
    }),
    component('detector', 'homodyne', { reads: 'arms.dark', efficiency: slot(0.9), angle: slot(1.4) }),
  ],
  { measurand: { quantity: 'strain', weights: null, at: null, place }, band: { low: 1e4, high: 1e7, place } },
)

const budgets = {
  homodyne: everything(),
  sideband: everything({ detector: 'sideband' }),
  displacement: plain,
  'linear detector': readBy('linear-detector', {
    imprecision: level(1e-17),
    back_action: level(1e-16),
    correlation: partly,
  }),
  'transducer of displacement': readBy('transducer', {
    per_displacement: slot(1e9),
    voltage_noise: level(1e-9),
    current_noise: level(1e-13),
    correlation: partly,
  }),
  'transducer of velocity': readBy('transducer', {
    per_velocity: slot(1e3),
    voltage_noise: level(1e-9),
    current_noise: level(1e-13),
  }),
  'optical lever': readBy('lever', { ...beam, spot: slot(2e-5), arm: slot(1e-4), lift: slot(1), detection: 'split' }),
  'free-space interferometer': readBy('free-space-interferometer', {
    ...beam,
    reflections: slot(1),
    incidence: slot(0.1),
    arrangement: 'michelson',
  }),
  interferometer: arms,
}

const frequencies = [1e4, 99999, 1e5, 3e5, 999999.5, 1e6, 1.1e7]

const at = (changes: Changes): Evaluation => evaluateAtFrequencies(everything(changes), frequencies)

const psd = (evaluation: Evaluation, id: string): Float64Array => evaluation.sources.find(s => s.id === id)!.psd

const none = { re: 0, im: 0 }

describe('numbers of every kind', () => {
  test('these networks hold every kind', () => {
    const used = Object.values(budgets).flatMap(b => [
      ...b.components.map(c => c.kind),
      ...b.lines.flatMap(l => ('kind' in l.claims ? [l.claims.kind] : [])),
    ])
    expect([...new Set(used)].sort()).toEqual([...declarations.keys()].sort())
  })

  test.each(Object.entries(budgets))(
    '%s: finite, not negative, in the family declared, twice the same',
    (_, budget) => {
      const before = structuredClone({ components: budget.components, lines: budget.lines })
      const [first, second] = [0, 1].map(() => evaluateAtFrequencies(budget, frequencies))
      for (const [k, source] of first.sources.entries()) {
        for (const [i, value] of source.psd.entries()) {
          expect(value, `${source.id} at ${frequencies[i]} Hz`).toBeGreaterThanOrEqual(0)
          expect(Number.isFinite(value)).toBe(true)
          expect(source.own[i]).toBeGreaterThan(0)
        }
        expect(source.psd).toEqual(second.sources[k].psd)
      }
      expect({ components: budget.components, lines: budget.lines }).toEqual(before)
    },
  )

  test('blocks of covariances are Hermitian and positive semidefinite', () => {
    for (const budget of Object.values(budgets)) {
      for (const { vacuum, heating, nodes } of assemble(budget).sources) {
        for (const block of [vacuum, ...(heating === null ? [] : [heating])]) {
          expect(block.length).toBe(nodes.length)
          for (const [i, row] of block.entries()) {
            for (const [j, { re, im }] of row.entries()) {
              expect([re, im]).toEqual([block[j][i].re, block[j][i].im === 0 ? 0 : -block[j][i].im])
            }
          }
          const [a, b, d] = block.length === 2 ? [block[0][0], block[0][1], block[1][1]] : [block[0][0], none, none]
          expect(a.re).toBeGreaterThanOrEqual(0)
          expect(a.re * d.re - b.re ** 2 - b.im ** 2).toBeGreaterThanOrEqual(-1e-12 * a.re * d.re)
        }
      }
    }
  })
})

describe('power laws', () => {
  /** Exponent with which a source follows a parameter that is multiplied by ten. */
  const exponents = (id: string, from: Changes, to: Changes): number[] => {
    const [low, high] = [at(from), at(to)]
    return [...psd(high, id)].map((value, i) => Math.log10(value / psd(low, id)[i]))
  }
  const expectAll = (values: readonly number[], exponent: number, digits: number): void => {
    for (const value of values) expect(value).toBeCloseTo(exponent, digits)
  }

  // k_BT is the limit of the quantum form: (hf/k_BT)²/12 at 4 K and 10 MHz is 1e-9.
  test('baths grow with temperature', () => {
    expectAll(exponents('drum.bath', { temperature: 4 }, { temperature: 40 }), 1, 8)
  })

  test('the bath of a mode that the signal pushes as well falls with quality', () => {
    // Away from its resonance the transfer of the bath does not know Q; there |t/R|² is 1/c² whatever it is.
    const one = (quality: number): Float64Array =>
      psd(
        evaluateAtFrequencies(
          {
            ...plain,
            components: [
              component('drum', 'resonator', {
                mass: slot(1e-12),
                frequency: slot(1e6),
                quality: slot(quality),
                law: 'viscous',
                temperature: slot(4),
              }),
              plain.components[1],
            ],
          },
          frequencies,
        ),
        'drum.bath',
      )
    const [low, high] = [one(1e5), one(1e6)]
    for (const [i, value] of high.entries()) expect(value / low[i]).toBeCloseTo(0.1, 12)
  })

  test('on resonance of the pump back-action grows with power and imprecision falls with it', () => {
    const part = (changes: Changes, of: 'imprecision' | 'backAction'): Float64Array =>
      at(changes).sources.find(s => s.id === 'cavity.front')!.vacuum![of]
    const [weak, strong] = [{ quanta: 1e4 }, { quanta: 1e5 }]
    for (const i of frequencies.keys()) {
      expect(part(strong, 'backAction')[i] / part(weak, 'backAction')[i]).toBeCloseTo(10, 10)
      expect(part(strong, 'imprecision')[i] / part(weak, 'imprecision')[i]).toBeCloseTo(0.1, 12)
    }
    for (const id of ['cable.loss', 'first.added', 'detector.loss', 'electronics']) {
      expectAll(exponents(id, weak, strong), -1, 12)
    }
  })

  test('stated noise grows with its level: amplitudes squared, quanta at once', () => {
    expectAll(exponents('stray', { force: 1e-18 }, { force: 1e-17 }), 2, 12)
    expectAll(exponents('coating', { shift: 1e-19 }, { shift: 1e-18 }), 2, 12)
    expectAll(exponents('electronics', { electronics: 0.1 }, { electronics: 1 }), 1, 12)
  })
})
