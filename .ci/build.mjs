// Compiles src/ into dist/ when dist/ was made from other contents. The new folder is made beside the old one and
// takes its place at the end, so that a failed compilation leaves the old one and no module of a deleted file stays.
import { spawnSync } from 'node:child_process'
import { createHash } from 'node:crypto'
import { cpSync, existsSync, mkdirSync, readFileSync, readdirSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import { join, relative } from 'node:path'
import { fileURLToPath, pathToFileURL } from 'node:url'

const root = join(fileURLToPath(import.meta.url), '..', '..')
const stamp = 'made-from'

/** @param {string} folder */
function filesBelow(folder) {
  return readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter(entry => entry.isFile())
    .map(entry => join(entry.parentPath, entry.name))
    .sort()
}

function digestOfSources() {
  const hash = createHash('sha256')
  const settings = ['package.json', 'package-lock.json', 'tsconfig.json', '.ci/build.mjs'].map(name => join(root, name))
  for (const file of [...settings, ...filesBelow(join(root, 'src'))]) {
    hash
      .update(`${relative(root, file)}\0`)
      .update(readFileSync(file))
      .update('\0')
  }
  return hash.digest('hex')
}

/** @param {string} digest */
function upToDate(digest) {
  try {
    return readFileSync(join(root, 'dist', stamp), 'utf8') === digest
  } catch {
    return false
  }
}

/** @param {string} target */
function compile(target) {
  const tsc = join(root, 'node_modules', 'typescript', 'bin', 'tsc')
  const run = spawnSync(process.execPath, [tsc, '--noEmitOnError', '--outDir', target], { cwd: root, stdio: 'inherit' })
  return run.status === 0
}

/**
 * What the compiler does not write: generated parsers and their types, tables.
 * @param {string} target
 */
function copyOthers(target) {
  const source = join(root, 'src')
  for (const file of filesBelow(source)) {
    const plain = file.endsWith('.ts') && !file.endsWith('.d.ts')
    if (!plain) cpSync(file, join(target, relative(source, file)))
  }
}

/**
 * The schemas for editors, so that the package has them as files.
 * @param {string} target
 */
async function writeSchemas(target) {
  // Below node_modules/ no package.json of this project says what kind of modules these are.
  const note = join(target, 'package.json')
  writeFileSync(note, '{ "type": "module" }')
  const { schemaFiles } = await import(pathToFileURL(join(target, 'budget', 'editor-schema.js')).href)
  rmSync(note)
  mkdirSync(join(target, 'schema'))
  for (const [name, text] of schemaFiles()) writeFileSync(join(target, 'schema', name), text)
}

/** @param {string} target */
function swap(target) {
  const old = `${target}-old`
  rmSync(old, { recursive: true, force: true })
  if (existsSync(join(root, 'dist'))) renameSync(join(root, 'dist'), old)
  renameSync(target, join(root, 'dist'))
  rmSync(old, { recursive: true, force: true })
}

async function build() {
  const digest = digestOfSources()
  if (upToDate(digest)) return
  console.error('Compiling …')
  const target = join(root, 'node_modules', '.cache', 'floorbook', `dist-${process.pid}`)
  rmSync(target, { recursive: true, force: true })
  mkdirSync(target, { recursive: true })
  try {
    if (!compile(target)) process.exit(1)
    copyOthers(target)
    await writeSchemas(target)
    writeFileSync(join(target, stamp), digest)
    swap(target)
  } finally {
    rmSync(target, { recursive: true, force: true })
  }
}

await build()
