import { watch } from 'node:fs'

/** Editors save a file in several steps; one change is what stays quiet for so long, in milliseconds. */
const quiet = 120

/**
 * Calls `changed` after every change below a folder, never twice at once: what changes during a call leads to one
 * more call after it. Returns how to stop.
 */
export function watchFolder(folder: string, changed: () => Promise<void>): () => void {
  let timer: NodeJS.Timeout | undefined
  let running = false
  let again = false
  const call = async (): Promise<void> => {
    if (running) {
      again = true
      return
    }
    running = true
    again = false
    await changed().finally(() => (running = false))
    if (again) await call()
  }
  const watcher = watch(folder, { recursive: true }, () => {
    clearTimeout(timer)
    timer = setTimeout(() => void call(), quiet)
  })
  // A folder that vanished while it was being looked at is a change like any other.
  watcher.on('error', () => undefined)
  return () => {
    clearTimeout(timer)
    watcher.close()
  }
}
