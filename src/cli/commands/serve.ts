import { join } from 'node:path'
import { CallError } from '../call-error.js'
import { report } from '../failure.js'
import { exitCodes, type ExitCode, type Io } from '../io.js'
import { outputOf, projectOf } from '../project.js'
import { listen, listenNear } from '../serve/listen.js'
import { siteServer } from '../serve/server.js'
import { watchFolder } from '../serve/watch.js'
import { publishProject } from './build.js'

export interface ServeOptions {
  readonly root?: string
  readonly port?: string
}

const usualPort = 8417

/** Builds the site, serves it to this machine, and builds it again after every change, until it is interrupted. */
export async function serve(options: ServeOptions, io: Io): Promise<ExitCode> {
  const wanted = portOf(options.port)
  const project = projectOf(options.root, io)
  await publishProject(project, [], io)
  const server = siteServer(outputOf(project))
  const port = wanted === null ? await listenNear(server, usualPort) : await listen(server, wanted)
  const stop = watchFolder(join(project.root, 'budgets'), () => again(options, io))
  io.out(`http://127.0.0.1:${port}/ (Ctrl+C ends)\n`)
  await io.interrupted()
  stop()
  server.close()
  server.closeAllConnections()
  return exitCodes.fine
}

/** A rebuild that fails is reported and leaves the site as it was; the next change tries again. */
async function again(options: ServeOptions, io: Io): Promise<void> {
  try {
    await publishProject(projectOf(options.root, io), [], io)
  } catch (error) {
    report(error, io)
  }
}

function portOf(text: string | undefined): number | null {
  if (text === undefined) return null
  const port = Number(text)
  if (!/^\d{1,5}$/.test(text) || port > 65535) {
    throw new CallError(`--port: \`${text}\` is not a port; write a number from 0 (any free one) to 65535`)
  }
  return port
}
