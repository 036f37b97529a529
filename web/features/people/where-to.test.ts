import { expect, test } from 'vitest'
import { whereTo } from './where-to.ts'

const guardian = { name: 'Ana', email: 'ana@example.org', family: [], drives: [], staff: [] }

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
})
