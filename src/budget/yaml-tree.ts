import {
  isAlias,
  isMap,
  isScalar,
  isSeq,
  type Alias,
  type Document,
  type Pair,
  type Scalar,
  type YAMLMap,
  type YAMLSeq,
} from 'yaml'
import type { Place } from '../model/problem.js'
import { Issues } from './issues.js'
import { suggestion } from './nearest.js'
import { quoted } from './quoted.js'
import type { Tree, TreeEntry, TreeScalar, YamlFile } from './tree.js'
import { deepest } from './yaml-bounds.js'
import { hasHiddenCharacter, type SourceText } from './yaml-text.js'

const mostKeys = 500
/** With every alias written out. */
const mostNodes = 20_000

/** Nodes below a tree and its height, aliases written out. */
interface Extent {
  readonly nodes: number
  readonly height: number
}

/** Turns the library's document into a tree of our own, and checks keys, aliases and size on the way. */
export function treeOf(source: SourceText, document: Document.Parsed): YamlFile {
  const conversion = new Conversion(source)
  const tree = conversion.node(document.contents, { file: source.file, line: 1, column: 1 }, 0)
  const problems = conversion.issues.sorted()
  return { tree: conversion.issues.failed ? null : tree, problems }
}

class Conversion {
  readonly issues = new Issues()
  readonly #anchors = new Map<string, Tree>()
  readonly #extents = new Map<Tree, Extent>()
  #nodes = 0

  constructor(readonly source: SourceText) {}

  /** `fallback` is the place of a value that is empty: its key. */
  node(node: unknown, fallback: Place, depth: number): Tree {
    const place = this.#placeOf(node) ?? fallback
    if (depth > deepest)
      this.issues.error('too-deep', place, `nested deeper than ${deepest} levels; a budget needs six`)
    if (depth > deepest || this.#overflows(1, place)) return { type: 'list', place, items: [] }
    if (isAlias(node)) return this.#alias(node, place, depth)
    const tree = this.#collection(node, place, depth) ?? this.#scalar(node, place, fallback)
    this.#extents.set(tree, this.#extent(tree))
    if ((isScalar(node) || isMap(node) || isSeq(node)) && node.anchor !== undefined)
      this.#anchors.set(node.anchor, tree)
    return tree
  }

  /** Counts values, those behind aliases included; complains once. */
  #overflows(more: number, place: Place): boolean {
    if (this.#nodes > mostNodes) return true
    this.#nodes += more
    if (this.#nodes <= mostNodes) return false
    this.issues.error('too-many-nodes', place, `the file, its aliases written out, holds more than ${mostNodes} values`)
    return true
  }

  #collection(node: unknown, place: Place, depth: number): Tree | null {
    if (isMap(node)) return this.#map(node, place, depth)
    if (isSeq(node)) return this.#list(node, place, depth)
    return null
  }

  #list(seq: YAMLSeq, place: Place, depth: number): Tree {
    if (seq.items.length > mostKeys) this.issues.error('too-many-items', place, `a list has at most ${mostKeys} items`)
    const items = seq.items.slice(0, mostKeys).map(item => this.node(item, place, depth + 1))
    return { type: 'list', place, items }
  }

