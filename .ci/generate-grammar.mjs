// Writes src/quantity/grammar.ts from grammar.peggy; with --check it only compares and fails when the file is stale.
import { readFileSync, writeFileSync } from 'node:fs'
import peggy from 'peggy'
import prettier from 'prettier'

const source = new URL('../src/quantity/grammar.peggy', import.meta.url)
const target = new URL('../src/quantity/grammar.ts', import.meta.url)

export async function generateGrammar() {
  const code = peggy.generate(readFileSync(source, 'utf8'), {
    output: 'source',
    format: 'es',
    allowedStartRules: ['Quantity', 'Unit'],
  })
  const text = [
    // The parser generator emits untyped code, so the types are stated once, at the exports below.
    '// @ts-nocheck -- generated from grammar.peggy by .ci/generate-grammar.mjs; do not edit.',
    "import type { QuantityNode, UnitNode } from './tree.js'",
    code.replace(/^export \{[\s\S]*$/m, '').trimEnd(),
    '',
    'export const parseQuantityTree = (text: string): QuantityNode => peg$parse(text)',
    "export const parseUnitTree = (text: string): UnitNode => peg$parse(text, { startRule: 'Unit' })",
    'export const GrammarError: new () => Error & { readonly location: { readonly start: { readonly offset: number } } } =',
    '  peg$SyntaxError',
    '',
  ].join('\n')
  const options = await prettier.resolveConfig(target)
  return prettier.format(text, { ...options, parser: 'typescript' })
}

if (process.argv[1] === new URL(import.meta.url).pathname) {
  const fresh = await generateGrammar()
  if (process.argv.includes('--check')) {
    if (readFileSync(target, 'utf8') !== fresh) {
      console.error('src/quantity/grammar.ts is stale: run node .ci/generate-grammar.mjs')
      process.exit(1)
    }
  } else {
    writeFileSync(target, fresh)
  }
}
