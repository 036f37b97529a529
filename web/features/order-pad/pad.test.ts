import { expect, test } from 'vitest'
import { clearPaidPad, emptyPad, readPad, setQuantity, undoRemoval } from './pad.ts'

const kept = (pad: unknown) => JSON.stringify({ version: 1, pad })

test('adding twice changes the quantity, taking off can be undone in its place', () => {
  let pad = setQuantity(emptyPad, '1204', 1)
  pad = setQuantity(pad, '2318', 2)
  pad = setQuantity(pad, '1204', 3)
  expect(pad.lines).toEqual([
    { code: '1204', quantity: 3 },
    { code: '2318', quantity: 2 },
  ])
  pad = setQuantity(pad, '1204', 0)
  expect(pad.lines).toEqual([{ code: '2318', quantity: 2 }])
  expect(undoRemoval(pad).lines).toEqual([
    { code: '1204', quantity: 3 },
    { code: '2318', quantity: 2 },
  ])
})

test('a kept pad survives a reload as it was', () => {
  const pad = { ...setQuantity(emptyPad, '1204', 2), name: 'Ruth', gift: '5.00' }
  expect(readPad(kept(pad))).toEqual({ ...pad, removed: null })
})

test.each([
  ['nothing', null],
  ['half a text', '{"version":1,"pad":{"li'],
  ['another version', JSON.stringify({ version: 99, pad: { lines: [{ code: '1204', quantity: 2 }] } })],
  ['a number', '7'],
])('%s kept is an empty pad', (_what, text) => {
  expect(readPad(text)).toEqual(emptyPad)
})

test('damaged lines are left out, sound ones stay', () => {
  const pad = readPad(
    kept({ lines: [{ code: '1204', quantity: 2 }, { code: 7 }, { code: '2318', quantity: 0 }, null] }),
  )
  expect(pad.lines).toEqual([{ code: '1204', quantity: 2 }])
})

test('only the pad that led to the paid receipt is cleared, and it keeps the name', () => {
  const pad = { ...setQuantity(emptyPad, '1204', 2), name: 'Ruth', email: 'ruth@example.com' }
  const entries = new Map([
    ['tallykin:pad:a', kept({ ...pad, attempt: { key: 'k', content: 'c', receiptId: 'paid', at: 1 } })],
    ['tallykin:pad:b', kept({ ...pad, attempt: { key: 'k', content: 'c', receiptId: 'other', at: 1 } })],
  ])
  const storage = storageOver(entries)
  clearPaidPad(storage, 'paid')
  expect(readPad(storage.getItem('tallykin:pad:a'))).toMatchObject({ lines: [], name: 'Ruth', attempt: null })
  expect(readPad(storage.getItem('tallykin:pad:b')).lines).toHaveLength(1)
})

/** A device's storage: its entries are properties, as in a browser. */
function storageOver(entries: Map<string, string>): Storage {
  return new Proxy({} as Storage, {
    ownKeys: () => [...entries.keys()],
    getOwnPropertyDescriptor: () => ({ enumerable: true, configurable: true }),
    get: (_target, name) =>
      name === 'getItem'
        ? (key: string) => entries.get(key) ?? null
        : (key: string, value: string) => void entries.set(key, value),
  })
}
