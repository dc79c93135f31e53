import { EigenvalueDecomposition, Matrix } from 'ml-matrix'
import type { Correlation } from '../model/budget.js'
import type { Place } from '../model/problem.js'
import { amountOf, textOf } from './amount.js'
import { suggestion } from './nearest.js'
import { quoted } from './quoted.js'
import { child, type Tree, type TreeScalar } from './tree.js'
import { useAs } from './use.js'
import type { Values } from './values.js'

/** Rounding leaves a singular matrix with an eigenvalue of this size. */
const rounding = 1e-10

interface Entry {
  readonly tree: Tree | undefined
  /** Of the key `correlations`. */
  readonly place: Place
}

/** Reads `correlations:` once all fields are read; what is wrong is left out, which has been said. */
export function readCorrelations({ tree, place }: Entry, values: Values): Correlation[] {
  if (tree?.type !== 'list') return []
  const before = values.issues.errors
  const seen = new Map<string, Place>()
  const read = tree.items.flatMap(item => {
    const correlation = readOne(item, values)
    if (correlation === null) return []
    const pair = correlation.roots.toSorted((a, b) => a - b).join(' ')
    const first = seen.get(pair)
    seen.set(pair, correlation.place)
    if (first === undefined) return [correlation]
    values.issues.error(
      'correlated-twice',
      correlation.place,
      `the correlation of these two stands already in line ${first.line}; keep one of them`,
    )
    return []
  })
  if (values.issues.errors === before) checkMatrix(read, place, values)
  return read
}

function readOne(item: Tree, values: Values): Correlation | null {
  const between = child(item, 'between')
  const [one, other] = between?.type === 'list' ? between.items.map(name => rootOf(name, values)) : []
  const coefficient = coefficientOf(child(item, 'coefficient'), values)
  if (typeof one !== 'number' || typeof other !== 'number' || coefficient === null || between === undefined) return null
  if (one !== other) return { roots: [one, other], coefficient, place: item.place }
  values.issues.error('correlation', between.place, 'a parameter is correlated with itself by 1; name two of them')
  return null
}

function coefficientOf(tree: Tree | undefined, values: Values): number | null {
  const coefficient = values.number(tree, useAs('number'), 'any')
  const scalar = amountOf(tree)?.scalar
  if (coefficient === null || scalar === undefined || Math.abs(coefficient) <= 1) return coefficient
  const message = `${quoted(scalar.text)} is no correlation coefficient; it lies between -1 and 1`
  values.issues.error('correlation', scalar.place, message)
  return null
}

/** The root of a named parameter; null where it can be correlated with nothing, which has been said. */
function rootOf(tree: Tree, values: Values): number | null {
  const name = textOf(tree)
  if (name === null || tree.type !== 'scalar') return null
  const fault = faultOf(name, tree, values)
  if (fault !== null) values.issues.error('correlation', tree.place, fault)
  return fault === null ? (values.keeper.keptRoots.get(name)?.index ?? null) : null
}

function faultOf(name: string, { text }: TreeScalar, { parameters, keeper }: Values): string | null {
  const parameter = parameters.all.get(name)
  if (parameter === undefined)
    return `no parameter is called ${quoted(text)}; correlations are between parameters${suggestion(name, parameters.all.keys())}`
  if (parameter.checked !== null)
    return `\`${name}\` is derived from others; name the uncertain parameters that it is made of`
  const kept = keeper.keptRoots.get(name)
  if (kept === undefined || kept.uncertainty > 0) return null
  return `\`${name}\` (${quoted(parameter.amount.scalar.text)}) has no uncertainty that could be correlated; state one, such as \`3.1(2) ng\``
}

/** A matrix of correlations is positive semidefinite: no combination of the parameters has a negative variance. */
function checkMatrix(correlations: readonly Correlation[], place: Place, { issues }: Values): void {
  const roots = [...new Set(correlations.flatMap(({ roots: pair }) => pair))]
  const matrix = Matrix.eye(roots.length)
  for (const { roots: pair, coefficient } of correlations) {
    const [i, j] = [roots.indexOf(pair[0]), roots.indexOf(pair[1])]
    matrix.set(i, j, coefficient).set(j, i, coefficient)
  }
  if (roots.length === 0) return
  const smallest = Math.min(...new EigenvalueDecomposition(matrix, { assumeSymmetric: true }).realEigenvalues)
  if (smallest >= -rounding) return
  const message = `these correlations contradict each other: their matrix has the eigenvalue ${smallest.toPrecision(3)}, and none may be negative; lower a coefficient`
  issues.error('correlation', place, message)
}
