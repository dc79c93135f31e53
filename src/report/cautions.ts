import type { Assessment } from '../model/assessment.js'
import { slotAt, slotValue } from './slots.js'

/** A short word of care that belongs to the apparatus a budget describes. */
export interface Caution {
  readonly id: 'laser' | 'cryogen'
  readonly title: string
  readonly text: string
}

/** Above this frequency a pump is light rather than a microwave, in Hz. */
const opticalFrom = 100e12
/** Below this temperature a bath needs a cryogen or a cryocooler, in K; liquefied nitrogen and oxygen lie under it. */
const coldBelow = 120

const laser: Caution = {
  id: 'laser',
  title: 'Laser light',
  text: 'This budget assumes a laser. Treat the beam as able to injure eyes and skin until its class is known: enclose it, wear eyewear rated for the wavelength and power, and align at low power. The site’s laser safety officer, local codes and licensed practice decide; this report does not.',
}

const cryogen: Caution = {
  id: 'cryogen',
  title: 'Low temperature',
  text: 'This budget assumes parts at cryogenic temperature. Cold burns, displaced oxygen and trapped gas that warms in a closed volume are the usual dangers: ventilate, monitor oxygen, keep relief paths open. The site’s safety staff, local codes and licensed practice decide; this report does not.',
}

/** The cautions that follow from what the file states: a pump of optical frequency, a temperature below 120 K. */
export function cautions({ budget }: Assessment): readonly Caution[] {
  const optical = budget.components.some(({ parameters }) => {
    const frequency = slotAt(parameters, 'frequency')
    return parameters['pump'] !== undefined && frequency !== null && slotValue(budget, frequency) > opticalFrom
  })
  const cold = budget.roots.some(root => root.dimension === 'temperature' && root.value < coldBelow)
  return [...(optical ? [laser] : []), ...(cold ? [cryogen] : [])]
}
