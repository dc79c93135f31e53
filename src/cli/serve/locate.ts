import { realpath, stat } from 'node:fs/promises'
import { join, sep } from 'node:path'

/**
 * The file that an address means, or null. The address may hold anything: it is decoded once, taken apart, and every
 * part must be a plain name; what is found must lie inside the folder also after links are followed.
 */
export async function locate(folder: string, address: string): Promise<string | null> {
  const parts = partsOf(address)
  if (parts === null) return null
  try {
    const root = await realpath(folder)
    const found = await realpath(join(root, ...parts))
    if (found !== root && !found.startsWith(root + sep)) return null
    const kind = await stat(found)
    if (kind.isFile()) return found
    if (!kind.isDirectory()) return null
    const index = await realpath(join(found, 'index.html'))
    return index.startsWith(root + sep) && (await stat(index)).isFile() ? index : null
  } catch {
    return null
  }
}

/** Names between the slashes; null where one of them is no plain name. */
export function partsOf(address: string): readonly string[] | null {
  const path = address.replace(/[?#].*$/s, '')
  let decoded: string
  try {
    decoded = decodeURIComponent(path)
  } catch {
    return null
  }
  const parts = decoded.split('/').filter(part => part !== '')
  return parts.some(part => part.startsWith('.') || /[\\:]|\p{Cc}/u.test(part)) ? null : parts
}
