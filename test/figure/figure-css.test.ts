import { describe, expect, it } from 'vitest'
import { figureCss } from '../../src/figure/figure-css.js'
import { FAMILIES, FAMILY_COLOURS } from '../../src/figure/palette.js'

const css = figureCss()

describe('figure.css', () => {
  // `npx vitest run test/figure -u` writes the file after a change of the palette.
  it('is the text made from the palette', async () => {
    await expect(css).toMatchFileSnapshot('../../templates/assets/figure.css')
  })

  it.each(FAMILIES)('knows %s in light, dark and print', family => {
    const colours = [...css.matchAll(new RegExp(`--figure-${family}: (#[0-9a-f]{6});`, 'g'))].map(m => m[1])
    const { light, dark } = FAMILY_COLOURS[family]
    expect(colours).toEqual([light, dark, light])
    expect(css).toContain(`.figure-${family} { --figure-own: var(--figure-${family}); }`)
  })

  it('asks for nothing from elsewhere', () => {
    expect(css).not.toMatch(/url\(|@import|http/)
  })
})
