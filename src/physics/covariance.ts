import type { Covariance } from '../model/network.js'
import { complex, polar } from './complex.js'

/**
 * One-sided density block of a field with `quanta` + ½-like strength s in both sidebands (a, a†): 2s·𝟙.
 * A vacuum is s = ½, a thermal bath adds s = n.
 */
export function thermalBlock(strength: number): Covariance {
  const zero = complex(0)
  return [
    [complex(2 * strength), zero],
    [zero, complex(2 * strength)],
  ]
}

/**
 * One-sided density block of a squeezed field: 2s[[cosh 2r, −e^{2iφ} sinh 2r], [−e^{−2iφ} sinh 2r, cosh 2r]] with
 * r = level·ln 10/20 for a level in dB; the quadrature at angle φ (rad, same frame as the fields) has the noise
 * 2s·e^{−2r}. [Caves, Phys. Rev. D 26, 1817 (1982)]
 */
export function squeezedBlock(strength: number, level: number, angle: number): Covariance {
  const r = (level * Math.LN10) / 20
  const diagonal = complex(2 * strength * Math.cosh(2 * r))
  const mixed = -2 * strength * Math.sinh(2 * r)
  return [
    [diagonal, polar(mixed, 2 * angle)],
    [polar(mixed, -2 * angle), diagonal],
  ]
}
