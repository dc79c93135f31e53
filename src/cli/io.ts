/** Everything through which a command touches the world, so that tests can stand in for it. */
export interface Io {
  /** Text for the person or program that asked. */
  out(text: string): void
  /** Errors, warnings and progress. */
  err(text: string): void
  /** Folder that relative names start from. */
  readonly cwd: string
  /** Width of the terminal in characters, or null where output goes elsewhere. */
  readonly columns: number | null
  readonly color: boolean
  /** Resolves when the person ends a command that runs on (`serve`). */
  interrupted(): Promise<void>
}

/** Exit codes; over several budgets the highest counts. */
export const exitCodes = { fine: 0, short: 1, wrong: 2, fault: 3 } as const
export type ExitCode = (typeof exitCodes)[keyof typeof exitCodes]

export function worst(codes: readonly ExitCode[]): ExitCode {
  return codes.reduce<ExitCode>((a, b) => (b > a ? b : a), exitCodes.fine)
}
