import type { Complex, Injection, Network } from '../model/network.js'
import { add, multiply } from '../physics/complex.js'
import { solveDense } from '../physics/solve-dense.js'
import { denseAt, injectionColumn, type ComplexFrequency } from './dense.js'
import { filterAt } from './filter.js'

/** R(ω): transfer of an injection to the record at a complex frequency. */
export function transferAt(network: Network, injection: Injection, at: ComplexFrequency): Complex {
  const { matrix } = denseAt(network, at)
  const z = solveDense(
    matrix,
    injectionColumn(network, injection).map(value => [value]),
  )
  const sum = network.readout.reduce(
    (total, { column, value }) => add(total, multiply(value, z[column][0])),
    injection.direct,
  )
  return injection.filter === undefined ? sum : multiply(sum, filterAt(injection.filter, at))
}
