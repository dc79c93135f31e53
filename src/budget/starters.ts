import type { Starter, StarterClaim } from './starter.js'

const shot: StarterClaim = { title: 'Shot noise', of: '[cavity, detector.loss]', part: 'imprecision' }
const backAction: StarterClaim = { title: 'Back-action', of: 'cavity', part: 'back-action' }

const membrane: Starter = {
  name: 'membrane',
  about: 'force on a membrane in an optical cavity, read by homodyne detection',
  title: 'Membrane in an optical cavity',
  measurand: '{ quantity: force, mode: membrane }',
  readout: 'detector',
  band: '1.0 MHz to 1.2 MHz',
  reference: '1.1 MHz',
  components: {
    membrane: {
      kind: 'resonator',
      fields: { mass: '5 ng', frequency: '1.1 MHz', quality: '1e7', law: 'structural', temperature: '4 K' },
    },
    cavity: {
      kind: 'cavity',
      fields: {
        frequency: '282 THz',
        modes: { membrane: '1' },
        coupling: '15 GHz/µm',
        ports: { front: { rate: '0.2 MHz' }, back: { rate: '4 MHz' }, inner: { rate: '0.3 MHz' } },
        pump: { port: 'front', power: '20 µW', detuning: '-0.2 MHz' },
      },
    },
    detector: { kind: 'homodyne', fields: { reads: 'cavity.back', angle: '90°', efficiency: '0.7' } },
  },
  contributions: {
    thermal: { title: 'Thermal', of: 'membrane.bath' },
    shot,
    back_action: backAction,
    mirrors: {
      note: 'Thermal motion of the mirrors of the cavity.',
      kind: 'displacement-noise',
      fields: { into: 'cavity', density: '10 am/√Hz', exponent: '-1', reference: '1 MHz' },
    },
  },
}

const drum: Starter = {
  name: 'drum',
  about: 'force on a drum that tunes a superconducting circuit, read through an amplifier on one sideband',
  title: 'Drum in a superconducting circuit',
  measurand: '{ quantity: force, mode: drum }',
  readout: 'receiver',
  band: '9.99 MHz to 10.01 MHz',
  reference: '10 MHz',
  components: {
    drum: {
      kind: 'resonator',
      fields: { mass: '40 pg', frequency: '10 MHz', quality: '3e5', temperature: '30 mK' },
    },
    circuit: {
      kind: 'cavity',
      fields: {
        frequency: '6 GHz',
        modes: { drum: '1' },
        g0: '150 Hz',
        ports: {
          drive: { rate: '10 kHz', occupancy: '0.01' },
          out: { rate: '250 kHz', occupancy: '0.01' },
          inner: { rate: '40 kHz', occupancy: '0.05' },
        },
        pump: { port: 'drive', quanta: '2e3', detuning: '-10 MHz' },
      },
    },
    line: { note: 'Cables and circulators.', kind: 'loss', fields: { reads: 'circuit.out', transmission: '-1 dB' } },
    amplifier: { kind: 'amplifier', fields: { reads: 'line', added: '5' } },
    receiver: { kind: 'sideband', fields: { reads: 'amplifier', side: 'upper' } },
  },
  contributions: {
    thermal: { title: 'Thermal', of: 'drum.bath' },
    vacuum: { title: 'Vacuum', of: '[circuit, line]', part: 'imprecision' },
    back_action: { title: 'Back-action', of: 'circuit', part: 'back-action' },
    added: { title: 'Amplifier added noise', of: 'amplifier.added' },
    heating: { title: 'Cavity heating', of: 'circuit', part: 'heating' },
  },
}

const mirror: Starter = {
  name: 'mirror',
  about: 'force on a suspended mirror that ends an optical cavity, read in the phase of the reflected light',
  title: 'Suspended mirror',
  measurand: '{ quantity: force, mode: mirror }',
  readout: 'detector',
  band: '10 Hz to 10 kHz',
  reference: '500 Hz',
  components: {
    mirror: {
      kind: 'rigid',
      fields: { mass: '1 g', frequency: '2 Hz', quality: '1e6', law: 'structural', temperature: '295 K' },
    },
    cavity: {
      kind: 'cavity',
      fields: {
        frequency: '282 THz',
        modes: { mirror: '1' },
        coupling: '3 GHz/µm',
        ports: { front: { rate: '500 kHz' }, end: { rate: '10 kHz' }, inner: { rate: '20 kHz' } },
        pump: { port: 'front', power: '10 mW', detuning: '0 Hz' },
      },
    },
    detector: { kind: 'homodyne', fields: { reads: 'cavity.front', angle: '90°', efficiency: '0.9' } },
  },
  contributions: {
    thermal: { title: 'Thermal (suspension)', of: 'mirror.bath' },
    shot,
    back_action: backAction,
    ground: {
      note: 'Motion of the ground behind its isolation; a measured table may stand here instead.',
      kind: 'displacement-noise',
      fields: { into: 'cavity', density: '1 pm/√Hz', exponent: '-12', reference: '10 Hz' },
    },
    coating: {
      note: 'Thermal motion of the coatings of both mirrors.',
      kind: 'displacement-noise',
      fields: { into: 'cavity', density: '1 am/√Hz', exponent: '-1', reference: '100 Hz' },
    },
  },
}

