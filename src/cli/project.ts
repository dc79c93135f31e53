import { join } from 'node:path'
import { findProject, type Project } from '../budget/project.js'
import { CallError } from './call-error.js'
import type { Io } from './io.js'

/** The project that a call is about, or null where there is none around the working directory. */
export function projectAround(root: string | undefined, io: Io): Project | null {
  const project = findProject({ cwd: io.cwd, root })
  if (project === null && root !== undefined) {
    throw new CallError(`--root: \`${root}\` holds no folder \`budgets\`; name the folder that does`)
  }
  return project
}

/** The same for calls that need one. */
export function projectOf(root: string | undefined, io: Io): Project {
  const project = projectAround(root, io)
  if (project !== null) return project
  throw new CallError('no folder `budgets` here or above; make one, go to a project or name it with --root')
}

export function outputOf(project: Project): string {
  return join(project.root, ...project.site.output.split('/'))
}
