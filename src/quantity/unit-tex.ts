import { parseUnitTree } from './grammar.js'
import { canonicalSymbol } from './units.js'
import type { PowerNode, TermNode, UnitNode } from './tree.js'

/** A unit in TeX for KaTeX: `aN/√Hz` becomes `\mathrm{aN}/\sqrt{\mathrm{Hz}}`; empty for a plain number. */
export function unitTex(unit: string): string {
  const trimmed = unit.trim()
  return trimmed === '' || trimmed === '1' ? '' : product(parseUnitTree(trimmed))
}

function product(node: UnitNode): string {
  const tail = node.tail.map(({ operator, term: factor }) => (operator === '/' ? '/' : '\\,') + term(factor))
  return (node.slash ? '1/' : '') + term(node.head) + tail.join('')
}

function term(node: TermNode): string {
  switch (node.type) {
    case 'one':
      return '1'
    case 'root':
      return `\\sqrt{${node.of.type === 'group' ? product(node.of.unit) : term(node.of)}}`
    case 'group':
      return (node.root ? `\\sqrt{${product(node.unit)}}` : `(${product(node.unit)})`) + power(node.power)
    case 'symbol':
      return symbolTex(canonicalSymbol(node.symbol)) + power(node.power)
  }
}

function power(node: PowerNode | null): string {
  if (node === null) return ''
  return `^{${node.sign}${node.over}${node.under === '1' ? '' : `/${node.under}`}}`
}

/** KaTeX has no upright micro sign: `\mu` is the nearest. The degree sign is a raised ring. */
function symbolTex(symbol: string): string {
  const special = specialTex.get(symbol)
  if (special !== undefined) return special
  const [, micro, letters, greek] = /^(µ?)(.*?)(Ω?|Φ₀?)$/u.exec(symbol) ?? ['', '', symbol, '']
  const upright = letters && `\\mathrm{${letters.replace(/\s+/u, '\\,')}}`
  return (micro && '\\mu ') + upright + (greek === '' ? '' : greek === 'Ω' ? '\\Omega' : '\\Phi_0')
}

const specialTex: ReadonlyMap<string, string> = new Map([
  ['%', '\\%'],
  ['Å', '\\text{Å}'],
  ['°', '{}^{\\circ}'],
  ['°C', '{}^{\\circ}\\mathrm{C}'],
  ['′', "{}'"],
  ['″', "{}''"],
])