const accelerometer: Starter = {
  name: 'accelerometer',
  about: 'acceleration of a frame, from a proof mass on springs with a plain displacement readout',
  title: 'Accelerometer',
  measurand: '{ quantity: acceleration }',
  readout: 'interferometer',
  band: '1 Hz to 1 kHz',
  reference: '10 Hz',
  components: {
    proof: {
      kind: 'rigid',
      fields: { mass: '5 g', frequency: '50 Hz', quality: '1e5', law: 'structural', temperature: '295 K' },
    },
    interferometer: { kind: 'displacement', fields: { modes: { proof: '1' }, noise: '1 fm/√Hz' } },
  },
  contributions: {
    thermal: { title: 'Thermal', of: 'proof.bath' },
    readout_floor: { title: 'Interferometer', of: 'interferometer.noise' },
    actuator: {
      note: 'Voltage noise of the electrodes that hold the mass in place.',
      kind: 'force-noise',
      fields: { into: 'proof', density: '0.1 pN/√Hz', exponent: '-1', reference: '10 Hz' },
    },
  },
}

const cantilever: Starter = {
  name: 'cantilever',
  about: 'force on a soft cantilever, read by a fibre interferometer whose back-action is left out',
  title: 'Soft cantilever',
  measurand: '{ quantity: force, mode: cantilever }',
  readout: 'interferometer',
  band: '2 kHz to 8 kHz',
  reference: '5 kHz',
  components: {
    cantilever: {
      kind: 'resonator',
      fields: { mass: '0.1 ng', frequency: '5 kHz', quality: '5e4', temperature: '1 K' },
    },
    interferometer: { kind: 'displacement', fields: { modes: { cantilever: '1' }, noise: '1 pm/√Hz' } },
  },
  contributions: {
    thermal: { title: 'Thermal', of: 'cantilever.bath' },
    readout_floor: { title: 'Interferometer', of: 'interferometer.noise' },
    surface: {
      note: 'Fluctuating fields between the tip and the surface.',
      kind: 'force-noise',
      fields: { into: 'cantilever', density: '0.5 aN/√Hz', exponent: '-1', reference: '5 kHz' },
    },
  },
}

const particle: Starter = {
  name: 'particle',
  about: 'force on a trapped particle that ties its motion to an optical cavity, read by homodyne detection',
  title: 'Trapped particle in an optical cavity',
  measurand: '{ quantity: force, mode: particle }',
  readout: 'detector',
  band: '50 kHz to 150 kHz',
  reference: '100 kHz',
  components: {
    particle: {
      kind: 'rigid',
      fields: { mass: '3 fg', frequency: '100 kHz', quality: '1e8', temperature: '295 K' },
    },
    cavity: {
      kind: 'cavity',
      fields: {
        frequency: '282 THz',
        modes: { particle: '1' },
        coupling: '10 MHz/µm',
        ports: { front: { rate: '5 kHz' }, back: { rate: '180 kHz' }, inner: { rate: '15 kHz' } },
        pump: { port: 'front', power: '1 µW', detuning: '-100 kHz' },
      },
    },
    detector: { kind: 'homodyne', fields: { reads: 'cavity.back', angle: '90°', efficiency: '0.5' } },
  },
  contributions: {
    gas: { title: 'Thermal (gas)', of: 'particle.bath' },
    shot,
    back_action: backAction,
    recoil: {
      note: 'Recoil of the light that the trap scatters off the particle.',
      kind: 'force-noise',
      fields: { into: 'particle', density: '0.01 aN/√Hz' },
    },
  },
}

/** Every starter by the word behind `--like`. */
export const starters: ReadonlyMap<string, Starter> = new Map(
  [membrane, drum, mirror, accelerometer, cantilever, particle].map(starter => [starter.name, starter]),
)

/** One line each, for people. */
export function starterList(): string {
  const widest = Math.max(...[...starters.keys()].map(name => name.length))
  return `Kinds:\n${[...starters.values()].map(({ name, about }) => `  ${name.padEnd(widest)}  ${about}\n`).join('')}`
}
