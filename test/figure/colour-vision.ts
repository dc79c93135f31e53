/** Colours as numbers, for tests of a palette. */
export type Triple = readonly [number, number, number]

export type Vision = 'normal' | 'protanopia' | 'deuteranopia' | 'tritanopia'

/**
 * Dichromatic vision on linear sRGB, severity 1 [Machado, Oliveira, Fernandes, IEEE Trans. Vis. Comput. Graph. 15, 1291
 * (2009), table of matrices; from memory, checked by the rows' sums of one and by the confusions in the test].
 */
export const VISIONS: { readonly [V in Vision]: readonly [Triple, Triple, Triple] } = {
  normal: [
    [1, 0, 0],
    [0, 1, 0],
    [0, 0, 1],
  ],
  protanopia: [
    [0.152286, 1.052583, -0.204868],
    [0.114503, 0.786281, 0.099216],
    [-0.003882, -0.048116, 1.051998],
  ],
  deuteranopia: [
    [0.367322, 0.860646, -0.227968],
    [0.280085, 0.672501, 0.047413],
    [-0.01182, 0.04294, 0.968881],
  ],
  tritanopia: [
    [1.255528, -0.076749, -0.178779],
    [-0.078411, 0.930809, 0.147602],
    [0.004733, 0.691367, 0.3039],
  ],
}

/** Linear sRGB of `#rrggbb`. */
export function linear(hex: string): Triple {
  const channel = (at: number) => {
    const c = Number.parseInt(hex.slice(at, at + 2), 16) / 255
    return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4
  }
  return [channel(1), channel(3), channel(5)]
}

export function seenWith(vision: Vision, rgb: Triple): Triple {
  const row = ([r, g, b]: Triple) => Math.min(1, Math.max(0, r * rgb[0] + g * rgb[1] + b * rgb[2]))
  const [r, g, b] = VISIONS[vision]
  return [row(r), row(g), row(b)]
}

export function luminance([r, g, b]: Triple): number {
  return 0.2126 * r + 0.7152 * g + 0.0722 * b
}

/** Contrast ratio of WCAG 2. */
export function contrast(a: string, b: string): number {
  const [low, high] = [luminance(linear(a)), luminance(linear(b))].sort((x, y) => x - y)
  return (high + 0.05) / (low + 0.05)
}

/** CIELAB (D65) of linear sRGB. */
export function lab([r, g, b]: Triple): Triple {
  const f = (t: number) => (t > 216 / 24389 ? Math.cbrt(t) : ((24389 / 27) * t + 16) / 116)
  const x = f((0.4124564 * r + 0.3575761 * g + 0.1804375 * b) / 0.95047)
  const y = f(0.2126729 * r + 0.7151522 * g + 0.072175 * b)
  const z = f((0.0193339 * r + 0.119192 * g + 0.9503041 * b) / 1.08883)
  return [116 * y - 16, 500 * (x - y), 200 * (y - z)]
}

const RADIANS = Math.PI / 180

/** Colour difference CIEDE2000 of two CIELAB colours [Sharma, Wu, Dalal, Color Res. Appl. 30, 21 (2005)]. */
export function difference([L1, a1, b1]: Triple, [L2, a2, b2]: Triple): number {
  const meanC = (Math.hypot(a1, b1) + Math.hypot(a2, b2)) / 2
  const G = 0.5 * (1 - Math.sqrt(meanC ** 7 / (meanC ** 7 + 25 ** 7)))
  const C1 = Math.hypot(a1 * (1 + G), b1)
  const C2 = Math.hypot(a2 * (1 + G), b2)
  const h1 = hue(a1 * (1 + G), b1)
  const h2 = hue(a2 * (1 + G), b2)
  const dH = 2 * Math.sqrt(C1 * C2) * Math.sin((turn(h2 - h1) * RADIANS) / 2)
  const L = (L1 + L2) / 2
  const C = (C1 + C2) / 2
  const h = C1 * C2 === 0 ? h1 + h2 : (h1 + turn(h2 - h1) / 2 + 360) % 360
  const SL = 1 + (0.015 * (L - 50) ** 2) / Math.sqrt(20 + (L - 50) ** 2)
  const SC = 1 + 0.045 * C
  const SH = 1 + 0.015 * C * hueWeight(h)
  const RT = -Math.sin(60 * Math.exp(-(((h - 275) / 25) ** 2)) * RADIANS) * 2 * Math.sqrt(C ** 7 / (C ** 7 + 25 ** 7))
  const [l, c, k] = [(L2 - L1) / SL, (C2 - C1) / SC, dH / SH]
  return Math.sqrt(l * l + c * c + k * k + RT * c * k)
}

function hueWeight(h: number): number {
  const cos = (times: number, shift: number) => Math.cos((times * h + shift) * RADIANS)
  return 1 - 0.17 * cos(1, -30) + 0.24 * cos(2, 0) + 0.32 * cos(3, 6) - 0.2 * cos(4, -63)
}

function hue(a: number, b: number): number {
  return (Math.atan2(b, a) / RADIANS + 360) % 360
}

/** A difference of hues to within half a turn. */
function turn(degrees: number): number {
  if (degrees > 180) return degrees - 360
  return degrees < -180 ? degrees + 360 : degrees
}
