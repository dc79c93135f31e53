import { CommanderError } from 'commander'
import { program } from './program.js'
import { report } from './failure.js'
import { exitCodes, type ExitCode, type Io } from './io.js'

/** Runs one call of the command and gives its exit code; nothing is thrown and no stack trace is shown. */
export async function run(words: readonly string[], io: Io): Promise<ExitCode> {
  let code: ExitCode = exitCodes.fine
  try {
    await program(io, result => (code = result)).parseAsync([...words], { from: 'user' })
    return code
  } catch (error) {
    if (error instanceof CommanderError) return error.exitCode === 0 ? exitCodes.fine : exitCodes.wrong
    return report(error, io)
  }
}
