/**
 * The loops over frequency, on the registers of `memory`. Addresses are in bytes; a complex register is two neighbouring
 * blocks, real part first. `n` is the number of points, at most `blockLength`; loops may compute one point more. `out` may
 * alias an input. All budgets share these loops, so they are hot from the second block on.
 */
export interface Loops {
  /** out = a·b. */
  multiply(out: number, a: number, b: number, n: number): void
  /** out = 1/a. */
  reciprocal(out: number, a: number, n: number): void
  /** out = a/b. */
  divide(out: number, a: number, b: number, n: number): void
  /** out = s·a + c. */
  affine(out: number, a: number, n: number, sr: number, si: number, cr: number, ci: number): void
  /** out = s·a + t·b + c. */
  combine(
    out: number,
    a: number,
    b: number,
    n: number,
    sr: number,
    si: number,
    tr: number,
    ti: number,
    cr: number,
    ci: number,
  ): void
  /** out += s·a; here out must not be a. */
  addScaled(out: number, a: number, n: number, sr: number, si: number): void
  /** out = |a|², real. */
  abs2(out: number, a: number, n: number): void
  /** out = 1/|a|², real. */
  inverseAbs2(out: number, a: number, n: number): void
  /** out = |Im a|, real. */
  absImaginary(out: number, a: number, n: number): void
  /** out = |a|² + ratio·|b|², real. */
  pair(out: number, a: number, b: number, n: number, ratio: number): void
  /** out = Re(c·a·b*), real. */
  cross(out: number, a: number, b: number, n: number, cr: number, ci: number): void
  /** out += Re(c·a·b*), real. */
  addCross(out: number, a: number, b: number, n: number, cr: number, ci: number): void
  /** out = a·b of reals; `ratio` a/b; `root` √a. */
  product(out: number, a: number, b: number, n: number): void
  ratio(out: number, a: number, b: number, n: number): void
  root(out: number, a: number, n: number): void
  /** out = Σ s_i·a_i of reals. */
  sum1(out: number, a: number, n: number, s0: number): void
  sum2(out: number, a: number, b: number, n: number, s0: number, s1: number): void
  sum4(
    out: number,
    a: number,
    b: number,
    c: number,
    d: number,
    n: number,
    s0: number,
    s1: number,
    s2: number,
    s3: number,
  ): void
  /** out = value, real. */
  constant(out: number, n: number, value: number): void
  /** out = stiffness·(frequency − base − offset)(frequency + f) + i(slope·f + level), frequencies in Hz. */
  oscillator(
    out: number,
    f: number,
    base: number,
    offset: number,
    n: number,
    stiffness: number,
    frequency: number,
    slope: number,
    level: number,
  ): void
  /** out = 1/[half − i(detuning + 2πf)], rates in rad/s. */
  decayReciprocal(out: number, f: number, n: number, half: number, detuning: number): void
  /** out = classical·x coth x, x = ratio·f with x² ≤ 0.01, real. */
  warmBath(out: number, f: number, n: number, classical: number, ratio: number): void
}
