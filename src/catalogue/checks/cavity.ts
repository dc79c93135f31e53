import type { Check, Finding, Given, Surroundings } from '../check.js'

/** Squeezed light enters with the carrier and has at least as much antisqueezing; g₀ = G·x_zp needs the zero-point motion of one oscillator. */
export const check: Check = (given, around) => [
  ...straySqueezing(given),
  ...tooPure(given),
  ...couplingOfOne(given, around),
]

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

/** The product of both quadratures is at least the vacuum's. */
function tooPure(given: Given): Finding[] {
  return given.names('ports').flatMap(port => {
    const path = `ports.${port}.squeezing`
    const [level = 0, anti] = [given.number(`${path}.level`), given.number(`${path}.antisqueezing`)]
    if (anti === undefined || anti >= level) return []
    return [
      {
        path: `${path}.antisqueezing`,
        code: 'squeezing-bound',
        message: `a quadrature ${level} dB below vacuum leaves at least ${level} dB above it in the other; \`antisqueezing\` says ${anti} dB`,
      },
    ]
  })
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
