// Installs the packages of the lock when node_modules does not hold exactly them. Needs Node and npm alone, since it
// runs before anything is installed. The comparison is by content: a clone's file times say nothing.
import { spawnSync } from 'node:child_process'
import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'

/** @typedef {{ version?: string, integrity?: string, optional?: boolean, devOptional?: boolean }} Package */

/**
 * @param {string} file
 * @returns {Map<string, Package> | null}
 */
function packagesOf(file) {
  try {
    const { packages } = JSON.parse(readFileSync(file, 'utf8'))
    return new Map(Object.entries(packages ?? {}).filter(([name]) => name !== ''))
  } catch {
    return null
  }
}

/**
 * True when every package of the lock is installed in its version. One that is optional may be missing, since it may be
 * made for another platform; one that the lock does not know is left over from another lock.
 * @param {string} root
 */
export function installed(root) {
  const wanted = packagesOf(join(root, 'package-lock.json'))
  const found = packagesOf(join(root, 'node_modules', '.package-lock.json'))
  if (wanted === null || found === null) return false
  for (const [name, one] of wanted) {
    const other = found.get(name)
    if (other === undefined && one.optional !== true) return false
    if (other !== undefined && (other.version !== one.version || other.integrity !== one.integrity)) return false
  }
  for (const name of found.keys()) {
    if (!wanted.has(name) || !existsSync(join(root, name, 'package.json'))) return false
  }
  return true
}

/** @param {string} root */
export function ensure(root) {
  if (installed(root)) return
  console.error('Installing the packages of package-lock.json …')
  // The development packages compile the project, so they are wanted also where NODE_ENV says production.
  const run = spawnSync('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'], {
    cwd: root,
    stdio: ['ignore', 2, 2],
    shell: process.platform === 'win32',
  })
  if (run.status !== 0) {
    console.error('npm ci failed; the lines above say why.')
    process.exit(1)
  }
}

const self = fileURLToPath(import.meta.url)
if (process.argv[1] === self) ensure(join(self, '..', '..'))
