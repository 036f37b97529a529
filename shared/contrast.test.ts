import { readFileSync } from 'node:fs'
import { expect, test } from 'vitest'

/** Relative luminance and contrast ratio, as WCAG 2.2 defines them. */
function luminance(hex: string): number {
  const [r, g, b] = [1, 3, 5].map(at => Number.parseInt(hex.slice(at, at + 2), 16) / 255)
  const linear = (c: number) => (c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4)
  return 0.2126 * linear(r!) + 0.7152 * linear(g!) + 0.0722 * linear(b!)
}
function contrast(a: string, b: string): number {
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x)
  return (light! + 0.05) / (dark! + 0.05)
}

const css = readFileSync(new URL('../web/styles/app.css', import.meta.url), 'utf8')
function token(name: string): string {
  const found = new RegExp(`--color-${name}:\\s*(#[0-9a-fA-F]{6})`).exec(css)
  if (!found) throw new Error(`no token ${name} in web/styles/app.css`)
  return found[1]!
}

test('the formula gives the published values (WCAG 2.2, relative luminance and success criterion 1.4.3)', () => {
  expect(contrast('#767676', '#ffffff')).toBeCloseTo(4.5422, 3)
  expect(contrast('#777777', '#ffffff')).toBeCloseTo(4.4781, 3)
  expect(contrast('#1a4d8f', '#ffffff')).toBeCloseTo(8.3929, 3)
  expect(contrast('#949494', '#ffffff')).toBeCloseTo(3.0335, 3)
  expect(contrast('#959595', '#ffffff')).toBeCloseTo(2.9953, 3)
  expect(contrast('#595959', '#ffffff')).toBeCloseTo(7.0047, 3)
  expect(contrast('#ff0000', '#ffffff')).toBeCloseTo(3.9985, 3)
  expect(contrast('#0000ff', '#ffffff')).toBeCloseTo(8.5925, 3)
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 6)
})

test.each([
  ['ink', 'sheet', 14],
  ['ink', 'canary', 8],
  ['ink', 'pink', 8],
  ['ink', 'goldenrod', 8],
  ['ink', 'desk', 7],
  ['ink-soft', 'sheet', 7],
  ['ink-soft', 'desk', 4.5],
  ['ink-soft', 'pink', 4.5],
  ['stamp', 'sheet', 6],
  ['frost', 'sheet', 6],
  ['frost', 'desk', 4.5],
  ['paid', 'sheet', 6],
  ['field', 'sheet', 3],
  ['field', 'desk', 3],
])('%s on %s has a contrast of at least %f', (text, ground, ratio) => {
  expect(contrast(token(text), token(ground))).toBeGreaterThanOrEqual(ratio)
})
