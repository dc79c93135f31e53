import type { Check, Finding, Given } from '../check.js'

/** Every channel of loss needs its strength and its bath: Σ1/Q_i = 1/Q. */
export const check: Check = given => [...strength(given), ...baths(given)]

interface Division {
  /** Σ1/Q_i of the channels that state a number. */
  readonly stated: number
  /** Channels that state none and take the rest. */
  readonly open: readonly string[]
  /** 1/Q, or null where the file gives none. */
  readonly total: number | null
}

function strength(given: Given): Finding[] {
  if (!given.has('losses'))
    return given.has('quality') ? [] : [finding('', 'missing-key', `\`${given.id}\` needs \`quality\` or \`losses\``)]
  const division = divide(given)
  return [...sharesOfNothing(given, division), ...openChannels(given, division), ...sums(given, division)]
}

function divide(given: Given): Division {
  const quality = given.number('quality')
  const total = quality === undefined ? null : 1 / quality
  const open: string[] = []
  let stated = 0
  for (const channel of given.names('losses')) {
    const own = given.number(`losses.${channel}.quality`)
    const share = given.number(`losses.${channel}.share`)
    if (own !== undefined) stated += 1 / own
    else if (share !== undefined) stated += share * (total ?? 0)
    else open.push(channel)
  }
  return { stated, open, total }
}

function sharesOfNothing(given: Given, { total }: Division): Finding[] {
  if (total !== null) return []
  return given
    .names('losses')
    .filter(channel => given.has(`losses.${channel}.share`))
    .map(channel =>
      finding(
        `losses.${channel}.share`,
        'missing-key',
        `a \`share\` needs the total: give \`quality\` of \`${given.id}\` too`,
      ),
    )
}

function openChannels(given: Given, { open, total }: Division): Finding[] {
  const second = open[1]
  if (second !== undefined)
    return [
      finding(
        `losses.${second}`,
        'loss-sum',
        `\`${open[0]}\` and \`${second}\` both have neither \`quality\` nor \`share\`; only one channel can take the rest`,
      ),
    ]
  if (open[0] === undefined || total !== null) return []
  return [
    finding(
      `losses.${open[0]}`,
      'missing-key',
      `\`${open[0]}\` has neither \`quality\` nor \`share\`, and \`${given.id}\` no total \`quality\` of which it could take the rest`,
    ),
  ]
}

/** A part in a million is rounding; more is a channel that was forgotten or counted twice. */
function sums(given: Given, { stated, open, total }: Division): Finding[] {
  if (total === null || open.length > 1) return []
  const rest = (total - stated) / total
  if (open.length === 1 ? rest > 0 : Math.abs(rest) <= 1e-6) return []
  const [sum, whole] = [stated.toPrecision(4), total.toPrecision(4)]
  const remedy =
    rest > 0
      ? 'add the channel that is missing, without a number, to take the rest'
      : 'raise a quality or lower a share'
  return [
    finding(
      'losses',
      'loss-sum',
      `the channels of \`${given.id}\` lose 1/Q = ${sum}, but \`quality\` says ${whole} in all; ${remedy}`,
    ),
  ]
}

function baths(given: Given): Finding[] {
  if (given.has('temperature')) return []
  if (!given.has('losses'))
    return given.has('quality')
      ? [finding('', 'missing-key', `\`${given.id}\` needs the \`temperature\` of its bath`)]
      : []
  return given
    .names('losses')
    .filter(channel => !given.has(`losses.${channel}.temperature`))
    .map(channel =>
      finding(
        `losses.${channel}`,
        'missing-key',
        `\`${channel}\` needs a \`temperature\`: its own, or that of \`${given.id}\``,
      ),
    )
}

function finding(path: string, code: string, message: string): Finding {
  return { path, code, message }
}
