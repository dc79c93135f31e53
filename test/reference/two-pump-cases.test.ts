import { describe, expect, test } from 'vitest'
import { twoPumpForce, type TwoPumpForce } from '../../src/physics/two-pump.js'
import { twoPumpExponents } from '../../src/physics/two-pump-stability.js'
import { cavityOf, readoutOf, twoPumpCases, type TwoPumpCase } from './two-pump-case.js'

/*
 * Source of the values: harmonic balance of a cavity with two pumps, all counter-rotating terms included [Clerk, Marquardt, Jacobs, New J. Phys. 10,
 * 095010 (2008); Hertzberg et al., Nature Phys. 6, 213 (2010)], solved in numpy with CODATA 2022 constants, without this code.
 */

const stable = twoPumpCases.filter(c => c.stable)

const baths: Record<string, (force: TwoPumpForce) => number> = {
  detected_port: force => force.ports[0],
  internal_loss: force => force.ports[1],
  detection_loss: force => force.detectionLoss,
  amplifier: force => force.amplifier,
  mechanical_bath: force => force.bath,
  total: force => force.total,
}

describe.each(stable)('$id', (working: TwoPumpCase) => {
  const forces = working.offsets_hz.map(f => twoPumpForce(cavityOf(working), readoutOf(working), 2 * Math.PI * f))

  test.each(Object.keys(working.force_psd))('%s to 1e-7', name => {
    const differences = forces.map((force, i) => baths[name](force) / working.force_psd[name][i] - 1)
    expect(Math.max(...differences.map(Math.abs))).toBeLessThan(1e-7)
  })
})

test.each(twoPumpCases)('$id: the motion grows only where it must', working => {
  const [fastest] = twoPumpExponents(cavityOf(working))
  expect(fastest.growth > 0).toBe(!working.stable)
})
