import { expect, test } from 'vitest'
import { compileCatalog } from './compile-catalog.ts'
import { makeTranslator } from './translate.ts'

const t = makeTranslator(
  'en',
  compileCatalog({ hello: 'Hello {name}, {count, plural, one {# item} other {# items}}' }),
)

test.each(['\\u202e', '\\x41', '\\u000a', 'C:\\users', '{count}', "it's", '<b>'])(
  'a name of %j is said as it was typed',
  name => {
    expect(t('hello', { name, count: 2 })).toBe(`Hello ${name}, 2 items`)
  },
)

test('numbers take their plural', () => {
  expect(t('hello', { name: 'Ana', count: 1 })).toBe('Hello Ana, 1 item')
})
