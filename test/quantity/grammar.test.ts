import { readFileSync } from 'node:fs'
import { expect, test } from 'vitest'
import { generateGrammar } from '../../.ci/generate-grammar.mjs'

test('the committed parser is the one that the grammar makes', async () => {
  const committed = readFileSync(new URL('../../src/quantity/grammar.ts', import.meta.url), 'utf8')
  expect(committed).toBe(await generateGrammar())
})
