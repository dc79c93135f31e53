/** A frequency that points are measured from: a bare mode, a pole of the network or a zero of the response. */
export interface Anchor {
  /** `fundamental`, `pole 1`, `zero 1`. */
  readonly id: string
  readonly nature: 'mode' | 'pole' | 'zero'
  /** In Hz. */
  readonly frequency: number
  /** Half width at half maximum of the feature, in Hz. */
  readonly halfWidth: number
}

/**
 * Points at which curves are evaluated, ascending in frequency. A point is an anchor and an offset in hertz, or an
 * absolute frequency (anchor −1, the offset is then the frequency itself), so that a resonance of quality 10⁹ keeps its shape in double precision.
 */
export interface Points {
  readonly anchors: readonly Anchor[]
  /** Absolute frequency in Hz, anchor + offset. */
  readonly frequency: Float64Array
  /** Index into `anchors`, or −1. */
  readonly anchor: Int32Array
  /** In Hz from the anchor; the frequency itself where the anchor is −1. */
  readonly offset: Float64Array
}
