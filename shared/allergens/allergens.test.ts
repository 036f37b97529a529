import { expect, test } from 'vitest'
import { foodTranslator } from '../messages/food.ts'
import {
  allergens,
  isAllergen,
  isHidden,
  majorOf,
  majors,
  statementProblems,
  treeNuts,
  unionStatement,
} from './allergens.ts'
import { allergenSentence } from './wording.ts'

const t = foodTranslator('en')
const statement = (contains: string[], mayContain: string[] = []) => ({
  contains,
  containsNone: contains.length === 0,
  mayContain,
})

test('there are nine major allergens (21 U.S.C. 321(qq)(1), with sesame since the FASTER Act of 2021)', () => {
  expect([...majors].sort()).toEqual(
    ['crustacean', 'egg', 'fish', 'milk', 'peanut', 'sesame', 'soy', 'tree_nut', 'wheat'].sort(),
  )
  expect(new Set(allergens.map(majorOf))).toEqual(new Set(majors))
})

test('twelve tree nuts, and coconut is not one (FDA, Questions and Answers on Food Allergens, Edition 5, 2025)', () => {
  expect(treeNuts).toHaveLength(12)
  expect(isAllergen('tree_nut:coconut')).toBe(false)
})

test('one wording, in one order', () => {
  expect(allergenSentence(statement(['tree_nut:pecan', 'milk', 'wheat'], ['peanut']), t, 'en')).toBe(
    'Contains: Wheat, Milk, Pecan. May contain: Peanut.',
  )
})

test('an empty statement never says "free from"', () => {
  const text = allergenSentence(statement([]), t, 'en')
  expect(text).not.toMatch(/free/i)
  expect(text).toBe('None of the nine major allergens is listed as an ingredient.')
})

test('species must be named (21 U.S.C. 343(w)(2)): "tree nuts" fails, pecan and walnut pass', () => {
  expect(statementProblems(statement(['tree_nut']))).toEqual(['species_missing'])
  expect(statementProblems(statement(['tree_nut:pecan', 'tree_nut:walnut']))).toEqual([])
})

test('an empty list must be confirmed, not merely left blank', () => {
  expect(statementProblems({ contains: [], containsNone: false, mayContain: [] })).toEqual([
    'unconfirmed_empty',
  ])
  expect(statementProblems(statement(['tree_nut:coconut']))).toEqual(['unknown_allergen'])
  expect(statementProblems({ contains: ['milk'], containsNone: true, mayContain: [] })).toEqual([
    'contradiction',
  ])
})

test('avoiding tree nuts covers every species, and by choice what may be in it', () => {
  const pie = statement(['wheat', 'tree_nut:pecan'], ['peanut'])
  expect(isHidden(pie, ['tree_nut'], { alsoMayContain: false })).toBe(true)
  expect(isHidden(pie, ['peanut'], { alsoMayContain: false })).toBe(false)
  expect(isHidden(pie, ['peanut'], { alsoMayContain: true })).toBe(true)
  expect(isHidden(pie, ['fish'], { alsoMayContain: true })).toBe(false)
})

test('what is not known is hidden from everybody who avoids anything, and from nobody else', () => {
  const unconfirmed = { contains: [], containsNone: false, mayContain: [] }
  const unnamed = statement(['tree_nut'])
  for (const unknown of [unconfirmed, unnamed]) {
    expect(isHidden(unknown, ['milk'], { alsoMayContain: false })).toBe(true)
    expect(isHidden(unknown, [], { alsoMayContain: true })).toBe(false)
  }
  expect(allergenSentence(unconfirmed, t, 'en')).toBe(
    'Allergens are not stated. Please ask before you eat it.',
  )
})

test('the statement of an order is the union over its lines', () => {
  const union = unionStatement([statement(['wheat'], ['milk', 'peanut']), statement(['milk', 'wheat'])])
  expect(union).toEqual({ contains: ['wheat', 'milk'], containsNone: false, mayContain: ['peanut'] })
  expect(unionStatement([statement([]), statement([])])).toMatchObject({ containsNone: true })
  expect(unionStatement([])).toMatchObject({ contains: [], containsNone: false })
})

test('every allergen has a name to be called by', () => {
  for (const allergen of allergens) expect(t(`allergen.${allergen}`)).not.toMatch(/allergen\./)
})
