import { run } from '../../src/cli/run.js'
import type { ExitCode, Io } from '../../src/cli/io.js'

export interface Said {
  readonly code: ExitCode
  readonly out: string
  readonly err: string
}

/** Runs one call in this process and keeps what it says. */
export async function call(words: readonly string[], cwd: string): Promise<Said> {
  let out = ''
  let err = ''
  const io: Io = {
    out: text => void (out += text),
    err: text => void (err += text),
    cwd,
    columns: null,
    color: false,
    interrupted: () => Promise.resolve(),
  }
  const code = await run(words, io)
  return { code, out, err }
}
