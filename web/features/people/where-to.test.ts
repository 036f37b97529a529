import { expect, test } from 'vitest'
import type { Me } from '#shared/people/contract.ts'
import { needsFactorAt, whereTo } from './where-to.ts'

const guardian: Me = {
  name: 'Ana',
  email: 'ana@example.org',
  family: [],
  drives: [],
  staff: [],
  secondFactor: 'off',
}

test.each([
  '//evil.example',
  '/\\evil',
  'https:evil',
  'javascript:alert(1)',
  '\t//evil',
  '/s/abc',
  '/api/me',
])('signing in never leads to %j', next => {
  expect(whereTo(guardian, next)).toBe('/family')
})

test('signing in leads to the desk that was asked for, else to the own one', () => {
  expect(whereTo(guardian, '/family/sellers/abc_-1')).toBe('/family/sellers/abc_-1')
  const lead = {
    ...guardian,
    drives: [{ driveId: 'd1', drive: 'D', organization: 'O', role: 'lead' as const }],
  }
  expect(whereTo(lead, null)).toBe('/organizer/d1')
  expect(whereTo({ ...guardian, staff: ['admin'] }, null)).toBe('/operator')
  expect(whereTo(guardian, '/account/second-factor')).toBe('/account/second-factor')
})

test('desks that move money stay shut until the second factor is set up; the others open', () => {
  const drive = (driveId: string, role: 'lead' | 'helper') => ({
    driveId,
    drive: 'D',
    organization: 'O',
    role,
  })
  const person: Me = {
    ...guardian,
    drives: [drive('d1', 'lead'), drive('d2', 'helper')],
    secondFactor: 'needed',
  }
  const shut = (pathname: string) => needsFactorAt(person, pathname)

  expect(['/organizer/d1', '/organizer/d1/orders', '/organizer/d3', '/operator'].map(shut)).toEqual(
    Array(4).fill(true),
  )
  expect(['/organizer/d2', '/family', '/account/second-factor'].map(shut)).toEqual(Array(3).fill(false))
  expect(needsFactorAt({ ...person, secondFactor: 'on' }, '/organizer/d1')).toBe(false)
})
