import { declarations } from '../catalogue/declarations.js'
import type { ComponentSpec, LineSpec, MeasurandSpec, Requirement } from '../model/budget.js'
import type { DensityOf } from '../quantity/declared.js'
import { textOf } from './amount.js'
import { readBand, type BandRead } from './band.js'
import { suggestion } from './nearest.js'
import { impliedNoises } from './noises.js'
import { quoted } from './quoted.js'
import { child, type TreeEntry, type TreeMap, type TreeScalar, type Tree } from './tree.js'
import { useAs, useAsDensity, type Use } from './use.js'
import type { Values } from './values.js'

/** What requirements can speak of. */
export interface Subject {
  readonly components: readonly ComponentSpec[]
  readonly lines: readonly LineSpec[]
  readonly measurand: MeasurandSpec
  readonly band: BandRead
}

export const limitIds = ['sql', 'correlation_limit', 'zero_point', 'energy_bound'] as const

/** Lines that noises go to when the file lists none for their component. */
const usualLines = ['thermal', 'shot', 'back_action', 'heating', 'added']

/** Reads `requirements:`; those that are wrong are left out, which has been said. */
export function readRequirements(tree: Tree | undefined, subject: Subject, values: Values): Requirement[] {
  if (tree?.type !== 'map') return []
  const reader = new RequirementReader(subject, values)
  return [...tree.entries.values()].flatMap(entry => reader.read(entry) ?? [])
}

class RequirementReader {
  readonly #words: readonly string[]

  constructor(
    readonly subject: Subject,
    readonly values: Values,
  ) {
    const modes = subject.components.filter(({ kind }) => declarations.get(kind)?.nature === 'mechanical')
    this.#words = [
      'total',
      ...new Set([...subject.lines.map(({ id }) => id), ...usualLines]),
      ...impliedNoises(subject.components).map(({ id }) => id),
      ...limitIds.map(id => `margin.${id}`),
      ...modes.map(({ id }) => `occupancy.${id}`),
    ]
  }

  read({ key, keyPlace, value }: TreeEntry): Requirement | null {
    if (value.type !== 'map') return null
    const of = this.#of(child(value, 'of'))
    const free = textOf(child(value, 'of'))?.startsWith('occupancy.') === true
    const place = free ? this.#refusePlace(value) : this.#one(key, value, { keys: ['at', 'over'], place: keyPlace })
    const bound = this.#one(key, value, { keys: ['below', 'above'], place: keyPlace })
    const where = place === null ? null : this.#where(place)
    const held = bound === null || of === null ? null : this.#bound(bound.value, of)
    if (of === null || bound === null || held === null || (where === null && !free)) return null
    const about = textOf(child(value, 'about'))
    const side = bound.key === 'below' ? 'below' : 'above'
    return { id: key, of, where, bound: side, value: held.value, text: held.text, about, place: keyPlace }
  }

  #of(tree: Tree | undefined): string | null {
    const word = textOf(tree)
    if (tree === undefined || word === null) return null
    if (this.#words.includes(word)) return word
    this.values.issues.error('unknown-name', tree.place, this.#unknown(word))
    return null
  }

  #unknown(word: string): string {
    const section = word.split('.')[0]
    const close = this.#words.filter(known => known.startsWith(`${section}.`))
    const shown = (close.length > 0 ? close : this.#words.filter(known => !known.includes('.'))).slice(0, 12)
    const listed = shown.map(each => `\`${each}\``).join(', ')
    const more = close.length > 0 ? '' : ', a noise, `margin.<limit>` or `occupancy.<mode>`'
    return `no requirement can be of ${quoted(word)}; there ${shown.length === 1 ? 'is' : 'are'} ${listed}${more}${suggestion(word, this.#words)}`
  }

  #refusePlace(value: TreeMap): null {
    for (const key of ['at', 'over']) {
      const stray = value.entries.get(key)
      if (stray === undefined) continue
      const message = `an occupancy is one number and has no frequency; delete \`${key}\``
      this.values.issues.error('exclusive', stray.keyPlace, message)
    }
    return null
  }

  /** The one of two keys that is given; null where none or both are, which is then said. */
  #one(
    id: string,
    value: TreeMap,
    { keys, place }: { readonly keys: readonly [string, string]; readonly place: TreeEntry['keyPlace'] },
  ): TreeEntry | null {
    const given = keys.flatMap(key => value.entries.get(key) ?? [])
    const [first, second] = given
    if (first !== undefined && second === undefined) return first
    const [one, other] = keys
    if (first === undefined)
      this.values.issues.error('missing-key', place, `the requirement \`${id}\` needs \`${one}\` or \`${other}\``)
    else
      this.values.issues.error(
        'exclusive',
        second?.keyPlace ?? place,
        `the requirement \`${id}\` has \`${one}\` and \`${other}\`; keep one of them`,
      )
    return null
  }

  #where({ key, value }: TreeEntry): Requirement['where'] {
    const { low, high } = this.subject.band
    if (key === 'at') {
      const at = this.values.number(value, useAs('frequency'), 'positive')
      return at === null || this.#outside(value, at < low || at > high) ? null : { at }
    }
    const over = readBand(value, this.values.issues)
    if (over === null || this.#outside(value, over.low < low || over.high > high)) return null
    return { from: over.low, to: over.high }
  }

  #outside(tree: Tree, outside: boolean): boolean {
    if (!outside) return false
    const { low, high } = this.subject.band
    const message = `${quoted(textOf(tree) ?? '')} lies outside the band, which goes from ${low} Hz to ${high} Hz; widen \`band\` or move the requirement`
    this.values.issues.error('band', tree.place, message)
    return true
  }

  #bound(tree: Tree, of: string): { readonly value: number; readonly text: string } | null {
    const { use, range } = this.#use(of)
    const given = this.values.read(tree, use, { path: '', range })
    const scalar = scalarOf(tree)
    if (given === null || scalar === null) return null
    const value = given.power && !of.startsWith('occupancy.') ? Math.sqrt(given.value) : given.value
    return { value, text: scalar.text }
  }

  #use(of: string): { readonly use: Use; readonly range: 'any' | 'positive' | 'non-negative' } {
    if (of.startsWith('margin.')) return { use: useAs('decibel'), range: 'any' }
    if (of.startsWith('occupancy.')) return { use: useAs('number'), range: 'non-negative' }
    return { use: useAsDensity(densityOf[this.subject.measurand.quantity]), range: 'positive' }
  }
}

const densityOf: Readonly<Record<MeasurandSpec['quantity'], DensityOf>> = {
  force: 'force',
  acceleration: 'acceleration',
  displacement: 'length',
  strain: 'strain',
}

function scalarOf(tree: Tree): TreeScalar | null {
  if (tree.type === 'scalar') return tree
  const value = child(tree, 'value')
  return value?.type === 'scalar' ? value : null
}
