import { readdirSync, readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { checks } from '../../src/catalogue/checks.js'
import { declarations } from '../../src/catalogue/declarations.js'
import { kernels } from '../../src/catalogue/kernels.js'
import { generate } from '../../.ci/generate-catalogue.mjs'

const indexes = generate()

function kindsIn(folder: string): string[] {
  const files = readdirSync(new URL(`../../src/catalogue/${folder}`, import.meta.url))
  return files.map(file => file.replace(/\.ts$/, '')).sort()
}

describe('the catalogue’s indexes', () => {
  it.each([...indexes.keys()])('%s is as the generator writes it', file => {
    expect(readFileSync(new URL(`../../src/catalogue/${file}`, import.meta.url), 'utf8')).toBe(indexes.get(file))
  })

  it('name every file after its kind', () => {
    expect([...declarations.keys()].sort()).toEqual(kindsIn('declarations'))
  })

  it('have a kernel for every declaration and none besides', () => {
    expect(kindsIn('kernels')).toEqual(kindsIn('declarations'))
    expect(Object.keys(kernels).sort()).toEqual(kindsIn('declarations'))
  })

  it('have checks of declared kinds only', () => {
    expect([...checks.keys()].filter(kind => !declarations.has(kind))).toEqual([])
  })
})
