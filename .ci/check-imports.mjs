// Checks that the rooms of src/ import one way only: what stands lower in the list may use what stands above it.
// Type-only imports count as well, except those of model/, whose types every room speaks. Circles are refused too.
import { existsSync, readFileSync, readdirSync } from 'node:fs'
import { builtinModules } from 'node:module'
import { join, posix, relative, sep } from 'node:path'
import { fileURLToPath } from 'node:url'

export const rooms = [
  'quantity',
  'physics',
  'model',
  'catalogue',
  'engine',
  'figure',
  'browser',
  'budget',
  'revisions',
  'report',
  'site',
  'cli',
]
const freeOfNode = new Set(rooms.slice(0, rooms.indexOf('browser') + 1))
const builtin = new Set(builtinModules)

/** @typedef {{ specifier: string, typeOnly: boolean, line: number }} Import */

const statement =
  /^[ \t]*(?:import|export)\s+(type\s+)?(?:[\w*${}\s,]*?\bfrom\s*)?(['"])([^'"\n]+)\2|\bimport\s*\(\s*(['"`])([^'"`\n]+)\4/gm

/**
 * Comments are blanked out first, keeping line breaks, so that an example in a docstring is not an import. Text in
 * quotes is matched first and kept, since a path may hold two slashes.
 * @param {string} text
 */
function withoutComments(text) {
  return text.replace(/'(?:\\.|[^'\\\n])*'|"(?:\\.|[^"\\\n])*"|\/\*[\s\S]*?\*\/|\/\/[^\n]*/g, found =>
    found.startsWith('/') ? found.replace(/[^\n]/g, ' ') : found,
  )
}

/**
 * @param {string} source
 * @returns {Import[]}
 */
export function importsOf(source) {
  const text = withoutComments(source)
  return [...text.matchAll(statement)].map(match => ({
    specifier: match[3] ?? match[5],
    typeOnly: match[1] !== undefined || onlyTypes(match[0]),
    line: text.slice(0, match.index + match[0].search(/\S/)).split('\n').length,
  }))
}

/**
 * True for `import { type A, type B } from`.
 * @param {string} text
 */
function onlyTypes(text) {
  const names = /^\s*(?:import|export)\s*\{([^}]*)\}/.exec(text)?.[1]
  if (names === undefined) return false
  const parts = names.split(',').map(name => name.trim())
  return parts.every(name => name === '' || name.startsWith('type '))
}

/**
 * @param {string} file path below src, forward slashes
 * @param {Import} one
 * @returns {string | null} what is wrong
 */
function fault(file, one) {
  const room = file.split('/')[0]
  if (!one.specifier.startsWith('.')) return faultOfPackage(room, one.specifier)
  const target = posix.join(posix.dirname(file), one.specifier)
  const other = target.split('/')[0]
  if (other === '..') return one.specifier.endsWith('.json') ? null : `imports ${one.specifier}, which lies outside src`
  if (!rooms.includes(other)) return `imports ${one.specifier}, which lies in no room`
  if (room === 'engine' && /^catalogue\/declarations(\/|\.)/.test(target)) {
    return `the engine must not import ${target}: kernels and their index are all that it needs`
  }
  if (other === 'model' && one.typeOnly) return null
  if (rooms.indexOf(other) <= rooms.indexOf(room)) return null
  return `${room} must not import ${other}, which stands below it`
}

/**
 * @param {string} room
 * @param {string} specifier
 */
function faultOfPackage(room, specifier) {
  const ofNode = specifier.startsWith('node:') || builtin.has(specifier.split('/')[0])
  return ofNode && freeOfNode.has(room) ? `${room} must be free of Node and imports ${specifier}` : null
}

/** @param {string} folder */
function sourcesIn(folder) {
  return readdirSync(folder, { recursive: true, encoding: 'utf8' })
    .filter(name => /\.(ts|js|mts|mjs)$/.test(name))
    .map(name => name.split(sep).join('/'))
    .sort()
}

/**
 * Every circle of files, found once, as the list of its files.
 * @param {Map<string, string[]>} graph
 */
function circles(graph) {
  /** @type {string[][]} */
  const found = []
  const done = new Set()
  /** @param {string} file @param {string[]} path */
  const visit = (file, path) => {
    const start = path.indexOf(file)
    if (start >= 0) {
      found.push([...path.slice(start), file])
      return
    }
    if (done.has(file)) return
    for (const next of graph.get(file) ?? []) visit(next, [...path, file])
    done.add(file)
  }
  for (const file of graph.keys()) visit(file, [])
  return found
}

/**
 * @param {string} folder the src folder
 * @returns {string[]} one line a fault
 */
export function checkImports(folder) {
  const files = sourcesIn(folder)
  const known = new Set(files)
  /** @type {string[]} */
  const faults = []
  /** @type {Map<string, string[]>} */
  const graph = new Map()
  for (const file of files) {
    if (!rooms.includes(file.split('/')[0])) faults.push(`src/${file}:1: lies in no room`)
    const imports = importsOf(readFileSync(join(folder, file), 'utf8'))
    for (const one of imports) {
      const wrong = fault(file, one)
      if (wrong !== null) faults.push(`src/${file}:${one.line}: ${wrong}`)
    }
    graph.set(file, targets(file, imports, known))
  }
  return [...faults, ...circles(graph).map(circle => `src/${circle[0]}:1: imports in a circle: ${circle.join(' → ')}`)]
}

/**
 * @param {string} file
 * @param {Import[]} imports
 * @param {Set<string>} known
 */
function targets(file, imports, known) {
  const paths = imports
    .filter(one => one.specifier.startsWith('.'))
    .map(one => posix.join(posix.dirname(file), one.specifier))
  return paths.map(path => (known.has(path) ? path : path.replace(/\.js$/, '.ts'))).filter(path => known.has(path))
}

function main() {
  const root = process.argv[2] ?? join(fileURLToPath(import.meta.url), '..', '..')
  const folder = join(root, 'src')
  const faults = existsSync(folder) ? checkImports(folder) : [`${relative(process.cwd(), folder)}: no such folder`]
  const files = existsSync(folder) ? sourcesIn(folder).length : 0
  // A checker that reads nothing must not be green.
  if (files === 0) faults.push('no source files found')
  for (const line of faults) console.error(line)
  if (faults.length > 0) process.exit(1)
  console.log(`imports of ${files} files point one way`)
}

if (process.argv[1] === fileURLToPath(import.meta.url)) main()
