import { expect, test } from 'vitest'
import { foodTranslator } from '../messages/food.ts'
import {
  bestQualityMonths,
  bestQualityUntil,
  fahrenheitToCelsius,
  hoursOutOfFreezer,
  meetsRefreezeCriteria,
  storageClasses,
  storageStatements,
  thawHours,
  thawHoursOfGrams,
  unionStorage,
} from './storage.ts'

const t = foodTranslator('en')
const said = (keys: readonly string[]) => keys.map(key => t(key)).join(' ')

test('frozen food is kept at 0 °F, which is −18 °C (USDA FSIS, Freezing and Food Safety)', () => {
  expect(Math.round(fahrenheitToCelsius(0))).toBe(-18)
  expect(fahrenheitToCelsius(40)).toBeCloseTo(4.44, 2)
  for (const storage of storageClasses.filter(name => name !== 'shelf_stable'))
    expect(said(storageStatements(storage))).toMatch(/0 °F \(−18 °C\)/)
})

test('raw dough is never tasted (FDA, Handling Flour Safely)', () => {
  expect(said(storageStatements('frozen_raw_dough'))).toMatch(/Do not taste raw dough/)
  expect(said(storageStatements('frozen_ready'))).not.toMatch(/raw dough/)
})

test('two hours out, one hour above 90 °F; refrozen only with ice crystals or at 40 °F (USDA FSIS, Mail Order Food Safety)', () => {
  expect(said(storageStatements('frozen_to_cook'))).toMatch(/2 hours, or 1 hour when it is above 90 °F/)
  expect(said(storageStatements('frozen_to_cook'))).toMatch(/ice crystals or is at 40 °F/)
})

test('thawing takes a day for every five pounds or part (USDA FSIS; MSU Extension E3259)', () => {
  expect(thawHours(2.7)).toBe(24)
  expect(thawHours(5)).toBe(24)
  expect(thawHours(5.1)).toBe(48)
  expect(thawHoursOfGrams(2267)).toBe(24)
  expect(thawHoursOfGrams(2268)).toBe(48)
})

test('best quality is counted from delivery (USDA FoodKeeper rows 198 and 309)', () => {
  expect(bestQualityUntil('2026-12-05', [3, 6])).toEqual({ from: '2027-03-05', to: '2027-06-05' })
  expect(bestQualityUntil('2026-12-05', [12, 12]).to).toBe('2027-12-05')
  expect(bestQualityUntil('2026-12-05', bestQualityMonths[198]!).from).toBe('2027-03-05')
  expect(bestQualityUntil('2026-12-05', bestQualityMonths[309]!).to).toBe('2027-12-05')
})

test('dough bought frozen keeps a year, dough bought refrigerated two months (USDA FoodKeeper rows 309 and 247)', () => {
  expect(bestQualityMonths[309]).toEqual([12, 12])
  expect(bestQualityMonths[247]).toEqual([2, 2])
})

test('rows that advise against freezing at home have no window (USDA FoodKeeper: cream and chiffon pie, Danish, tube rolls)', () => {
  for (const row of [204, 205, 206, 245, 552]) expect(bestQualityMonths[row]).toBeUndefined()
})

test('a best-quality date is about taste and never calls food unsafe (USDA FSIS: frozen food stays safe)', () => {
  const text = t('storage.bestQuality', { day: 'Friday, March 5' })
  expect(text).toMatch(/Best quality until about Friday, March 5/)
  expect(text).not.toMatch(/unsafe|expire|spoil|do not eat/i)
})

test.each([
  [88, 2],
  [90, 2],
  [91, 1],
] as const)('in air of %i °F food may be out for %i h (USDA FSIS: one hour above 90 °F)', (air, hours) => {
  expect(hoursOutOfFreezer(air)).toBe(hours)
})

test.each([
  [38, false, true],
  [40, false, true],
  [43, false, false],
  [43, true, true],
  [null, true, true],
  [null, false, false],
])(
  'at %s °F, ice crystals %s: the criteria for freezing again are met: %s (USDA FSIS, Mail Order Food Safety)',
  (fahrenheit, iceCrystals, met) => {
    expect(meetsRefreezeCriteria({ fahrenheit, iceCrystals })).toBe(met)
  },
)

test('several items say each thing once, raw cautions included', () => {
  expect(unionStorage(['frozen_ready', 'frozen_raw_dough', 'frozen_to_cook'])).toEqual([
    'storage.keepFrozen',
    'storage.rawDough',
    'storage.cook',
    'storage.thaw',
    'storage.twoHours',
    'storage.refreeze',
  ])
})
