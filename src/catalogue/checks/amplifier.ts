import { leastAddedQuanta } from '../../physics/electronics.js'
import type { Check, Finding, Given, Surroundings } from '../check.js'

/** Added noise of a phase-preserving amplifier, in quanta at its input: at least ½|1 − 1/G| [Caves 1982]. */
export const check: Check = (given, around) => [
  ...belowLimit(given),
  ...conventionMissing(given),
  ...behindUnknownGain(given, around),
]

function belowLimit(given: Given): Finding[] {
  const added = given.number('added')
  const gain = given.number('gain')
  const least = leastAddedQuanta(gain ?? Infinity)
  if (added === undefined || added >= least * (1 - 1e-12)) return []
  const why = gain === undefined ? 'of large gain' : `of power gain ${rounded(gain)}`
  return [
    {
      path: 'added',
      code: 'amplifier-limit',
      message: `a phase-preserving amplifier ${why} adds at least ${rounded(least)} quanta at its input; \`added\` says ${rounded(added)}`,
    },
  ]
}

/** A noise temperature is quanta only with its convention, and quanta have none. */
function conventionMissing(given: Given): Finding[] {
  const [stated] = ['noise_temperature', 'noise_figure'].filter(field => given.has(field))
  if (given.has('convention') === (stated !== undefined)) return []
  if (stated === undefined)
    return [
      {
        path: 'convention',
        code: 'convention-needless',
        message: '`convention` says what a noise temperature or a noise figure means; `added` has none: leave it out',
      },
    ]
  return [
    {
      path: stated,
      code: 'convention-needed',
      message: `\`${stated}\` needs \`convention\`: \`rayleigh-jeans\`, \`callen-welton\` or \`planck\` for the noise that the loads of its measurement were taken to have, \`source\` for a source whose quanta equal the added noise`,
    },
  ]
}

/** Without a gain, noise behind the amplifier cannot be referred to its input. */
function behindUnknownGain(given: Given, around: Surroundings): Finding[] {
  if (given.has('gain')) return []
  const noisy = around.behind.flatMap(component => noiseOf(component, around))
  if (noisy.length === 0) return []
  return [
    {
      path: '',
      code: 'gain-needed',
      message: `\`${given.id}\` has no \`gain\`, but noise enters behind it (${noisy.join(', ')}): give \`gain\`, or leave out what stands behind`,
    },
  ]
}

function noiseOf(component: Given, around: Surroundings): string[] {
  const entering = around.entering(component.id).map(id => `\`${id}\``)
  const passed = component.number('efficiency') ?? component.number('transmission') ?? 1
  const own =
    passed < 1 || ['added', 'noise_temperature', 'noise_figure'].some(field => component.has(field))
      ? [`\`${component.id}\``]
      : []
  return [...own, ...entering]
}

function rounded(value: number): string {
  return String(Number(value.toPrecision(4)))
}
