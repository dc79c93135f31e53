/** Files of one project, by paths relative to its root with forward slashes. Nothing outside the root can be reached. */
export interface FileSource {
  /** The bytes of a regular file of at most 32 MB; throws `FileRefusal` for everything else. */
  read(path: string): Uint8Array
  /** Names in a folder, sorted by code unit; throws `FileRefusal` when it is not a folder inside the root. */
  list(path: string): readonly Entry[]
  /** True where works cited are not going to be printed: their entries are then checked for being there, and typeset only if asked for. */
  readonly hurried?: boolean
}

export interface Entry {
  readonly name: string
  readonly nature: 'file' | 'folder' | 'other'
}

/** Why a file was not read; `message` is a clause that fits behind the file's name. */
export class FileRefusal extends Error {
  constructor(
    readonly code: 'missing' | 'outside' | 'not-regular' | 'too-large' | 'unreadable',
    message: string,
  ) {
    super(message)
    this.name = 'FileRefusal'
  }
}

/**
 * Joins a path as a budget writes it to the folder of that budget. Null where the path is absolute, empty, contains a
 * backslash or a control character, or climbs above the root.
 */
export function joinInside(folder: string, path: string): string | null {
  if (path === '' || path.length > 500 || /^\/|^[A-Za-z]:|\\|\p{Cc}/u.test(path)) return null
  const parts: string[] = folder === '' ? [] : folder.split('/')
  for (const part of path.split('/')) {
    if (part === '' || part === '.') continue
    if (part !== '..') parts.push(part)
    else if (parts.pop() === undefined) return null
  }
  return parts.length === 0 ? null : parts.join('/')
}
