import type { Check } from '../check.js'

/** The bandwidth is what all ports make together, to a part in a million. */
export const check: Check = given => {
  const sum = given.names('ports').reduce((total, port) => total + (given.number(`ports.${port}.share`) ?? 1), 0)
  if (Math.abs(sum - 1) <= 1e-6) return []
  return [
    {
      path: 'ports',
      code: 'port-shares',
      message: `the shares of the ports of \`${given.id}\` add up to ${Number(sum.toPrecision(6))}; change one of them so that the sum is 1`,
    },
  ]
}
