import { readFileSync } from 'node:fs'

/** Names one running process, so that a number that the system gave away again does not keep a dead build alive. */
export interface Owner {
  readonly pid: number
  /** Start time in clock ticks since boot, where the system tells; empty elsewhere. */
  readonly started: string
}

export function thisProcess(): Owner {
  return { pid: process.pid, started: startTime(process.pid) }
}

/** Whether the process that an owner names still runs. A process of another user counts as running. */
export function isAlive(owner: Owner): boolean {
  try {
    process.kill(owner.pid, 0)
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EPERM') return false
  }
  return owner.started === '' || startTime(owner.pid) === owner.started
}

/** Field 22 of /proc/<pid>/stat; the command's name before it may hold spaces and brackets, so count from the last one. */
function startTime(pid: number): string {
  try {
    const text = readFileSync(`/proc/${pid}/stat`, 'utf8')
    return text.slice(text.lastIndexOf(')') + 2).split(' ')[19]
  } catch {
    return ''
  }
}
