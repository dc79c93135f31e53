import { formatProblem, visible } from '../budget/format-problem.js'
import { Refusal, type Problem } from '../model/problem.js'
import { CallError } from './call-error.js'
import { exitCodes, type ExitCode, type Io } from './io.js'

/** What became of a budget or a call that was not carried out. */
export interface Failure {
  readonly code: ExitCode
  /** Where the input is refused; empty for other failures. */
  readonly problems: readonly Problem[]
  /** One line each, ready for a terminal. */
  readonly lines: readonly string[]
}

/**
 * Whose fault an error is. An input that is refused and a file that cannot be read or written are the caller's to mend;
 * everything else is a bug of floorbook, said in one line.
 */
export function failureOf(error: unknown): Failure {
  if (error instanceof Refusal) {
    return { code: exitCodes.wrong, problems: error.problems, lines: error.problems.map(formatProblem) }
  }
  const message = error instanceof Error ? error.message : String(error)
  if (error instanceof CallError || isSystemError(error)) return plain(exitCodes.wrong, message)
  return plain(exitCodes.fault, `fault of the engine, not of the input: ${message}`)
}

export function report(error: unknown, io: Io): ExitCode {
  const { code, lines } = failureOf(error)
  for (const line of lines) io.err(`${line}\n`)
  return code
}

function plain(code: ExitCode, message: string): Failure {
  return { code, problems: [], lines: [`floorbook: ${visible(message)}`] }
}

/** Of the operating system: a missing folder, a full disk, a port that is taken. */
function isSystemError(error: unknown): boolean {
  return error instanceof Error && 'syscall' in error && 'code' in error
}
