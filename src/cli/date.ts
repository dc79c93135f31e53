import { execFileSync } from 'node:child_process'

/**
 * Day of what is built, in UTC (`2026-03-14`), so that the same input gives the same bytes: SOURCE_DATE_EPOCH, or the
 * commit that the folder stands at, or null outside git. Never the clock.
 */
export function dateOf(root: string, env: NodeJS.ProcessEnv = process.env): string | null {
  return day(env.SOURCE_DATE_EPOCH) ?? day(commitTime(root, env))
}

function day(seconds: string | undefined): string | null {
  if (seconds === undefined || !/^\d{1,11}$/.test(seconds)) return null
  return new Date(Number(seconds) * 1000).toISOString().slice(0, 10)
}

/** Committer's time in seconds; the environment is clean, so that no variable points git elsewhere. */
function commitTime(root: string, env: NodeJS.ProcessEnv): string | undefined {
  const kept = Object.fromEntries(
    ['PATH', 'HOME', 'SYSTEMROOT'].flatMap(name => (env[name] ? [[name, env[name]]] : [])),
  )
  try {
    const words = ['--no-replace-objects', 'log', '-z', '-1', '--format=%ct', '--end-of-options', 'HEAD']
    const text = execFileSync('git', words, {
      cwd: root,
      env: { ...kept, GIT_OPTIONAL_LOCKS: '0', LC_ALL: 'C' },
      encoding: 'utf8',
      stdio: ['ignore', 'pipe', 'ignore'],
      timeout: 10_000,
    })
    return text.replace(/[\0\n]+$/, '')
  } catch {
    return undefined
  }
}
