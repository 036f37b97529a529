import { expect, test } from 'vitest'
import { holds, median, toRow } from './figure.ts'

test('a row holds ours, the bare equivalent, their ratio and whether the goal is met', async () => {
  const row = await toRow({
    name: 'x',
    unit: '1/s',
    goal: '>=0.5',
    measure: async () => ({ ours: 60, bare: 100 }),
  })
  expect(row).toEqual({
    name: 'x',
    unit: '1/s',
    value: 60,
    limit: 100,
    ratio: 0.6,
    goal: '>=0.5',
    pass: true,
  })
})

test('goals are at least or at most', () => {
  expect(holds(0.49, '>=0.5')).toBe(false)
  expect(holds(1.15, '<=1.15')).toBe(true)
  expect(() => holds(1, '0.5')).toThrow()
  expect(median([3, 1, 2])).toBe(2)
})
