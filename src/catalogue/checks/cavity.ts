import type { Check, Finding, Given, Surroundings } from '../check.js'

/** Squeezed light enters with the carrier; g₀ = G·x_zp needs the zero-point motion of one oscillator. */
export const check: Check = (given, around) => [...straySqueezing(given), ...couplingOfOne(given, around)]

function straySqueezing(given: Given): Finding[] {
  const pumped = given.word('pump.port')
  if (pumped === undefined) return []
  return given
    .names('ports')
    .filter(port => port !== pumped && given.has(`ports.${port}.squeezing`))
    .map(port => ({
      path: `ports.${port}.squeezing`,
      code: 'squeezing-port',
      message: `the squeezing angle counts from the carrier that enters, and the carrier enters through \`${pumped}\`, not through \`${port}\`: squeeze \`${pumped}\` or pump through \`${port}\``,
    }))
}

function couplingOfOne(given: Given, around: Surroundings): Finding[] {
  if (!given.has('g0')) return []
  const modes = given.names('modes')
  const [only = ''] = modes
  const refuse = (why: string): Finding[] => [
    {
      path: 'g0',
      code: 'no-zero-point',
      message: `\`g0\` ${why}; give \`coupling\`, the frequency shift per metre, instead`,
    },
  ]
  if (modes.length > 1) return refuse(`belongs to one oscillator, but \`${given.id}\` senses ${modes.length} modes`)
  if (given.number(`modes.${only}`) !== 1) return refuse(`needs the weight 1, but \`${only}\` has another`)
  const mode = around.component(only)
  return mode === undefined || mode.has('frequency')
    ? []
    : refuse(`needs an oscillator, but \`${only}\` is a ${mode.kind} without zero-point motion`)
}
