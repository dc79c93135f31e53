// Writes the catalogue's indexes from its folders, so that a new kind is one more file and no edit elsewhere.
// `node .ci/generate-catalogue.mjs` writes them; with `--check` it only says which are stale, and fails.
import { readdirSync, readFileSync, writeFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'

const catalogue = new URL('../src/catalogue/', import.meta.url)

const head = '// Generated from the folder beside it by .ci/generate-catalogue.mjs; do not edit.\n'

/**
 * `free-mass` → `freeMass`, `loss` → `loss`.
 * @param {string} kind
 */
function identifier(kind) {
  return kind.replace(/-([a-z0-9])/g, (/** @type {string} */ _, /** @type {string} */ letter) => letter.toUpperCase())
}

/** @param {string} folder */
function kindsIn(folder) {
  const files = readdirSync(new URL(`${folder}/`, catalogue))
  return files
    .filter(file => /^[a-z][a-z0-9-]*\.ts$/.test(file))
    .map(file => file.slice(0, -'.ts'.length))
    .sort()
}

/** @param {string} folder @param {string} name @param {readonly string[]} kinds */
function imports(folder, name, kinds) {
  return kinds.map(kind => `import { ${name} as ${identifier(kind)} } from './${folder}/${kind}.js'\n`).join('')
}

/** @param {readonly string[]} kinds */
function entries(kinds) {
  return kinds.map(kind => `  ${/-/.test(kind) ? `'${kind}': ${identifier(kind)}` : identifier(kind)},\n`).join('')
}

function declarations() {
  const kinds = kindsIn('declarations')
  return (
    head +
    `import type { Declaration } from './declaration.js'\n${imports('declarations', 'declaration', kinds)}\n` +
    `/** Every kind by the word after \`kind:\`. */\n` +
    `export const declarations: ReadonlyMap<string, Declaration> = new Map<string, Declaration>(\n  [\n` +
    kinds.map(kind => `    ${identifier(kind)},\n`).join('') +
    `  ].map(declaration => [declaration.kind, declaration]),\n)\n`
  )
}

function kernels() {
  const kinds = kindsIn('kernels')
  return (
    head +
    `import type { Kernel } from './kernel.js'\n${imports('kernels', 'kernel', kinds)}\n` +
    `/** The numerical face of every kind. */\n` +
    `export const kernels = {\n${entries(kinds)}} as const satisfies { readonly [kind: string]: Kernel }\n`
  )
}

function checks() {
  const kinds = kindsIn('checks')
  return (
    head +
    `import type { Check } from './check.js'\n${imports('checks', 'check', kinds)}\n` +
    `/** What a kind refuses beyond the ranges of its fields; kinds without an entry refuse nothing more. */\n` +
    `export const checks: ReadonlyMap<string, Check> = new Map<string, Check>([\n` +
    kinds.map(kind => `  ['${kind}', ${identifier(kind)}],\n`).join('') +
    `])\n`
  )
}

/** File name → text of every index. */
export function generate() {
  return new Map([
    ['declarations.ts', declarations()],
    ['kernels.ts', kernels()],
    ['checks.ts', checks()],
  ])
}

/** @param {string} file */
function current(file) {
  try {
    return readFileSync(new URL(file, catalogue), 'utf8')
  } catch {
    return ''
  }
}

function main() {
  const stale = [...generate()].filter(([file, text]) => current(file) !== text)
  if (!process.argv.includes('--check')) {
    for (const [file, text] of stale) writeFileSync(new URL(file, catalogue), text)
    return
  }
  for (const [file] of stale) console.error(`src/catalogue/${file} is stale: run node .ci/generate-catalogue.mjs`)
  process.exitCode = stale.length > 0 ? 1 : 0
}

if (process.argv[1] === fileURLToPath(import.meta.url)) main()
