import type { Box, Polyline } from './scene.js'

/** Edge of a cell in pixels: labels need no finer knowledge of where ink is. */
const CELL = 3

/**
 * Where ink is in a frame, so that the ink inside any box is counted in constant time (a summed-area table). A cell counts
 * the curves that pass through it: taking one curve's own count from that of all leaves the others'.
 */
export class Occupancy {
  private readonly columns: number
  private readonly rows: number
  private readonly cells: Uint8Array
  /** The curve that marked a cell last, so that a curve counts once in it. */
  private readonly marker: Int32Array
  private curve = 0
  private sums: Uint32Array | null = null

  constructor(readonly frame: Box) {
    this.columns = Math.max(1, Math.ceil((frame.right - frame.left) / CELL))
    this.rows = Math.max(1, Math.ceil((frame.bottom - frame.top) / CELL))
    this.cells = new Uint8Array(this.columns * this.rows)
    this.marker = new Int32Array(this.columns * this.rows)
  }

  /** All pieces of one curve. */
  addCurve(pieces: readonly Polyline[]): void {
    this.curve++
    for (const piece of pieces) this.addLine(piece)
  }

  private addLine(line: Polyline): void {
    for (let k = 0; k + 3 < line.length; k += 2) {
      const steps = Math.ceil(Math.hypot(line[k + 2] - line[k], line[k + 3] - line[k + 1]) / CELL) + 1
      for (let s = 0; s <= steps; s++) {
        const t = s / steps
        this.mark(line[k] + t * (line[k + 2] - line[k]), line[k + 1] + t * (line[k + 3] - line[k + 1]))
      }
    }
  }

  addBox(box: Box): void {
    this.curve++
    for (let x = box.left; x <= box.right; x += CELL) for (let y = box.top; y <= box.bottom; y += CELL) this.mark(x, y)
  }

  /** True when the box lies inside the frame and no ink is in it. */
  isFree(box: Box): boolean {
    const { left, top, right, bottom } = this.frame
    if (box.left < left || box.right > right || box.top < top || box.bottom > bottom) return false
    return this.count(box) === 0
  }

  /** Cells with ink inside the box, each as often as curves pass through it. */
  count(box: Box): number {
    const sums = (this.sums ??= this.integrate())
    const width = this.columns + 1
    const c0 = this.column(box.left)
    const c1 = this.column(box.right) + 1
    const r0 = this.row(box.top)
    const r1 = this.row(box.bottom) + 1
    return sums[r1 * width + c1] - sums[r0 * width + c1] - sums[r1 * width + c0] + sums[r0 * width + c0]
  }

  private integrate(): Uint32Array {
    const width = this.columns + 1
    const sums = new Uint32Array(width * (this.rows + 1))
    for (let r = 0; r < this.rows; r++) {
      let row = 0
      for (let c = 0; c < this.columns; c++) {
        row += this.cells[r * this.columns + c]
        sums[(r + 1) * width + c + 1] = sums[r * width + c + 1] + row
      }
    }
    return sums
  }

  private mark(x: number, y: number): void {
    const cell = this.row(y) * this.columns + this.column(x)
    if (this.marker[cell] === this.curve) return
    this.marker[cell] = this.curve
    this.cells[cell]++
    this.sums = null
  }

  private column(x: number): number {
    return Math.min(this.columns - 1, Math.max(0, Math.floor((x - this.frame.left) / CELL)))
  }

  private row(y: number): number {
    return Math.min(this.rows - 1, Math.max(0, Math.floor((y - this.frame.top) / CELL)))
  }
}
