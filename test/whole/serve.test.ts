import { spawn } from 'node:child_process'
import { writeFileSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { expect, it, onTestFinished, vi } from 'vitest'
import { good, misspelt } from './budgets.js'
import { throwaway } from './folder.js'

const patience = { timeout: 60_000, interval: 50 }

it('shows the site, follows changes, survives a bad one and ends when it is told to', async () => {
  const folder = throwaway({ 'budgets/tern/budget.yaml': good })
  const write = (text: string) => writeFileSync(join(folder, 'budgets/tern/budget.yaml'), text)
  const child = spawn(process.execPath, [resolve('dist/cli/main.js'), 'serve', '--port', '0'], { cwd: folder })
  onTestFinished(() => void child.kill('SIGKILL'))
  let out = ''
  let err = ''
  child.stdout.on('data', (piece: Buffer) => (out += piece.toString()))
  child.stderr.on('data', (piece: Buffer) => (err += piece.toString()))
  const ended = new Promise(done => child.once('exit', done))

  await vi.waitFor(() => expect(out).toMatch(/^http:\/\/127\.0\.0\.1:\d+\//m), patience)
  const address = /http:\S+/.exec(out)?.[0] ?? ''
  const report = async (): Promise<string> => await (await fetch(`${address}tern/draft/`)).text()
  expect(await (await fetch(address)).text()).toContain('Membrane on a bench')

  write(good.replace('Membrane on a bench', 'Membrane on a spring'))
  await vi.waitFor(async () => expect(await report()).toContain('Membrane on a spring'), patience)
  expect(err).toBe('')

  write(misspelt)
  await vi.waitFor(() => expect(err).toMatch(/^budgets\/tern\/budget\.yaml:\d+:\d+: .*qualtiy/m), patience)

  write(good)
  await vi.waitFor(async () => expect(await report()).toContain('Membrane on a bench'), patience)
  child.kill('SIGINT')
  expect(await ended).toBe(0)
}, 240_000)
