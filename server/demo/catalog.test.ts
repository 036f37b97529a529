import { expect, test } from 'vitest'
import type { Allergen } from '#shared/allergens/allergens.ts'
import { majorOf, majors, statementProblems } from '#shared/allergens/allergens.ts'
import { ouncesToGrams } from '#shared/weight.ts'
import { categories, winterLarder } from './catalog.ts'

test('twenty-four items, four in each of six categories', () => {
  expect(winterLarder).toHaveLength(24)
  for (const category of categories)
    expect(winterLarder.filter(item => item.category === category.slug)).toHaveLength(4)
})

/** Whether one slip of the pen turns one code into the other: a digit wrong, or two neighbors swapped. */
function oneSlipApart(a: string, b: string): boolean {
  const wrong = [...a].filter((digit, place) => digit !== b[place]).length
  if (wrong === 1) return true
  return [0, 1, 2].some(place => a.slice(0, place) + a[place + 1] + a[place] + a.slice(place + 2) === b)
}

test('no two codes are one slip of the pen apart', () => {
  expect(oneSlipApart('4127', '4172')).toBe(true)
  expect(oneSlipApart('4127', '4271')).toBe(false)
  for (const item of winterLarder)
    for (const other of winterLarder)
      if (item !== other)
        expect(oneSlipApart(item.code, other.code), `${item.code} ${other.code}`).toBe(false)
})

test('every major allergen is met by at least one item, and every statement is complete', () => {
  const met = new Set(winterLarder.flatMap(item => item.contains.map(name => majorOf(name as Allergen))))
  expect([...majors].filter(major => !met.has(major))).toEqual([])
  for (const item of winterLarder)
    expect(statementProblems({ ...item, containsNone: item.contains.length === 0 })).toEqual([])
})

test('no printed weight says more grams than are inside', () => {
  for (const item of winterLarder) {
    const [, packs = '1', ounces = '0'] = /^(?:(\d+) tubs of )?([\d.]+) oz$/.exec(item.printedWeight) ?? []
    expect(item.netWeightG, item.code).toBeLessThanOrEqual(ouncesToGrams(Number(packs) * Number(ounces)))
  }
})

test('every item is described in both languages, each field with words', () => {
  for (const item of winterLarder)
    for (const words of [...item.en, ...item.es]) expect(words.trim().length, item.code).toBeGreaterThan(2)
})
