import { writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { isDeepStrictEqual } from 'node:util'
import { expect, it } from 'vitest'
import { good } from './budgets.js'
import { throwaway } from './folder.js'
import { floorbook, killedBuild } from './process.js'
import { snapshot } from './snapshot.js'

it('leaves the old site or the new one when a build is killed at any moment', async () => {
  const folder = throwaway({ 'budgets/tern/budget.yaml': good })
  const site = () => snapshot(join(folder, 'site'))
  const write = (title: string) =>
    writeFileSync(join(folder, 'budgets/tern/budget.yaml'), good.replace('Membrane on a bench', title))

  write('New')
  const start = performance.now()
  expect(floorbook(folder, 'build').code).toBe(0)
  const duration = performance.now() - start
  const newer = site()
  write('Old')
  expect(floorbook(folder, 'build').code).toBe(0)
  const older = site()
  expect(older).not.toEqual(newer)

  write('New')
  // Between its two renames the folder is away; the next command brings one of the two back.
  const known = (found: object): string => {
    if (Object.keys(found).length === 0) return 'away'
    return isDeepStrictEqual(found, older) ? 'old' : isDeepStrictEqual(found, newer) ? 'new' : 'mixed'
  }
  let killed = 0
  const states: string[] = []
  for (let step = 0; step < 14; step++) {
    // Most of the moments lie in the last part of the build, where files are written.
    if (await killedBuild(folder, duration * (0.3 + 0.055 * step))) killed++
    states.push(known(site()))
  }
  expect(killed).toBeGreaterThan(0)
  expect(states).toContain('old')
  expect(states).not.toContain('mixed')
  expect(floorbook(folder, 'build').code).toBe(0)
  expect(site()).toEqual(newer)
})
