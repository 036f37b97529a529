import { readdirSync, readFileSync } from 'node:fs'
import { expect, test } from 'vitest'
import { majorOf, majors, statementProblems } from '#shared/allergens/allergens.ts'
import { isOneSlipApart } from '#shared/one-slip.ts'
import { bestQualityMonths, storageStatements } from '#shared/storage/storage.ts'
import { ouncesToGrams } from '#shared/weight.ts'
import { categories, winterLarder } from './catalog.ts'

test('twenty-four items, four in each of six categories, in the order of the categories', () => {
  expect(winterLarder.map(item => item.category)).toEqual(
    categories.flatMap(category => Array(4).fill(category.slug)),
  )
  expect(categories).toHaveLength(6)
})

test('every code is four digits and no two are one slip of the pen apart', () => {
  expect(new Set(winterLarder.map(item => item.code)).size).toBe(24)
  for (const { code } of winterLarder) {
    expect(code).toMatch(/^[1-9]\d{3}$/)
    expect(winterLarder.filter(other => isOneSlipApart(code, other.code))).toEqual([])
  }
})

test('every major allergen is in at least one item, and every statement is complete', () => {
  // 21 U.S.C. 321(qq)(1): nine major food allergens; 343(w)(2): nuts, fish and crustaceans by species.
  const met = new Set(winterLarder.flatMap(item => item.contains.map(majorOf)))
  expect([...met].sort()).toEqual([...majors].sort())
  for (const item of winterLarder) {
    expect(statementProblems(item), item.code).toEqual([])
    expect(
      item.mayContain.filter(name => item.contains.includes(name)),
      item.code,
    ).toEqual([])
  }
  expect(winterLarder.some(item => item.containsNone)).toBe(true)
})

test('the grams are the printed ounces, rounded down and never up', () => {
  // NIST SP 811, appendix B: the avoirdupois ounce is 28.349523125 g.
  for (const item of winterLarder) {
    const printed = /^(?:(\d+) tubs of )?(\d+) oz$/.exec(item.printedWeight)
    expect(printed, item.printedWeight).not.toBeNull()
    const [, packs = '1', ounces] = printed!
    expect(item.netWeightG, item.code).toBe(ouncesToGrams(Number(packs) * Number(ounces)))
  }
})

test('best quality is what the FoodKeeper row says, and nothing where no row fits', () => {
  for (const item of winterLarder)
    expect(item.bestQualityMonths, item.code).toEqual(
      item.foodKeeperRow === null ? null : bestQualityMonths[item.foodKeeperRow],
    )
})

test('everything arrives frozen, and every dough says not to taste it raw', () => {
  for (const item of winterLarder) expect(storageStatements(item.storage)).toContain('storage.keepFrozen')
  for (const item of winterLarder.filter(({ name }) => /dough|buns/.test(name)))
    expect(storageStatements(item.storage), item.code).toContain('storage.rawDough')
})

test('every item is told in both languages, in plain words', () => {
  expect(new Set(winterLarder.map(item => item.slug)).size).toBe(24)
  for (const item of winterLarder) {
    const words = [item.pieces, item.serves, item.description, item.preparation]
    for (const text of [item.name, item.nameEs, ...words.flatMap(({ en, es }) => [en, es])]) {
      expect(text, item.code).toMatch(/\p{L}{2}/u)
      expect(text, item.code).not.toMatch(/^\s|\s$|!/)
    }
    for (const { en, es } of [item.description, item.preparation]) expect(en, item.code).not.toBe(es)
    expect(item.slug).toMatch(/^[a-z]+(-[a-z]+)*$/)
  }
})

test('prices, cases and sizes are in their ranges', () => {
  for (const item of winterLarder) {
    expect(item.priceCents).toBeGreaterThanOrEqual(1400)
    expect(item.priceCents).toBeLessThanOrEqual(2600)
    expect(item.casePack).toBeGreaterThanOrEqual(6)
    expect(item.casePack).toBeLessThanOrEqual(12)
    // Food is about as dense as water or lighter, and a package has walls.
    expect(item.volumeMl, item.code).toBeGreaterThan(item.netWeightG)
  }
})

test('every item has its drawing, small and plain', () => {
  const folder = new URL('./pictures/', import.meta.url)
  expect(readdirSync(folder).sort()).toEqual(winterLarder.map(item => `${item.code}.svg`).sort())
  for (const { code } of winterLarder) {
    const svg = readFileSync(new URL(`${code}.svg`, folder), 'utf8')
    expect(svg).toContain('viewBox="0 0 480 400"')
    expect(svg.length, code).toBeLessThan(4096)
    expect(svg, code).not.toMatch(/<text|<image|<style|style=|href|gradient|url\(/i)
    const plies = ['#16245A', '#FFE27A', '#FFC9D4', '#F4B740', '#E6EDF4', '#FFFFFF', '#0A6470', '#B3261E']
    expect(
      svg.match(/#[0-9A-F]{3,8}\b/gi)!.filter(color => !plies.includes(color)),
      code,
    ).toEqual([])
  }
})
