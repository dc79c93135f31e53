import { readFileSync } from 'node:fs'
import { Ajv, type ValidateFunction } from 'ajv'
import { describe, expect, it } from 'vitest'
import { parse } from 'yaml'
import { editorSchema, partSchema } from '../../src/budget/editor-schema.js'
import { starterText } from '../../src/budget/starter-text.js'
import { starters } from '../../src/budget/starters.js'
import { head } from './composed.js'
import { example, small } from './read.js'

/** As an editor reads it: draft-07 alone, values typed by YAML, no discriminator. */
function compiled(schema: object): ValidateFunction {
  const options = { allErrors: true, strict: true, strictRequired: false, strictTypes: false, allowUnionTypes: true }
  return new Ajv({ ...options, keywords: ['discriminator'] }).compile(schema)
}

const budget = compiled(editorSchema())
const part = compiled(partSchema())

function verdict(validate: ValidateFunction, text: string): unknown {
  return validate(parse(text)) ? 'good' : validate.errors?.map(error => `${error.instancePath} ${error.keyword}`)
}

describe('the schema for editors', () => {
  it('is a valid draft-07 schema, and so is that of parts', () => {
    const ajv = new Ajv({ strict: false })
    expect([editorSchema(), partSchema()].map(schema => ajv.validateSchema(schema))).toEqual([true, true])
  })

  it('accepts whole budgets and starters', () => {
    const texts = [example, small, ...[...starters.values()].map(starter => starterText(starter, 'tern'))]
    for (const text of texts) expect(verdict(budget, text)).toBe('good')
  })

  it.each([
    ['nothing more', ''],
    ['a part of a component', 'components: { drum: { quality: 1e9 }, cavity: { pump: { power: 1 µW } } }'],
    ['a component of its own', 'components: { second: { kind: resonator, mass: 1 ng } }'],
    ['deletions', 'reference: ~\ncomponents: { drum: { losses: { gas: ~ } }, line: null }\ncontributions: { a: ~ }'],
    ['a part of a line', 'contributions: { stray: { density: 1 aN/√Hz }, shot: { title: Shot } }'],
    ['variants', 'variants: { cold: { title: Colder, changes: { base: 20 mK, drum.losses.gas: ~ } } }'],
    ['shared parts', 'include: [../shared/laser.yaml]'],
  ])('accepts %s in a file that builds on another', (_what, text) => {
    expect(verdict(budget, head + text)).toBe('good')
  })

  it.each([
    ['an unknown key', 'componets: {}'],
    ['a key that no kind has', 'components: { drum: { qualty: 1e9 } }'],
    ['a key of another kind', 'components: { drum: { kind: resonator, reads: cavity.back } }'],
    ['an unknown kind', 'components: { drum: { kind: spoon } }'],
    ['an unknown word', 'components: { drum: { law: slow } }'],
    ['a variant without changes', 'variants: { cold: { title: 3, chnges: {} } }'],
  ])('refuses %s there', (_what, text) => {
    expect(budget(parse(head + text))).toBe(false)
  })

  it('wants what a file that builds on another says itself', () => {
    expect(verdict(budget, 'from: a.yaml\n')).toEqual([' required', ' required', ' required', ' if'])
  })

  it('knows shared parts', () => {
    expect(
      verdict(part, 'format: 1\ntitle: Laser\nparameters: { f: 282 THz }\ncomponents: { cavity: { frequency: f } }'),
    ).toBe('good')
    expect(part(parse('format: 1\nmeasurand: { quantity: force }'))).toBe(false)
    expect(part(parse('format: 1\nparameters: { f: { valu: 3 K } }'))).toBe(false)
    expect(part(parse('title: Laser'))).toBe(false)
  })

  it('accepts the budgets of this repository', () => {
    const path = (name: string) => new URL(`../../budgets/${name}/budget.yaml`, import.meta.url)
    for (const name of ['avocet', 'dunlin', 'oystercatcher', 'sanderling'])
      expect([name, verdict(budget, readFileSync(path(name), 'utf8'))]).toEqual([name, 'good'])
  })
})
