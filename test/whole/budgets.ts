/** A small budget that is right: one mode, one cavity, everything a report needs. */
export const good = `format: 1
title: Membrane on a bench
revision: "1.0"
measurand: { quantity: force, mode: fundamental }
readout: detector
band: 1.20 MHz to 1.30 MHz
reference: 1.243 MHz
parameters:
  mass: { value: 3.1(2) ng, about: effective mass, evidence: assumed }
components:
  fundamental: { kind: resonator, mass: mass, frequency: 1.243 MHz, quality: 2.4e6, temperature: 4.1(1) K }
  cavity:
    kind: cavity
    frequency: 282 THz
    modes: { fundamental: 1 }
    coupling: 21 GHz/µm
    ports: { front: { rate: 600 kHz }, back: { rate: 90 kHz } }
    pump: { port: front, power: 3 µW, detuning: -0.2 MHz }
  detector: { kind: homodyne, reads: cavity.back, angle: 90°, efficiency: 0.72(3) }
contributions:
  thermal: { of: fundamental.bath }
  shot: { of: [cavity, detector.loss], part: imprecision }
  back_action: { of: cavity, part: back-action }
  stray: { kind: force-noise, into: fundamental, density: 2 aN/√Hz }
`

/** The line that `text` stands on and its column, counted from 1. */
export function placeOf(budget: string, text: string): string {
  const offset = budget.indexOf(text)
  if (offset < 0) throw new Error(`no ${text} in the budget`)
  const before = budget.slice(0, offset).split('\n')
  return `${before.length}:${before[before.length - 1].length + 1}`
}

/** A misspelt key. */
export const misspelt = good.replace('quality:', 'qualtiy:')

/** A power where a rate belongs. */
export const wrongUnit = good.replace('back: { rate: 90 kHz }', 'back: { rate: 90 kW }')

/** A blue-detuned pump strong enough to drive the mode. */
export const unstable = good.replace('power: 3 µW, detuning: -0.2 MHz', 'power: 3 mW, detuning: 1.243 MHz')
