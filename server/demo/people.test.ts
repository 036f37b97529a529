import { expect, test } from 'vitest'
import { relationshipNames } from '#shared/orders/relationships.ts'
import { isEmailAddress } from '#shared/text.ts'
import {
  crews,
  customers,
  guardians,
  juniperClasses,
  juniperSellers,
  organizers,
  otherLeads,
  saltmarshSellers,
  staff,
  windwardSellers,
  windwardSquads,
} from './people.ts'

test('the rosters are 48 in four crews of twelve, 120 in five classes, 30 in three squads', () => {
  const sizes = (sellers: typeof saltmarshSellers, groups: readonly string[]) =>
    groups.map(group => sellers.filter(seller => seller.group === group).length)
  expect(crews).toEqual(['Chassis', 'Lift', 'Code', 'Outreach'])
  expect(sizes(saltmarshSellers, crews)).toEqual([12, 12, 12, 12])
  expect(sizes(juniperSellers, juniperClasses)).toEqual([24, 24, 24, 24, 24])
  expect(sizes(windwardSellers, windwardSquads)).toEqual([10, 10, 10])
})

test.each([
  ['Saltmarsh', saltmarshSellers],
  ['Juniper Flats', juniperSellers],
  ['Windward Point', windwardSellers],
])('in %s nobody shares a number or a full name, and numbers run from 101', (_, sellers) => {
  expect(sellers.map(({ number }) => number)).toEqual(sellers.map((_seller, place) => 101 + place))
  expect(new Set(sellers.map(({ firstName, lastName }) => `${firstName} ${lastName}`)).size).toBe(
    sellers.length,
  )
  for (const { firstName, lastName } of sellers) {
    expect(firstName).toMatch(/^\p{Lu}/u)
    expect(lastName).toMatch(/^\p{Lu}/u)
  }
})

test('two sellers of one drive are Maya L. in public, in different crews', () => {
  const mayas = saltmarshSellers.filter(
    ({ firstName, lastName }) => firstName === 'Maya' && lastName[0] === 'L',
  )
  expect(mayas.map(({ number, lastName, group }) => [number, lastName, group])).toEqual([
    [101, 'Lindqvist', 'Chassis'],
    [137, 'Lorimer', 'Outreach'],
  ])
})

test('one guardian has two sellers and another one, all on the roster', () => {
  expect(guardians.map(({ sellers }) => sellers.length)).toEqual([2, 1])
  for (const [first, last] of guardians.flatMap(({ sellers }) => sellers))
    expect(
      saltmarshSellers.filter(({ firstName, lastName }) => firstName === first && lastName === last),
    ).toHaveLength(1)
})

test('more than sixty customers, each with a way to know the seller', () => {
  expect(customers.length).toBeGreaterThanOrEqual(60)
  expect(new Set(customers.map(({ name }) => name)).size).toBe(customers.length)
  for (const { relationship } of customers) expect(relationshipNames).toContain(relationship)
})

test('every address can be written to and is on a domain reserved for examples, and none is shared', () => {
  // RFC 2606, section 3: example.com, example.net and example.org, and what is below them, belong to nobody.
  const people = [...staff, ...organizers, ...Object.values(otherLeads), ...guardians]
  for (const { email } of [...people, ...customers]) {
    expect(isEmailAddress(email), email).toBe(true)
    expect(email).toMatch(/[@.]example\.(com|net|org)$/)
  }
  expect(new Set(people.map(({ email }) => email)).size).toBe(people.length)
  expect(new Set(customers.map(({ email }) => email)).size).toBe(customers.length)
  expect(new Set([...staff, ...organizers].map(({ role }) => role)).size).toBe(7)
})

test('telephones are numbers kept for fiction', () => {
  for (const { phone } of guardians) expect(phone).toMatch(/^\(\d{3}\) 555-01\d{2}$/)
})
