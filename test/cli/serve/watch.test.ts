import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { expect, it, onTestFinished, vi } from 'vitest'
import { watchFolder } from '../../../src/cli/serve/watch.js'

it('calls once after a change, also in a folder below, and never twice at once', async () => {
  const folder = mkdtempSync(join(tmpdir(), 'floorbook-watch-'))
  mkdirSync(join(folder, 'tern'))
  let running = 0
  let most = 0
  let calls = 0
  const stop = watchFolder(folder, async () => {
    most = Math.max(most, ++running)
    calls++
    await new Promise(resolve => setTimeout(resolve, 300))
    running--
  })
  onTestFinished(() => {
    stop()
    rmSync(folder, { recursive: true, force: true })
  })
  writeFileSync(join(folder, 'tern', 'budget.yaml'), 'a')
  writeFileSync(join(folder, 'tern', 'budget.yaml'), 'b')
  await vi.waitFor(() => expect(calls).toBe(1), 5000)
  // Saved again while the first call runs.
  writeFileSync(join(folder, 'tern', 'budget.yaml'), 'c')
  await vi.waitFor(() => expect(calls).toBe(2), 5000)
  await vi.waitFor(() => expect(running).toBe(0), 5000)
  expect(most).toBe(1)
})
