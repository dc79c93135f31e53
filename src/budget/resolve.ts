import type { Budget, ComponentSpec, LineSpec } from '../model/budget.js'
import type { Place } from '../model/problem.js'
import { textOf } from './amount.js'
import { readBand, type BandRead } from './band.js'
import { followChain } from './chain.js'
import { readCitations } from './citations.js'
import { readCorrelations } from './correlations.js'
import { DensityReader } from './density.js'
import { Directory } from './directory.js'
import { FieldReader } from './fields.js'
import type { Issues } from './issues.js'
import { checkKinds } from './kind-checks.js'
import { readLines } from './lines.js'
import { checkMovedMass, checkStrainLength, readMeasurand } from './measurand.js'
import { revisionPattern } from './names.js'
import { checkNames } from './namespace.js'
import { impliedNoises } from './noises.js'
import { quoted } from './quoted.js'
import { readRequirements } from './requirements.js'
import { formatVersion } from './schema.js'
import { TableReader, type DataFolder } from './table.js'
import { child, type Tree, type TreeMap } from './tree.js'
import { useAs } from './use.js'
import { Values } from './values.js'

/** Where a budget comes from. */
export interface Origin {
  readonly sensor: string
  readonly file: string
  readonly data: DataFolder
}

/** Turns a tree of the right shape into a Budget; null where something is wrong, which has been said. */
export function resolve(root: Tree, origin: Origin, issues: Issues): Budget | null {
  if (root.type !== 'map') return null
  checkNames(root, issues)
  const band = readBand(child(root, 'band'), issues)
  const directory = new Directory(child(root, 'components'))
  const reader = readerFor(root, { origin, band, directory }, issues)
  const { components, unsound } = readComponents(directory, reader)
  const measurand = readMeasurand(entry(root, 'measurand'), directory, issues)
  const lines = readLines(child(root, 'contributions'), impliedNoises(components), reader)
  const readout = readReadout(root, directory, issues)
  const reference = readReference(child(root, 'reference'), band, reader)
  const network = { components, lines, unsound, readout: readout?.id ?? null }
  checkNetwork(network, reader)
  if (measurand !== null) {
    checkMovedMass(measurand, components, issues)
    checkStrainLength(measurand, components, issues)
  }
  const revision = readRevision(child(root, 'revision'), issues)
  const requirements =
    measurand === null || band === null
      ? []
      : readRequirements(child(root, 'requirements'), { components, lines, measurand, band }, reader.values)
  const correlations = readCorrelations(entry(root, 'correlations'), reader.values)
  const citations = readCitations(root, origin.data.files, issues)
  reader.values.finish(origin.file)
  if (issues.failed || band === null || measurand === null || readout === null || revision === null) return null
  return {
    sensor: origin.sensor,
    file: origin.file,
    format: formatVersion,
    title: textOf(child(root, 'title')) ?? origin.sensor,
    summary: textOf(child(root, 'summary')),
    about: textOf(child(root, 'about')),
    revision,
    measurand,
    readout: readout.id,
    readoutPlace: readout.place,
    band,
    reference,
    roots: reader.values.keeper.roots,
    derived: reader.values.keeper.derived,
    correlations,
    requirements,
    variants: [],
    citations,
    tables: reader.densities.tables.tables,
    components,
    lines,
    warnings: issues.sorted().filter(problem => problem.severity === 'warning'),
  }
}

interface Frame {
  readonly origin: Origin
  readonly band: BandRead | null
  readonly directory: Directory
}

function readerFor(root: Tree, { origin, band, directory }: Frame, issues: Issues): FieldReader {
  const values = new Values(child(root, 'parameters'), issues)
  const densities = new DensityReader(values, new TableReader(origin.data, band, issues), band, issues)
  return new FieldReader(values, densities, directory, issues)
}

function entry(root: TreeMap, key: string): { tree: Tree | undefined; place: Place } {
  const found = root.entries.get(key)
  return { tree: found?.value, place: found?.keyPlace ?? root.place }
}

interface Components {
  readonly components: readonly ComponentSpec[]
  readonly unsound: ReadonlySet<string>
}

function readComponents(directory: Directory, reader: FieldReader): Components {
  const unsound = new Set<string>()
  const components = [...directory.components.values()].flatMap(listed => {
    const { declaration, id, place } = listed
    if (declaration === null) return []
    const { parameters, places, sound } = reader.read(listed, declaration.fields, declaration.exclusive)
    if (!sound) unsound.add(id)
    return [{ id, kind: declaration.kind, place, parameters, places }]
  })
  return { components, unsound }
}

function readReadout(root: TreeMap, directory: Directory, issues: Issues): { id: string; place: Place } | null {
  const tree = child(root, 'readout')
  const id = textOf(tree)
  if (tree === undefined || id === null) return null
  const fault = directory.fault(id, 'detector')
  if (fault !== null) issues.error('unknown-name', tree.place, fault)
  return fault === null ? { id, place: tree.place } : null
}

function readReference(tree: Tree | undefined, band: BandRead | null, reader: FieldReader): number | null {
  if (tree === undefined) return null
  const reference = reader.values.number(tree, useAs('frequency'), 'positive')
  if (reference !== null && band !== null && (reference < band.low || reference > band.high))
    reader.issues.warning(
      'reference',
      tree.place,
      `the reference frequency lies outside the band, which goes from ${band.low} Hz to ${band.high} Hz`,
    )
  return reference
}

interface Network extends Components {
  readonly lines: readonly LineSpec[]
  readonly readout: string | null
}

function checkNetwork({ readout, ...network }: Network, { values, issues }: FieldReader): void {
  const chain = readout === null ? { path: [] } : followChain(network.components, readout, issues)
  checkKinds({ ...network, chain, values }, issues)
}

function readRevision(tree: Tree | undefined, issues: Issues): string | null {
  const text = textOf(tree)
  if (tree === undefined || text === null) return null
  if (new RegExp(revisionPattern).test(text)) return text
  issues.error('revision', tree.place, `${quoted(text)} is no revision; write dotted numbers such as \`2.1\``)
  return null
}
