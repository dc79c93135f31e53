import { existsSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { Refusal } from '../../src/model/problem.js'
import { manifestName } from '../../src/site/manifest.js'
import { publish, recoverSite } from '../../src/site/publish.js'
import { filesBelow } from '../../src/site/stage.js'

let folder = ''
let target = ''
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'floorbook-publish-'))
  target = join(folder, 'site')
})
afterEach(() => rmSync(folder, { recursive: true, force: true }))

/** A site whose every file names its version, so that a mixture shows. */
function version(name: string, count = 20): Map<string, string> {
  const files = new Map([['index.html', `${name} front`]])
  for (let i = 0; i < count; i++) files.set(`sensor${i}/draft/index.html`, `${name} page ${i}`)
  files.set(`only-in-${name}.txt`, name)
  return files
}

async function contents(): Promise<Map<string, string>> {
  const paths = (await filesBelow(target)).filter(path => path !== manifestName && path !== '.gitkeep')
  return new Map(paths.map(path => [path, readFileSync(join(target, path), 'utf8')]))
}

const sorted = (files: ReadonlyMap<string, string>) => [...files].toSorted(([a], [b]) => (a < b ? -1 : 1))

async function expectVersion(name: string): Promise<void> {
  expect(sorted(await contents())).toEqual(sorted(version(name)))
}

const workshopFiles = () => readdirSync(join(folder, '.floorbook')).toSorted()

describe('publish', () => {
  it('writes a whole site with a manifest of its files', async () => {
    await publish(version('old'), target)
    await expectVersion('old')
    const manifest = JSON.parse(readFileSync(join(target, manifestName), 'utf8')) as { files: Record<string, string> }
    expect(Object.keys(manifest.files)).toEqual([...version('old').keys()].toSorted())
    expect(manifest.files['index.html']).toMatch(/^[0-9a-f]{64}$/)
    expect(workshopFiles()).toEqual(['.gitignore'])
  })

  it('removes pages that went away and keeps the placeholder', async () => {
    mkdirSync(target)
    writeFileSync(join(target, '.gitkeep'), '')
    await publish(version('old'), target)
    await publish(version('new'), target)
    await expectVersion('new')
    expect(existsSync(join(target, '.gitkeep'))).toBe(true)
  })

  it('does not touch files that did not change', async () => {
    const files = new Map([
      ['same.html', 'same'],
      ['other.html', 'before'],
    ])
    await publish(files, target)
    const before = statSync(join(target, 'same.html'))
    await publish(new Map(files).set('other.html', 'after'), target)
    const after = statSync(join(target, 'same.html'))
    expect(after.mtimeMs).toBe(before.mtimeMs)
    expect(after.ino).toBe(before.ino)
    expect(readFileSync(join(target, 'other.html'), 'utf8')).toBe('after')
  })

  it('leaves everything as it is when nothing changed', async () => {
    await publish(version('old'), target)
    const before = statSync(target)
    await publish(version('old'), target)
    expect(statSync(target).ino).toBe(before.ino)
    expect(statSync(target).mtimeMs).toBe(before.mtimeMs)
  })

  it('repairs a page that was edited by hand', async () => {
    await publish(version('old'), target)
    writeFileSync(join(target, 'index.html'), 'edited')
    await publish(version('old'), target)
    await expectVersion('old')
  })

  it('refuses a folder with files that no build has made', async () => {
    mkdirSync(target)
    writeFileSync(join(target, 'thesis.tex'), 'years of work')
    await expect(publish(version('new'), target)).rejects.toThrow(Refusal)
    await expect(publish(version('new'), target)).rejects.toThrow(
      '`thesis.tex` in the output folder was not made by a build; move them away or choose another output folder',
    )
    expect(readFileSync(join(target, 'thesis.tex'), 'utf8')).toBe('years of work')
  })

  it('leaves the old site when a file of the new one cannot be written', async () => {
    await publish(version('old'), target)
    const impossible = version('new').set('index.html/below-a-file.html', 'no room')
    await expect(publish(impossible, target)).rejects.toThrow()
    await expectVersion('old')
    expect(workshopFiles()).toEqual(['.gitignore'])
  })

  it('publishes one of two builds that run at once, whole', async () => {
    await publish(version('old'), target)
    for (let round = 0; round < 5; round++) {
      await Promise.all([publish(version('left'), target), publish(version('right'), target)])
      const name = readFileSync(join(target, 'index.html'), 'utf8').split(' ')[0]
      expect(['left', 'right']).toContain(name)
      await expectVersion(name)
      expect(workshopFiles()).toEqual(['.gitignore'])
    }
  })

  it('ignores its own workshop in git', async () => {
    await publish(version('old'), target)
    expect(readFileSync(join(folder, '.floorbook', '.gitignore'), 'utf8')).toBe('*\n')
  })
})

describe('a build that dies', () => {
  const steps = [
    ['staged', 'old'],
    ['journal written', 'old'],
    ['old moved away', 'new'],
    ['new in place', 'new'],
    ['journal removed', 'new'],
  ] as const

  /** Runs a build up to a step and leaves it hanging there for ever, as if the process had been killed. */
  async function dieAt(step: string, files: Map<string, string>): Promise<void> {
    const dead = { pid: 2 ** 22 + 1, started: '1' }
    await new Promise<void>((resolve, reject) => {
      const reached = (name: string): Promise<void> => {
        if (name !== step) return Promise.resolve()
        resolve()
        return new Promise(() => undefined)
      }
      publish(files, target, { owner: dead, reached }).then(() => reject(new Error(`never reached ${step}`)), reject)
    })
  }

  it.each(steps)('after "%s" is finished or undone by the next command: %s site', async (step, expected) => {
    await publish(version('old'), target)
    await dieAt(step, version('new'))
    await recoverSite(target)
    await expectVersion(expected)
    expect(workshopFiles()).toEqual(['.gitignore'])
  })

  it.each(steps)('after "%s" does not keep the next build from publishing', async step => {
    await publish(version('old'), target)
    await dieAt(step, version('new'))
    await publish(version('newest'), target)
    await expectVersion('newest')
    expect(workshopFiles()).toEqual(['.gitignore'])
  })

  it.each(steps)('after "%s" on a first build leaves nothing that a second one stumbles over', async step => {
    await dieAt(step, version('new'))
    await publish(version('newest'), target)
    await expectVersion('newest')
  })

  it('takes over the lock of a dead process only', async () => {
    await publish(version('old'), target)
    writeFileSync(join(folder, '.floorbook', 'site.lock'), JSON.stringify({ pid: process.pid, started: 'another life' }))
    await publish(version('new'), target)
    await expectVersion('new')
  })
})
