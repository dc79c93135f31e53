/** How a window weights the samples of a record. */
export type WindowShape =
  /** w(x) = a₀ − a₁ cos 2πx + a₂ cos 4πx − …, x = j/N; the coefficients as printed, all positive. */
  | { readonly form: 'cosines'; readonly coefficients: readonly number[]; readonly source: string }
  /** w(x) of another form, symmetric about x = ½, with the limit of its noise bandwidth in bins for long records. */
  | {
      readonly form: 'other'
      readonly weight: (x: number) => number
      readonly bins: number
      readonly source: string
    }

const harris = 'Harris, Proc. IEEE 66, 51 (1978)'
const nuttall = 'Nuttall, IEEE Trans. ASSP 29, 84 (1981), from memory'
const heinzel = 'Heinzel, Rüdiger, Schilling 2002, Spectrum and spectral density estimation'

function cosines(source: string, ...coefficients: readonly number[]): WindowShape {
  return { form: 'cosines', coefficients, source }
}

/**
 * Windows by the name that a budget gives them. Where a source says "from memory" the coefficients were written down from
 * memory; tests hold each against the printed noise bandwidth, which a slip in any digit that matters would miss.
 */
export const windowShapes = {
  rectangular: cosines(harris, 1),
  bartlett: { form: 'other', weight: x => 1 - Math.abs(2 * x - 1), bins: 4 / 3, source: harris },
  welch: { form: 'other', weight: x => 1 - (2 * x - 1) ** 2, bins: 6 / 5, source: harris },
  hann: cosines(harris, 0.5, 0.5),
  hamming: cosines(harris, 0.54, 0.46),
  blackman: cosines(harris, 0.42, 0.5, 0.08),
  'exact-blackman': cosines(harris, 7938 / 18608, 9240 / 18608, 1430 / 18608),
  'blackman-harris': cosines(`${harris}, from memory`, 0.35875, 0.48829, 0.14128, 0.01168),
  nuttall3: cosines(nuttall, 0.375, 0.5, 0.125),
  nuttall3a: cosines(nuttall, 0.40897, 0.5, 0.09103),
  nuttall3b: cosines(heinzel, 0.4243801, 0.4973406, 0.0782793),
  nuttall4: cosines(heinzel, 0.3125, 0.46875, 0.1875, 0.03125),
  nuttall4a: cosines(nuttall, 0.338946, 0.481973, 0.161054, 0.018027),
  nuttall4b: cosines(nuttall, 0.355768, 0.487396, 0.144232, 0.012604),
  nuttall4c: cosines(nuttall, 0.3635819, 0.4891775, 0.1365995, 0.0106411),
  // The one that numerical packages call the flat top.
  'flat-top': cosines(
    'D’Antona, Ferrero, Digital Signal Processing for Measurement Systems (2006), from memory',
    ...[0.21557895, 0.41663158, 0.277263158, 0.083578947, 0.006947368],
  ),
  sft3f: cosines(`${heinzel}, from memory`, 0.26526, 0.5, 0.23474),
  sft4f: cosines(`${heinzel}, from memory`, 0.21706, 0.42103, 0.28294, 0.07897),
  sft5f: cosines(`${heinzel}, from memory`, 0.1881, 0.36923, 0.28702, 0.13077, 0.02488),
  sft3m: cosines(`${heinzel}, from memory`, 0.28235, 0.52105, 0.19659),
  sft4m: cosines(`${heinzel}, from memory`, 0.241906, 0.460841, 0.255381, 0.041872),
  sft5m: cosines(`${heinzel}, from memory`, 0.209671, 0.407331, 0.281225, 0.092669, 0.0091036),
  hft70: cosines(`${heinzel}, from memory`, 1, 1.90796, 1.07349, 0.18199),
  hft90d: cosines(`${heinzel}, from memory`, 1, 1.942604, 1.340318, 0.440811, 0.043097),
  hft95: cosines(`${heinzel}, from memory`, 1, 1.9383379, 1.3045202, 0.402827, 0.0350665),
  hft116d: cosines(heinzel, 1, 1.9575375, 1.4780705, 0.6367431, 0.1228389, 0.0066288),
  hft144d: cosines(
    `${heinzel}, from memory`,
    ...[1, 1.96760033, 1.57983607, 0.81123644, 0.22583558, 0.02773848, 0.0009036],
  ),
  hft169d: cosines(heinzel, ...[1, 1.97441842, 1.65409888, 0.95788186, 0.3367342, 0.06364621, 0.00521942, 0.00010599]),
  hft196d: cosines(
    `${heinzel}, from memory`,
    ...[1, 1.97928042, 1.710288951, 1.081629853, 0.448734314, 0.112376628, 0.015122992, 0.000871252, 0.000011896],
  ),
  hft223d: cosines(
    `${heinzel}, from memory`,
    ...[1, 1.98298997309, 1.75556083063, 1.19037717712, 0.56155440797, 0.17296769663, 0.03233247087],
    ...[0.00324954578, 0.0001380104, 0.00000132725],
  ),
  hft248d: cosines(
    heinzel,
    ...[1, 1.985844164102, 1.791176438506, 1.282075284005, 0.667777530266, 0.240160796576, 0.056656381764],
    ...[0.008134974479, 0.00062454465, 0.000019808998, 0.000000132974],
  ),
} as const satisfies { readonly [name: string]: WindowShape }

export type WindowName = keyof typeof windowShapes

export const windowNames = Object.keys(windowShapes) as readonly WindowName[]

export function isWindowName(name: string): name is WindowName {
  return Object.hasOwn(windowShapes, name)
}
