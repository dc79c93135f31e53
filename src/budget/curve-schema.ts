import { windowNames } from '../physics/window-shapes.js'
import { mostCells, separators } from './curve-cells.js'

const quantity = { $ref: '#/definitions/quantity' }
const short = { type: ['string', 'number'], minLength: 1, maxLength: 200 }
const mark = { type: 'string', minLength: 1, maxLength: 20 }

const spectralWindow = {
  type: 'object',
  properties: {
    window: {
      type: 'string',
      minLength: 1,
      maxLength: 200,
      description: `one of ${windowNames.join(', ')}`,
    },
    rate: { ...quantity, description: 'samples per second: 50 kHz' },
    samples: {
      type: 'integer',
      minimum: 2,
      maximum: 1e9,
      description: 'samples of the record that one spectrum is made of, without zero padding',
    },
  },
  required: ['window', 'rate', 'samples'],
  additionalProperties: false,
}

/** A curve from a file as an instrument wrote it: everything that must be known about it stands in the budget. */
export const tableSchema = {
  type: 'object',
  description:
    'a density from a text file with rows of frequency and density, which nobody needs to edit; in brackets stands what holds where a key is left out',
  properties: {
    file: { ...short, type: 'string', description: 'path from the folder of this file: data/floor.csv' },
    skip: {
      type: 'integer',
      minimum: 0,
      maximum: 10_000,
      description: 'lines in front of the first row of numbers (none, or with named columns the first)',
    },
    header: {
      type: 'integer',
      minimum: 1,
      maximum: 10_000,
      description: 'number of the line with the names of the columns (the last one that is skipped)',
    },
    remarks: {
      ...mark,
      type: ['string', 'array'],
      items: mark,
      minItems: 1,
      maxItems: 10,
      description: 'lines that begin so are passed over: "%", or several: ["!", END] ("#")',
    },
    separator: { enum: separators, description: 'what parts two cells (comma)' },
    columns: {
      type: 'array',
      items: { ...short },
      minItems: 2,
      maxItems: 2,
      description: `columns of frequency and density, by number from 1 to ${mostCells} or by name in the header: [1, 3]`,
    },
    units: {
      type: 'array',
      items: { ...short },
      minItems: 2,
      maxItems: 2,
      description:
        'of the two columns: [Hz, m/√Hz], [kHz, V²/Hz], [Hz, dBm]. Levels are dBm, dBV, dBc/Hz (phase noise of one sideband, half the density of the phase), dB/Hz (relative power), and dB(V²/Hz) over any unit',
    },
    density: {
      enum: ['amplitude', 'power'],
      description:
        'what the numbers are of where the unit leaves it open; without `bandwidth` they then count per √Hz or per Hz',
    },
    values: { enum: ['rms', 'peak'], description: 'peak: the numbers are √2 times the rms of a sine (rms)' },
    sides: {
      enum: ['one', 'two'],
      description: 'two: the power of negative frequencies is not counted with that of the positive ones (one)',
    },
    bandwidth: {
      description:
        'noise bandwidth in which a spectrum was measured, 10 Hz, or { window, rate, samples } to compute it from',
      if: { type: 'object', not: { type: 'object', required: ['value'] } },
      then: spectralWindow,
      else: quantity,
    },
    resistance: { ...quantity, description: 'where power was measured, to turn it into volts or back: 50 Ω' },
    scale: {
      ...quantity,
      description:
        'of the transducer, from the column’s unit to the field’s: 3.1(2) nm/V; its uncertainty counts. Of quanta it multiplies the power',
    },
    averages: {
      type: 'integer',
      minimum: 1,
      maximum: 1e9,
      description: 'independent spectra in the average; the power is uncertain by 1/√n',
    },
    keep: {
      ...short,
      type: 'string',
      description: 'rows outside this stretch of frequency are passed over: 1 Hz to 100 kHz',
    },
    order: {
      enum: ['ascending', 'any'],
      description: 'any: rows are sorted by frequency; ascending: they must stand so (ascending)',
    },
    outside: {
      enum: ['refuse', 'constant', 'slope'],
      description:
        'how the curve goes on beyond its ends: not at all, so that it must cover the band; at its last value; straight on in log–log by its last two rows (refuse)',
    },
  },
  required: ['file', 'units'],
  additionalProperties: false,
}
