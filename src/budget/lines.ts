import { declarations } from '../catalogue/declarations.js'
import type { LineClaim, LineSpec, PartName } from '../model/budget.js'
import type { Place } from '../model/problem.js'
import { textOf } from './amount.js'
import type { FieldReader } from './fields.js'
import { nearest } from './nearest.js'
import type { Noise } from './noises.js'
import { quoted } from './quoted.js'
import { child, type Tree, type TreeEntry, type TreeScalar } from './tree.js'
import { where } from './where.js'

const parts: readonly PartName[] = ['imprecision', 'back-action', 'heating']

/** Reads `contributions:`; lines that are wrong are left out, which has been said. */
export function readLines(tree: Tree | undefined, noises: readonly Noise[], reader: FieldReader): LineSpec[] {
  if (tree?.type !== 'map') return []
  const ledger = new Ledger(noises, reader)
  return [...tree.entries.values()].flatMap(entry => {
    const claims = child(entry.value, 'kind') === undefined ? ledger.claim(entry) : ownNoise(entry, reader)
    return claims === null ? [] : [{ ...headOf(entry), claims }]
  })
}

function headOf({ key, keyPlace, value }: TreeEntry): Omit<LineSpec, 'claims'> {
  const text = (name: string) => textOf(child(value, name))
  return { id: key, title: text('title'), about: text('about'), evidence: text('evidence'), place: keyPlace }
}

function ownNoise({ key, keyPlace, value }: TreeEntry, reader: FieldReader): LineSpec['claims'] | null {
  const declaration = declarations.get(textOf(child(value, 'kind')) ?? '')
  if (declaration?.role !== 'contribution') return null
  const owner = { id: key, tree: value, place: keyPlace }
  const { parameters, places } = reader.read(owner, declaration.fields, declaration.exclusive)
  return { kind: declaration.kind, parameters, places }
}

interface Claimed {
  readonly line: string
  readonly place: Place
  readonly part: PartName | null
}

/** Keeps which line claims which noise, so that nothing is counted twice. */
class Ledger {
  readonly #byId: ReadonlyMap<string, Noise>
  readonly #components: ReadonlySet<string>
  readonly #claimed = new Map<string, Claimed[]>()

  constructor(
    noises: readonly Noise[],
    readonly reader: FieldReader,
  ) {
    this.#byId = new Map(noises.map(noise => [noise.id, noise]))
    this.#components = new Set(noises.map(noise => noise.component))
  }

  claim({ key, value }: TreeEntry): LineClaim | null {
    const words = wordsOf(child(value, 'of'))
    const partTree = child(value, 'part')
    const part = parts.find(name => name === textOf(partTree)) ?? null
    if (words.length === 0) return null
    let fine = true
    for (const word of words) {
      const named = this.#noisesOf(word, part)
      if (named === null) fine = false
      for (const noise of named ?? []) this.#enter(noise, { line: key, place: word.place, part })
    }
    return fine ? { of: words.map(word => word.text), part } : null
  }

  #noisesOf(word: TreeScalar, part: PartName | null): readonly Noise[] | null {
    const found = this.#byId.get(word.text)
    const all = found === undefined ? [...this.#byId.values()].filter(noise => noise.component === word.text) : [found]
    if (all.length === 0) {
      if (this.#isOfUnknownKind(word.text)) return []
      this.reader.issues.error('unknown-noise', word.place, this.#unknown(word.text))
      return null
    }
    const whole = part === null ? undefined : all.find(noise => !noise.parts)
    if (whole === undefined) return all
    const message = `\`${whole.id}\` has no parts, so that \`${part}\` of it cannot be claimed; leave \`part\` out or name other noises`
    this.reader.issues.error('no-parts', word.place, message)
    return null
  }

  /** Nothing can be said of the noises of a component whose kind is wrong, which has been said. */
  #isOfUnknownKind(word: string): boolean {
    return this.reader.directory.components.get(word.split('.')[0] ?? '')?.declaration === null
  }

  #unknown(word: string): string {
    const ids = [...this.#byId.keys()]
    const near = nearest(word, [...ids, ...this.#components])
    const known = ids
      .slice(0, 12)
      .map(id => `\`${id}\``)
      .join(', ')
    const meant = near === null ? '' : `; did you mean \`${near}\`?`
    return `no noise is called ${quoted(word)}; there are ${known}${ids.length > 12 ? ' …' : ''}${meant}`
  }

  /** A whole noise contains its parts; equal parts and whole noises exclude each other. */
  #enter(noise: Noise, claimed: Claimed): void {
    const before = this.#claimed.get(noise.id) ?? []
    const clash = before.find(other => other.part === null || claimed.part === null || other.part === claimed.part)
    if (clash !== undefined) {
      const what = claimed.part === null || clash.part === null ? '' : `${claimed.part} of `
      const who =
        clash.line === claimed.line
          ? `twice by \`${clash.line}\``
          : `by \`${clash.line}\` (${where(clash.place, claimed.place)}) and by \`${claimed.line}\``
      this.reader.issues.error(
        'claimed-twice',
        claimed.place,
        `${what}\`${noise.id}\` is claimed ${who}; it may count once: take it out of one of them`,
      )
    }
    this.#claimed.set(noise.id, [...before, claimed])
  }
}

function wordsOf(tree: Tree | undefined): TreeScalar[] {
  if (tree?.type === 'scalar') return tree.text === '' ? [] : [tree]
  return tree?.type === 'list' ? tree.items.filter(item => item.type === 'scalar') : []
}
