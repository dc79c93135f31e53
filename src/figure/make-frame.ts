import type { AxisPlan } from './axis-plan.js'
import { MAJOR } from './axis-marks.js'
import type { Box, Size } from './scene.js'
import { textSize } from './text-box.js'
import { isCompact, typeSizes } from './type-sizes.js'

const RIGHT_COMPACT = 14
/** Between the title of the vertical axis and its longest number, and between that and its tick. */
const GAPS = 14
/** Below a frame, besides the numbers and the title of the horizontal axis. */
const BELOW = 32
const BELOW_COMPACT = 26

/** The rectangle of the curves: what the numbers of the axes and the names at the right leave free. */
export function makeFrame(size: Size, plans: { x: AxisPlan; y: AxisPlan }, top: number, names: number): Box {
  const type = typeSizes(size.width)
  const compact = isCompact(size.width)
  const right = Math.max(RIGHT_COMPACT, widest(plans.x, type.tick) / 2 + 2)
  return {
    left: type.axis * 1.35 + GAPS + widest(plans.y, type.tick) + MAJOR,
    top,
    right: size.width - (compact ? right : names),
    bottom: size.height - type.tick - type.axis - (compact ? BELOW_COMPACT : BELOW),
  }
}

function widest(plan: AxisPlan, size: number): number {
  return Math.max(0, ...plan.ticks.map(tick => textSize([tick.text ?? ''], size, tick.raised).width))
}
