import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { configureDirect } from '../../src/site/direct.js'
import type { EleventyConfig, FinishedBuild } from '../../src/site/eleventy.js'
import { publish } from '../../src/site/publish.js'
import { filesBelow } from '../../src/site/stage.js'

let folder = ''
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'floorbook-direct-'))
  mkdirSync(join(folder, 'budgets', 'whimbrel'), { recursive: true })
  writeFileSync(join(folder, 'budgets', 'whimbrel', 'budget.yaml'), 'format: 1\ntitel: misspelt\n')
})
afterAll(() => rmSync(folder, { recursive: true, force: true }))

/** What Eleventy would keep of its configuration. */
function configuration() {
  const data = new Map<string, unknown>()
  let after: (event: FinishedBuild) => Promise<void> = () => Promise.resolve()
  const config: EleventyConfig = {
    ignores: { delete: () => true },
    setUseGitIgnore: () => undefined,
    setQuietMode: () => undefined,
    setLibrary: () => undefined,
    setFrontMatterParsingOptions: () => undefined,
    setTemplateFormats: () => undefined,
    addGlobalData: (name, value) => void data.set(name, value),
    on: (_, callback) => {
      after = callback
    },
  }
  return { config, data, finish: (event: FinishedBuild) => after(event) }
}

describe('Eleventy started by itself', () => {
  it('gets the pages of the project around the working directory', async () => {
    const { config, data } = configuration()
    const { input } = await configureDirect(config, join(folder, 'budgets'))
    expect(input).toMatch(/templates\/pages$/)
    expect(data.get('broken')).toMatchObject([{ sensor: 'whimbrel', path: 'whimbrel/draft/index.html' }])
  })

  it('leaves a site that the next build knows as its own', async () => {
    const { config, finish } = configuration()
    await configureDirect(config, folder)
    const output = join(folder, 'site')
    mkdirSync(output)
    writeFileSync(join(output, 'index.html'), 'front')
    await finish({ directories: { output }, results: [{ url: '/', content: 'front' }] })
    expect(await filesBelow(output)).toContain('assets/page.css')
    expect(readFileSync(join(output, 'schema', 'budget-1.json'), 'utf8')).toMatch(/^\{/)
    await publish(new Map([['index.html', 'new']]), output)
    expect(await filesBelow(output)).toEqual(['.manifest.json', 'index.html'])
  })

  it('says what is missing outside a project', async () => {
    const elsewhere = mkdtempSync(join(tmpdir(), 'floorbook-nowhere-'))
    mkdirSync(join(elsewhere, '.git'))
    await expect(configureDirect(configuration().config, elsewhere)).rejects.toThrow('no folder `budgets` here or above')
    rmSync(elsewhere, { recursive: true })
  })
})
