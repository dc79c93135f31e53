import { Command, type OutputConfiguration } from 'commander'
import { visible } from '../budget/format-problem.js'
import { starterList } from '../budget/starters.js'
import { version } from './version.js'
import type { ExitCode, Io } from './io.js'

/** Receives the exit code of the command that ran. */
export type Done = (code: ExitCode) => void

const named = 'folder name of a budget, or a path to its folder or file'
const afterwards = `
Exit codes: 0 fine, 1 a budget falls short, 2 a file or the call is wrong, 3 a fault of the engine.`

/**
 * The command line. A command's own module is loaded when that command runs, so that `--help` and `show` do not wait
 * for what `build` needs.
 */
export function program(io: Io, done: Done): Command {
  const root = new Command('floorbook')
    .description('Noise budgets of mechanical sensors: budget files in, physics computed, reports out.')
    .version(version(), '--version', 'print the version')
    .helpOption('--help', 'print this help')
    .helpCommand(false)
    .option('--root <folder>', 'folder that holds budgets/ (otherwise the nearest one upwards)')
    .addHelpText('after', afterwards)
    .configureOutput(outputOf(io))
    .exitOverride()
  addBuild(root, io, done)
  addCheck(root, io, done)
  addShow(root, io, done)
  addServe(root, io, done)
  addNew(root, io, done)
  return root
}

function outputOf(io: Io): OutputConfiguration {
  const width = io.columns ?? 80
  return {
    writeOut: text => io.out(text),
    writeErr: text => io.err(text),
    getOutHelpWidth: () => width,
    getErrHelpWidth: () => width,
    outputError: (text, write) => write(`floorbook: ${oneLine(text)}\n`),
  }
}

/** `error: unknown option '--jsn'\n(Did you mean --json?)` on one line. */
function oneLine(text: string): string {
  return visible(
    text
      .replace(/^error: /, '')
      .trim()
      .replace(/\s*\n\s*/g, ' '),
  )
}

interface Global {
  readonly root?: string
}

function addBuild(root: Command, io: Io, done: Done): void {
  root
    .command('build')
    .summary('compute the budgets and publish the site')
    .description(
      'Computes every budget and publishes the site, whole or not at all. A budget that is refused gets a page that ' +
        'says why. Names choose the budgets whose errors are printed and decide the exit code; the site holds all.',
    )
    .argument('[budget...]', named)
    .helpOption('--help', 'print this help')
    .action(async (budgets: string[], _options: object, command: Command) => {
      const { build } = await import('./commands/build.js')
      done(await build({ ...command.optsWithGlobals<Global>(), budgets }, io))
    })
}

function addCheck(root: Command, io: Io, done: Done): void {
  root
    .command('check')
    .summary('say what is wrong with the budgets, or their best value')
    .description('Reads and computes every budget, or only those named, and writes no file.')
    .argument('[budget...]', named)
    .option('--json', 'print the findings as JSON')
    .helpOption('--help', 'print this help')
    .action(async (budgets: string[], _options: object, command: Command) => {
      const { check } = await import('./commands/check.js')
      done(await check({ ...command.optsWithGlobals<Global & { json?: true }>(), budgets }, io))
    })
}

function addShow(root: Command, io: Io, done: Done): void {
  root
    .command('show')
    .summary('print the total, its contributions and their shares')
    .description('Prints a table of the total, the contributions and their shares of the power.')
    .argument('<budget>', named)
    .option('--at <frequency...>', 'evaluate exactly there: 9e5 (hertz) or "1.243 MHz"')
    .option('--at-file <file>', 'the same from a file, one frequency a line')
    .option('--json', 'print the full curves as JSON, as published in curves.json')
    .helpOption('--help', 'print this help')
    .action(async (budget: string, _options: object, command: Command) => {
      const { show } = await import('./commands/show.js')
      type Options = Global & { at?: string[]; atFile?: string; json?: true }
      done(await show({ ...command.optsWithGlobals<Options>(), budget }, io))
    })
}

function addServe(root: Command, io: Io, done: Done): void {
  root
    .command('serve')
    .summary('show the site on this machine and rebuild it on change')
    .description('Builds the site, serves it on 127.0.0.1 and builds it again whenever a file under budgets/ changes.')
    .option('--port <number>', 'port to listen on (otherwise 8417, or a free one)')
    .helpOption('--help', 'print this help')
    .action(async (_options: object, command: Command) => {
      const { serve } = await import('./commands/serve.js')
      done(await serve(command.optsWithGlobals<Global & { port?: string }>(), io))
    })
}

function addNew(root: Command, io: Io, done: Done): void {
  root
    .command('new')
    .summary('write the first budget of a new sensor')
    .description('Writes budgets/<sensor>/budget.yaml: a budget that builds at once, with every value assumed.')
    .argument('<sensor>', 'name of the new folder below budgets/')
    .requiredOption('--like <kind>', 'what the sensor is like; one of those below')
    .addHelpText('after', () => `\n${starterList()}`)
    .helpOption('--help', 'print this help')
    .action(async (sensor: string, _options: object, command: Command) => {
      const { newBudget } = await import('./commands/new.js')
      done(newBudget({ ...command.optsWithGlobals<Global & { like: string }>(), sensor }, io))
    })
}
