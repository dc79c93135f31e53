import { exitCodes, type Io } from './io.js'

/**
 * The process's own streams. Whoever reads the output may stop early (`| head -1`): the write then fails with EPIPE,
 * which is no error of this program, so it ends at once and quietly. A full disk is told in a line.
 */
export function terminal(): Io {
  for (const stream of [process.stdout, process.stderr]) {
    stream.on('error', (error: NodeJS.ErrnoException) => {
      if (error.code === 'EPIPE') process.exit(process.exitCode ?? 0)
      process.stderr.write(`floorbook: the output could not be written: ${error.message}\n`)
      process.exit(exitCodes.fault)
    })
  }
  return {
    out: text => void process.stdout.write(text),
    err: text => void process.stderr.write(text),
    cwd: process.cwd(),
    columns: process.stdout.isTTY ? process.stdout.columns : null,
    color: process.stdout.isTTY && process.env.NO_COLOR === undefined,
    interrupted: () =>
      new Promise(resolve => {
        for (const signal of ['SIGINT', 'SIGTERM'] as const) process.once(signal, () => resolve())
      }),
  }
}
