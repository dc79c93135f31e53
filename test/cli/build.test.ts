import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { good, misspelt } from '../whole/budgets.js'
import { throwaway } from '../whole/folder.js'
import { call } from './fake-io.js'

const files = { 'budgets/tern/budget.yaml': good, 'budgets/gull/budget.yaml': good }
const page = (folder: string, path: string): string => readFileSync(join(folder, 'site', path), 'utf8')

describe('build', () => {
  it('keeps the pages of the budgets that the call does not name', async () => {
    const folder = throwaway(files)
    expect(await call(['build', 'tern'], folder)).toMatchObject({ code: 0, err: '' })
    const front = page(folder, 'index.html')
    for (const sensor of ['tern', 'gull']) {
      expect(front).toContain(`href="${sensor}/draft/index.html"`)
      expect(page(folder, `${sensor}/draft/index.html`)).toContain('Membrane on a bench')
      expect(existsSync(join(folder, 'site', sensor, '1.0', 'curves.json'))).toBe(true)
    }
    expect(await call(['build'], folder)).toMatchObject({ code: 0, err: '' })
    expect(page(folder, 'index.html')).toBe(front)
  })

  it('tells only of the budgets that the call names', async () => {
    const folder = throwaway({ ...files, 'budgets/gull/budget.yaml': misspelt })
    expect(await call(['build', 'tern'], folder)).toMatchObject({ code: 0, err: '' })
    expect(page(folder, 'gull/draft/index.html')).toContain('qualtiy')
    const { code, err } = await call(['build', 'gull'], folder)
    expect(code).toBe(2)
    expect(err).toContain('budgets/gull/budget.yaml')
    expect(page(folder, 'tern/draft/index.html')).toContain('Membrane on a bench')
  })

  it('puts title and subtitle of the site on its front page', async () => {
    const folder = throwaway({ ...files, 'budgets/site.yaml': 'title: Shore\nsubtitle: Sensors of the shore\n' })
    expect((await call(['build'], folder)).code).toBe(0)
    expect(page(folder, 'index.html')).toContain('<p class="lead">Sensors of the shore</p>')
  })
})

describe('check', () => {
  const wanted = `requirements:
  proposal: { of: total, at: 1.243 MHz, below: 1 fN/√Hz }
  dream: { of: thermal, at: 1.243 MHz, below: 1 aN/√Hz }
`

  it('prints each requirement with its number and uncertainty, and ends in 1 when one is missed', async () => {
    const folder = throwaway({ 'budgets/tern/budget.yaml': good + wanted })
    const { code, out } = await call(['check'], folder)
    expect(code).toBe(1)
    const [, proposal, dream] = out.split('\n')
    expect(proposal).toMatch(
      /^ {2}proposal: met by [\d.]+ dB, [\d.]+ standard uncertainties: total [\d.]+\(\d+\) aN\/√Hz at 1.243 MHz, wanted below 1 fN\/√Hz$/,
    )
    expect(dream).toMatch(/^ {2}dream: missed by [\d.]+ dB, /)
  })

  it('gives the same as JSON', async () => {
    const folder = throwaway({ 'budgets/tern/budget.yaml': good + wanted })
    const { code, out } = await call(['check', '--json'], folder)
    const [{ exitCode, reference, requirements }] = JSON.parse(out)
    expect([code, exitCode]).toEqual([1, 1])
    expect(reference).toMatchObject({ frequency: 1.243e6, unit: 'N/√Hz' })
    expect(requirements.map((each: { id: string; met: boolean }) => [each.id, each.met])).toEqual([
      ['proposal', true],
      ['dream', false],
    ])
    expect(requirements[0].spread.combined).toBeGreaterThan(0)
  })

  it('ends in 2 where another budget is wrong', async () => {
    const folder = throwaway({
      ...files,
      'budgets/tern/budget.yaml': good + wanted,
      'budgets/gull/budget.yaml': misspelt,
    })
    expect((await call(['check'], folder)).code).toBe(2)
  })
})
