import { expect, test } from 'vitest'
import { nextPrize, tallyGroups } from './tally.ts'

test('thirteen is two gates and three strokes', () => {
  expect(tallyGroups(13)).toEqual([5, 5, 3])
  expect(tallyGroups(0)).toEqual([])
  expect(tallyGroups(5)).toEqual([5])
})

test.each([
  [0, 0, 10],
  [9, 0, 1],
  [10, 1, 10],
  [13, 1, 7],
  [20, 2, 10],
])('with %i items %i prizes are earned and %i are missing to the next', (tally, earned, toNext) => {
  expect(nextPrize(tally, 10)).toEqual({ earned, toNext })
})
