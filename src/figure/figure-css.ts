import { FAMILIES, FAMILY_COLOURS, GROUND, type Scheme } from './palette.js'
import { COMPACT, WIDE, type TypeSizes } from './type-sizes.js'

/** The style sheet of figures, made from the palette; `templates/assets/figure.css` is this text. */
export function figureCss(): string {
  return [
    '/* Made from src/figure/palette.ts and type-sizes.ts; change them there. */',
    `:root {\n${properties('light')}\n}`,
    `@media (prefers-color-scheme: dark) {\n:root {\n${properties('dark')}\n}\n}`,
    `@media print {\n:root {\n${properties('light')}\n}\n}`,
    RULES,
    ...FAMILIES.map(family => `.figure-${family} { --figure-own: var(--figure-${family}); }`),
    sizes('.figure', WIDE),
    sizes('.figure-compact', COMPACT),
    '',
  ].join('\n')
}

/** For a file that is looked at by itself, on paper of its own. */
export function standaloneCss(): string {
  return `\n${figureCss()}svg { background: var(--figure-paper); }\n`
}

function properties(scheme: Scheme): string {
  const ground = Object.entries(GROUND[scheme]).map(([name, colour]) => `  --figure-${name}: ${colour};`)
  const families = FAMILIES.map(family => `  --figure-${family}: ${FAMILY_COLOURS[family][scheme]};`)
  return [...ground, ...families].join('\n')
}

function sizes(figure: string, type: TypeSizes): string {
  return Object.entries(type)
    .map(([role, size]) => `${figure} .figure-${role} { font-size: ${size}px; }`)
    .join('\n')
}

const RULES = `.figure {
  display: block;
  width: 100%;
  height: auto;
  font-family: var(--sans, Commissioner, 'Helvetica Neue', Arial, 'Liberation Sans', sans-serif);
  font-variant-numeric: tabular-nums;
}
.figure-stroke { fill: none; stroke: var(--figure-own, currentColor); stroke-linejoin: round; }
.figure-fill { fill: var(--figure-own, currentColor); stroke: none; }
.figure-text { fill: var(--figure-own, currentColor); stroke: none; }
.figure-total { --figure-own: var(--figure-ink); stroke-width: 2.6px; }
.figure-spread { --figure-own: var(--figure-ink); opacity: 0.17; }
.figure-variant { --figure-own: var(--figure-ink); stroke-width: 1.3px; }
.figure-limit { --figure-own: var(--figure-limit); stroke-width: 2px; }
.figure-bound { --figure-own: var(--figure-limit); stroke-width: 1px; }
.figure-line { stroke-width: 1.5px; }
.figure-axis, .figure-tick { --figure-own: var(--figure-axis); stroke-width: 0.8px; }
.figure-grid { --figure-own: var(--figure-faint); stroke-width: 0.8px; }
.figure-leader { stroke-width: 0.7px; --figure-own: var(--figure-axis); }
.figure-reference { --figure-own: var(--figure-axis); stroke-width: 0.8px; }
.figure-best { --figure-own: var(--figure-ink); stroke-width: 1.4px; }
.figure-share { opacity: 0.65; }
.figure-beyond { --figure-own: var(--figure-beyond); }
.figure-text.figure-axis, .figure-text.figure-tick, .figure-text.figure-total, .figure-text.figure-variant, .figure-text.figure-best { --figure-own: var(--figure-ink); }
.figure-label.figure-total { font-weight: 700; }
.figure-label.figure-text { paint-order: stroke; stroke: var(--figure-paper); stroke-width: 3px; stroke-linejoin: round; }`
