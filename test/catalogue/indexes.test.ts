import { readdirSync, readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { declarations } from '../../src/catalogue/declarations.js'
import { generate } from '../../.ci/generate-catalogue.mjs'

const catalogue = new URL('../../src/catalogue/', import.meta.url)
const indexes = generate()

function files(folder: string): string[] {
  return readdirSync(new URL(folder, catalogue)).map(file => file.replace(/\.ts$/, ''))
}

describe('the catalogue’s indexes', () => {
  it.each([...indexes.keys()])('%s is as the generator writes it', file => {
    expect(readFileSync(new URL(file, catalogue), 'utf8')).toBe(indexes.get(file))
  })

  it('names every file after its kind', () => {
    expect([...declarations.keys()].sort()).toEqual(files('declarations').sort())
  })

  it('has a kernel for every declaration and none besides', () => {
    expect(files('kernels').sort()).toEqual(files('declarations').sort())
  })
})