  #map(map: YAMLMap, place: Place, depth: number): Tree {
    const entries = new Map<string, TreeEntry>()
    const seen = new Map<string, Place>()
    if (map.items.length > mostKeys) {
      this.issues.error('too-many-keys', place, `a map has at most ${mostKeys} keys; this one has ${map.items.length}`)
      return { type: 'map', place, entries }
    }
    let before: Tree | null = null
    for (const pair of map.items) {
      const entry: TreeEntry | null = this.#entry(pair, place, before, depth)
      if (entry === null) continue
      before = entry.value
      const normal = entry.key.normalize('NFC')
      const first = seen.get(normal)
      if (first !== undefined)
        this.issues.error(
          'duplicate-key',
          entry.keyPlace,
          `the key ${quoted(entry.key)} stands twice in this map, first in line ${first.line}; keep one`,
        )
      seen.set(normal, entry.keyPlace)
      entries.set(entry.key, entry)
    }
    return { type: 'map', place, entries }
  }

  #entry(pair: Pair, mapPlace: Place, before: Tree | null, depth: number): TreeEntry | null {
    const keyPlace = this.#placeOf(pair.key) ?? mapPlace
    if (!isScalar(pair.key) || typeof pair.key.value !== 'string') {
      this.issues.error('key', keyPlace, 'a key must be a word')
      return null
    }
    const key = pair.key.value
    if (key === '<<') this.issues.error('merge-key', keyPlace, 'the merge key `<<` is not allowed; write the keys out')
    if (hasHiddenCharacter(key))
      this.issues.error('hidden-character', keyPlace, 'a key holds a character that cannot be seen; delete it')
    if (pair.value === null && this.#cutByComma(key, keyPlace, before)) return null
    return { key, keyPlace, value: this.node(pair.value, keyPlace, depth + 1) }
  }

  /** `{ value: 3,1 ng }` is the value 3 and a key `1 ng` without a value. */
  #cutByComma(key: string, place: Place, before: Tree | null): boolean {
    if (before?.type !== 'scalar') return false
    if (before.text.startsWith('=') && before.plain) {
      const message = `a comma ends a value inside { }, so that the expression ${quoted(before.text)} is torn before ${quoted(key)}; put it in quotes`
      this.issues.error('comma', place, message)
      return true
    }
    if (!/\d$/.test(before.text) || !/^\d/.test(key)) return false
    const meant = `${before.text}.${key}`
    this.issues.error(
      'comma',
      place,
      `a comma ends a value inside { }, so that ${quoted(before.text)} and ${quoted(key)} are torn apart; the decimal sign is a point: \`${meant.slice(0, 60)}\``,
    )
    return true
  }

  #alias(alias: Alias, place: Place, depth: number): Tree {
    const tree = this.#anchors.get(alias.source)
    const extent = tree === undefined ? undefined : this.#extents.get(tree)
    if (tree === undefined || extent === undefined) {
      this.issues.error(
        'unknown-alias',
        place,
        `no anchor \`&${alias.source.slice(0, 60)}\` stands before this alias${suggestion(alias.source, this.#anchors.keys())}`,
      )
      return { type: 'list', place, items: [] }
    }
    if (this.#overflows(extent.nodes, place)) return { type: 'list', place, items: [] }
    if (depth + extent.height > deepest)
      this.issues.error('too-deep', place, `nested deeper than ${deepest} levels through this alias`)
    return tree
  }

  #scalar(node: unknown, place: Place, fallback: Place): TreeScalar {
    if (!isScalar(node) || typeof node.value !== 'string')
      return { type: 'scalar', place: fallback, text: '', plain: true, indent: null }
    const text = node.value
    if (hasHiddenCharacter(text))
      this.issues.error('hidden-character', place, 'the text holds a character that cannot be seen; delete it')
    const plain = node.type === 'PLAIN'
    return {
      type: 'scalar',
      place: plain && text === '' ? fallback : place,
      text,
      plain,
      indent: this.#indent(node, text),
    }
  }

  #indent(node: Scalar, text: string): number | null {
    const start = node.range?.[0]
    if (start === undefined) return null
    const indent = node.type === 'PLAIN' ? 0 : 1
    return this.source.text.startsWith(text, start + indent) && !text.includes('\n') ? indent : null
  }

  #extent(tree: Tree): Extent {
    if (tree.type === 'scalar') return { nodes: 1, height: 0 }
    const children = tree.type === 'list' ? tree.items : [...tree.entries.values()].map(entry => entry.value)
    let nodes = 1
    let height = 0
    for (const below of children) {
      const extent = this.#extents.get(below)
      nodes += extent?.nodes ?? 1
      height = Math.max(height, 1 + (extent?.height ?? 0))
    }
    return { nodes, height }
  }

  #placeOf(node: unknown): Place | null {
    const range = isScalar(node) || isMap(node) || isSeq(node) || isAlias(node) ? node.range : null
    return range === null || range === undefined ? null : this.source.place(range[0])
  }
}
