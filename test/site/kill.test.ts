import { spawn } from 'node:child_process'
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { build } from 'vite'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { manifestName, readManifest } from '../../src/site/manifest.js'
import { recoverSite } from '../../src/site/publish.js'
import { filesBelow } from '../../src/site/stage.js'

const folder = mkdtempSync(join(tmpdir(), 'floorbook-kill-'))
const target = join(folder, 'site')
const script = join(folder, 'publisher.mjs')

/** A process that publishes one version after another, each file naming its version, until it is killed. */
const publisher = `
import { publish } from './publish.mjs'
for (let version = Number(process.argv[2]); ; version++) {
  const files = new Map()
  for (let i = 0; i < 40; i++) files.set('page' + i + '/index.html', 'version ' + version + ' page ' + i)
  await publish(files, process.argv[3])
  process.stdout.write('.')
}
`

beforeAll(async () => {
  await build({
    configFile: false,
    logLevel: 'error',
    build: {
      ssr: new URL('../../src/site/publish.ts', import.meta.url).pathname,
      outDir: folder,
      emptyOutDir: false,
      rollupOptions: { output: { entryFileNames: 'publish.mjs' } },
    },
  })
  writeFileSync(script, publisher)
})
afterAll(() => rmSync(folder, { recursive: true, force: true }))

/** Starts the publisher and kills it some milliseconds after its first site stands. */
async function killAfter(milliseconds: number, start: number): Promise<void> {
  const child = spawn(process.execPath, [script, String(start), target], { stdio: ['ignore', 'pipe', 'inherit'] })
  const ended = new Promise(resolve => child.once('exit', resolve))
  await new Promise(resolve => child.stdout.once('data', resolve))
  await new Promise(resolve => setTimeout(resolve, milliseconds))
  child.kill('SIGKILL')
  await ended
}

describe('a killed process', () => {
  it('leaves a whole site after recovery, whenever it dies', async () => {
    for (let round = 0; round < 12; round++) {
      await killAfter(3 + 7 * round, 1000 * round)
      await recoverSite(target)
      const paths = (await filesBelow(target)).filter(path => path !== manifestName)
      expect(paths).toHaveLength(40)
      const versions = new Set(paths.map(path => readFileSync(join(target, path), 'utf8').replace(/ page .*/, '')))
      expect(versions.size).toBe(1)
      expect([...((await readManifest(target)) ?? new Map()).keys()]).toEqual(paths)
    }
  })
})
