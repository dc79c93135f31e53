import { spawn, spawnSync } from 'node:child_process'
import { resolve } from 'node:path'

const command = resolve('dist/cli/main.js')

export interface Ended {
  readonly code: number | null
  readonly out: string
  readonly err: string
}

/** Runs the compiled command in a folder, as a person would. */
export function floorbook(cwd: string, ...words: readonly string[]): Ended {
  const { status, stdout, stderr } = spawnSync(process.execPath, [command, ...words], { cwd, encoding: 'utf8' })
  return { code: status, out: stdout, err: stderr }
}

/** The same, through a shell line in which `floorbook` stands for the command. */
export function shell(cwd: string, line: string): Ended {
  const text = `set -o pipefail; floorbook() { "${process.execPath}" "${command}" "$@"; }; ${line}`
  const { status, stdout, stderr } = spawnSync('bash', ['-c', text], { cwd, encoding: 'utf8', timeout: 60_000 })
  return { code: status, out: stdout, err: stderr }
}

/** Starts a build and kills it after so many milliseconds; resolves when it is gone, with whether it was killed. */
export function killedBuild(cwd: string, after: number): Promise<boolean> {
  return new Promise(resolved => {
    const child = spawn(process.execPath, [command, 'build'], { cwd, stdio: 'ignore' })
    const timer = setTimeout(() => child.kill('SIGKILL'), after)
    child.once('exit', (_code, signal) => {
      clearTimeout(timer)
      resolved(signal === 'SIGKILL')
    })
  })
}
