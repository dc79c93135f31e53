import type { Covariance } from '../model/network.js'
import { add, complex, polar } from './complex.js'

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

/** Squeezed light: its level and antisqueezing in dB (the level where left out: a pure state), its angle in rad. */
export interface Squeezed {
  readonly level: number
  readonly antisqueezing?: number | undefined
  readonly angle: number
}

/**
 * One-sided density block of a squeezed field: s[[p + q, −e^{2iφ}(p − q)], [−e^{−2iφ}(p − q), p + q]] with q = 10^{−level/10}
 * and p = 10^{antisqueezing/10}; the quadrature at angle φ (same frame as the fields) has the noise 2s·q, the other 2s·p.
 * Pure, it is 2s[[cosh 2r, …], [−e^{−2iφ} sinh 2r, …]] with q = e^{−2r}. [Caves, Phys. Rev. D 26, 1817 (1982)]
 */
export function squeezedBlock(strength: number, { level, antisqueezing = level, angle }: Squeezed): Covariance {
  const [below, above] = [10 ** (-level / 10), 10 ** (antisqueezing / 10)]
  const diagonal = complex(strength * (above + below))
  const mixed = -strength * (above - below)
  return [
    [diagonal, polar(mixed, 2 * angle)],
    [polar(mixed, -2 * angle), diagonal],
  ]
}

/** Sum of two blocks of the same size. */
export function addBlocks(a: Covariance, b: Covariance): Covariance {
  return a.map((row, i) => row.map((value, j) => add(value, b[i][j])))
}
