import type { Ink, Mark, PathMark, Polyline, RingMark, Scene, TextMark } from './scene.js'
import { standaloneCss } from './figure-css.js'
import { LINE_HEIGHT, isCompact, typeSizes, type TypeSizes } from './type-sizes.js'

/**
 * SVG text of a scene, to be placed in a page that loads `figure.css`. It has no style attributes; every id starts with
 * `idPrefix`, so that several figures can share a page. It scales to the width of its container.
 */
export function renderSvg(scene: Scene, idPrefix: string): string {
  return render(scene, idPrefix, '')
}

/** The same as a file of its own, which carries its style sheet with it. */
export function renderStandaloneSvg(scene: Scene, idPrefix: string): string {
  return `<?xml version="1.0" encoding="UTF-8"?>\n${render(scene, idPrefix, `<style>${standaloneCss()}</style>\n`)}\n`
}

function render(scene: Scene, idPrefix: string, style: string): string {
  const { width, height } = scene
  const id = (name: string) => escapeXml(`${idPrefix}-${name}`)
  const sizes = typeSizes(width)
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" class="figure${isCompact(width) ? ' figure-compact' : ''}" viewBox="0 0 ${tenths(width)} ${tenths(height)}"` +
      ` width="${tenths(width)}" height="${tenths(height)}" role="img" aria-labelledby="${id('title')} ${id('description')}">`,
    `<title id="${id('title')}">${escapeXml(scene.title)}</title>`,
    `<desc id="${id('description')}">${escapeXml(scene.description)}</desc>`,
    style + scene.marks.map(mark => renderMark(mark, sizes, idPrefix)).join('\n'),
    '</svg>',
  ].join('\n')
}

function renderMark(mark: Mark, sizes: TypeSizes, idPrefix: string): string {
  if (mark.mark === 'path') return renderPath(mark, idPrefix)
  if (mark.mark === 'text') return renderText(mark, sizes)
  return renderRing(mark)
}

function renderPath(mark: PathMark, idPrefix: string): string {
  const id = mark.of === undefined ? '' : ` id="${escapeXml(`${idPrefix}-${mark.of}`)}"`
  const dash = mark.dash === undefined ? '' : ` stroke-dasharray="${mark.dash.join(' ')}"`
  const shape = mark.filled ? 'fill' : 'stroke'
  return `<path${id} class="${classes(mark.ink, shape)}"${dash} d="${mark.pieces.map(pathData).join('')}${mark.filled ? 'z' : ''}"/>`
}

function renderText(mark: TextMark, sizes: TypeSizes): string {
  const at = mark.turned
    ? `transform="translate(${tenths(mark.x)} ${tenths(mark.y)}) rotate(-90)"`
    : `x="${tenths(mark.x)}" y="${tenths(mark.y)}"`
  const anchor = mark.anchor === 'start' ? '' : ` text-anchor="${mark.anchor}"`
  const start = `<text class="figure-${mark.role} ${classes(mark.ink, 'text')}" ${at}${anchor}>`
  const step = tenths(sizes[mark.role] * LINE_HEIGHT)
  const [first, ...more] = mark.lines.map(escapeXml)
  const rest = more.map(line => `<tspan x="${tenths(mark.x)}" dy="${step}">${line}</tspan>`).join('')
  return start + first + rest + renderRaised(mark, sizes) + '</text>'
}

function renderRaised(mark: TextMark, sizes: TypeSizes): string {
  if (mark.raised === undefined) return ''
  return `<tspan class="figure-raised" dy="${tenths(-0.42 * sizes[mark.role])}">${escapeXml(mark.raised)}</tspan>`
}

function renderRing(mark: RingMark): string {
  return `<circle class="${classes(mark.ink, 'stroke')}" cx="${tenths(mark.x)}" cy="${tenths(mark.y)}" r="${tenths(mark.radius)}"/>`
}

/** `figure-line figure-stroke figure-thermal`. */
function classes(ink: Ink, shape: 'fill' | 'stroke' | 'text'): string {
  const family = ink.as === 'line' || ink.as === 'share' ? ` figure-${ink.family}` : ''
  return `figure-${ink.as} figure-${shape}${family}`
}

/** A path in tenths of a pixel, every step relative to the rounded point before, so that rounding does not add up. */
export function pathData(line: Polyline): string {
  let x = Math.round(line[0] * 10)
  let y = Math.round(line[1] * 10)
  let data = `M${short(x)} ${short(y)}l`
  for (let k = 2; k + 1 < line.length; k += 2) {
    const nextX = Math.round(line[k] * 10)
    const nextY = Math.round(line[k + 1] * 10)
    if (nextX === x && nextY === y && k + 2 < line.length) continue
    data += `${data.endsWith('l') ? '' : ' '}${short(nextX - x)} ${short(nextY - y)}`
    x = nextX
    y = nextY
  }
  return data
}

/** Tenths as a decimal without needless characters: 12 → `1.2`, −3 → `-.3`, 40 → `4`. */
function short(value: number): string {
  if (!Number.isFinite(value)) throw new RangeError(`no such coordinate: ${value}`)
  return String(value / 10).replace(/^(-?)0\./, '$1.')
}

function tenths(value: number): string {
  return short(Math.round(value * 10) + 0)
}

function escapeXml(text: string): string {
  return text.replace(/[&<>"']/g, c => `&#${c.charCodeAt(0)};`)
}
