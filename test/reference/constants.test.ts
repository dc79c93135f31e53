import { describe, expect, test } from 'vitest'
import * as c from '../../src/physics/constants.js'
import { isDimensionless } from '../../src/quantity/dimension.js'
import { parseQuantity, parseUnit } from '../../src/quantity/parse.js'
import { deviation, type Check } from './check.js'

const si = 'SI Brochure, 9th edition (BIPM 2019), exact'
const codata = 'CODATA 2022 adjustment (Mohr, Newell, Taylor, Tiesinga 2024)'

/** Tolerances: 1e-12 and 1e-9 for exact values as the source prints them, 1e-11 for all printed digits of measured ones. */
const checks: readonly Check[] = [
  { quantity: 'h', computed: () => c.planckConstant, expected: 6.62607015e-34, tolerance: 1e-12, source: si },
  {
    quantity: 'ħ',
    computed: () => c.reducedPlanckConstant,
    expected: 1.0545718176461565e-34,
    tolerance: 1e-9,
    source: si,
  },
  { quantity: 'e', computed: () => c.elementaryCharge, expected: 1.602176634e-19, tolerance: 1e-12, source: si },
  { quantity: 'N_A', computed: () => c.avogadroConstant, expected: 6.02214076e23, tolerance: 1e-12, source: si },
  { quantity: 'R', computed: () => c.molarGasConstant, expected: 8.31446261815324, tolerance: 1e-9, source: si },
  { quantity: 'R_K', computed: () => c.vonKlitzingConstant, expected: 25812.807459304513, tolerance: 1e-9, source: si },
  {
    quantity: 'Φ₀',
    computed: () => c.magneticFluxQuantum,
    expected: 2.0678338484619295e-15,
    tolerance: 1e-9,
    source: si,
  },
  { quantity: 'G', computed: () => c.gravitationalConstant, expected: 6.6743e-11, tolerance: 1e-11, source: codata },
  {
    quantity: 'ε₀',
    computed: () => c.vacuumPermittivity,
    expected: 8.8541878188e-12,
    tolerance: 1e-11,
    source: codata,
  },
  {
    quantity: 'α',
    computed: () => c.fineStructureConstant,
    expected: 0.0072973525643,
    tolerance: 1e-11,
    source: codata,
  },
  { quantity: 'm_e', computed: () => c.electronMass, expected: 9.1093837139e-31, tolerance: 1e-11, source: codata },
  {
    quantity: 'step of ε₀ from the adjustment of 2018 (8.8541878128e-12), which an old table would miss',
    computed: () => c.vacuumPermittivity / 8.8541878128e-12 - 1,
    expected: 6.776454952728272e-10,
    tolerance: 0.05,
    source: `${codata}; the value of 2018 from memory`,
  },
  {
    quantity: 'step of α from the adjustment of 2018 (7.2973525693e-3)',
    computed: () => c.fineStructureConstant / 7.2973525693e-3 - 1,
    expected: -6.852e-10,
    tolerance: 0.05,
    source: `${codata}; the value of 2018 from memory`,
  },
]

describe('constants of nature', () => {
  test.each(checks)('$quantity', check => {
    expect(deviation(check), check.source).toBeLessThanOrEqual(check.tolerance)
  })

  test('the relations between them hold to their uncertainty', () => {
    const { elementaryCharge: e, speedOfLight, planckConstant: h } = c
    const permittivity = e ** 2 / (2 * c.fineStructureConstant * h * speedOfLight)
    expect(Math.abs(c.vacuumPermittivity / permittivity - 1)).toBeLessThan(3e-10)
    expect(Math.abs(c.vacuumPermeability * c.vacuumPermittivity * speedOfLight ** 2 - 1)).toBeLessThan(3e-10)
  })

  test('σ to the digits that CODATA prints, 5.670 374 419', () => {
    expect(c.stefanBoltzmannConstant).toBeCloseTo(5.670374419e-8, 17)
  })

  test('the printed concise forms are read as value and uncertainty of the table', () => {
    const printed = ['6.67430(15)e-11 m³/(kg s²)', '7.2973525643(11)e-3', '8.8541878188(14)e-12 F/m']
    for (const [index, symbol] of ['G', '\\alpha', '\\varepsilon_0'].entries()) {
      const row = c.constants.find(constant => constant.symbol === symbol)
      const read = parseQuantity(printed[index])
      expect(row?.value).toBe(read.value)
      expect(row?.uncertainty).toBe(read.uncertainty)
      expect(row?.unit).toBe(read.unitText)
    }
  })

  test('every row of the table has a unit that is read', () => {
    expect(c.constants.length).toBeGreaterThan(15)
    for (const { unit, value, uncertainty } of c.constants) {
      expect(isDimensionless(parseUnit(unit).dimension)).toBe(unit === '')
      expect(uncertainty / value).toBeLessThan(1e-4)
    }
  })
})
