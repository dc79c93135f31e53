import { readFileSync } from 'node:fs'

/** Of the package that this file belongs to. */
export function version(): string {
  const text = readFileSync(new URL('../../package.json', import.meta.url), 'utf8')
  const { version } = JSON.parse(text) as { version: string }
  return version
}
