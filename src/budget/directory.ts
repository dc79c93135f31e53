import type { Declaration, NameField } from '../catalogue/declaration.js'
import { declarations } from '../catalogue/declarations.js'
import type { Place } from '../model/problem.js'
import { textOf } from './amount.js'
import { nearest } from './nearest.js'
import { quoted, withArticle } from './quoted.js'
import { child, type Tree } from './tree.js'

/** A component as the file lists it, before its fields are read. */
export interface Listed {
  readonly id: string
  readonly tree: Tree
  readonly place: Place
  /** Null where the kind is unknown, which the schema has said. */
  readonly declaration: Declaration | null
}

/** The components of a file by name, and what each can be named for. */
export class Directory {
  readonly components = new Map<string, Listed>()

  constructor(components: Tree | undefined) {
    if (components?.type !== 'map') return
    for (const { key, keyPlace, value } of components.entries.values()) {
      const kind = declarations.get(textOf(child(value, 'kind')) ?? '')
      const declaration = kind?.role === 'component' ? kind : null
      this.components.set(key, { id: key, tree: value, place: keyPlace, declaration })
    }
  }

  ports(id: string): string[] {
    const listed = this.components.get(id)
    const ports = listed?.declaration?.nature === 'field' ? child(listed.tree, 'ports') : undefined
    return ports?.type === 'map' ? [...ports.entries.keys()] : []
  }

  /** Why a word cannot stand for what a field names, as a sentence; null where it can. */
  fault(word: string, of: NameField['of'] | 'detector'): string | null {
    return of === 'port' ? this.#portFault(word) : this.#componentFault(word, of)
  }

  #componentFault(word: string, of: Exclude<NameField['of'], 'port'> | 'detector'): string | null {
    const listed = this.components.get(word)
    const allowed = this.#ids(declaration => abilities[of].test(declaration))
    const choice = allowed.length === 0 ? `this file has no ${abilities[of].noun}` : `there ${list(allowed)}`
    if (listed === undefined) return `no component is called ${quoted(word)}; ${choice}${meant(word, allowed)}`
    if (listed.declaration === null || abilities[of].test(listed.declaration)) return null
    return `\`${word}\` is ${withArticle(listed.declaration.kind)}, but ${abilities[of].wanted} is needed here; ${choice}`
  }

  #portFault(word: string): string | null {
    const [id = '', port] = word.split('.')
    const listed = this.components.get(id)
    const ports = this.ports(id)
    const allowed = this.#outputs()
    if (listed === undefined)
      return `no component is called ${quoted(id)}; light can be read from ${words(allowed)}${meant(word, allowed)}`
    if (listed.declaration === null) return null
    if (listed.declaration.nature === 'chain' && port === undefined) return null
    if (listed.declaration.nature === 'chain')
      return `\`${id}\` is ${withArticle(listed.declaration.kind)} and has no ports; write \`${id}\` alone`
    if (listed.declaration.nature !== 'field')
      return `\`${id}\` is ${withArticle(listed.declaration.kind)}, from which no light can be read; there ${list(allowed)}`
    const own = ports.map(name => `${id}.${name}`)
    if (port === undefined) return `\`${id}\` has several ports; name one: ${words(own)}`
    return ports.includes(port) ? null : `\`${id}\` has no port \`${port}\`; there ${list(own)}${meant(word, own)}`
  }

  #ids(test: (declaration: Declaration) => boolean): string[] {
    return [...this.components.values()]
      .filter(listed => listed.declaration !== null && test(listed.declaration))
      .map(listed => listed.id)
  }

  #outputs(): string[] {
    const chain = this.#ids(declaration => declaration.nature === 'chain')
    const fields = this.#ids(declaration => declaration.nature === 'field')
    return [...fields.flatMap(id => this.ports(id).map(port => `${id}.${port}`)), ...chain]
  }
}

interface Ability {
  readonly wanted: string
  readonly noun: string
  readonly test: (declaration: Declaration) => boolean
}

function hasField(declaration: Declaration, test: (type: string, of: string) => boolean): boolean {
  return Object.values(declaration.fields).some(field => test(field.type, field.type === 'name' ? field.of : ''))
}

const abilities: Readonly<Record<Exclude<NameField['of'], 'port'> | 'detector', Ability>> = {
  mode: {
    wanted: 'a mechanical mode',
    noun: 'mechanical mode',
    test: declaration => declaration.nature === 'mechanical' || declaration.moves === true,
  },
  sensing: {
    wanted: 'a component that senses motion (a cavity or a plain readout)',
    noun: 'component that senses motion',
    test: declaration => hasField(declaration, type => type === 'weights') || declaration.moves === true,
  },
  recorder: {
    wanted: 'a detector of light',
    noun: 'detector of light',
    test: declaration => declaration.nature === 'detector' && hasField(declaration, (_, of) => of === 'port'),
  },
  detector: {
    wanted: 'a detector',
    noun: 'detector',
    test: declaration => declaration.nature === 'detector',
  },
}

function words(ids: readonly string[]): string {
  if (ids.length === 0) return 'nothing in this file'
  const shown = ids.slice(0, 12).map(id => `\`${id}\``)
  return shown.join(', ') + (ids.length > 12 ? ' …' : '')
}

function list(ids: readonly string[]): string {
  return `${ids.length === 1 ? 'is' : 'are'} ${words(ids)}`
}

function meant(word: string, allowed: readonly string[]): string {
  const near = nearest(word, allowed)
  return near === null || allowed.length === 1 ? '' : `; did you mean \`${near}\`?`
}
