import { expect, test } from 'vitest'
import { loadConfig } from './config.ts'

const demo = {
  TALLYKIN_MODE: 'demo',
  STRIPE_SECRET_KEY: 'sk_test_12345678',
  STRIPE_WEBHOOK_SECRET: 'whsec_12345678',
  SMTP_URL: 'smtp://localhost:4313',
  AUTH_SECRET: 'x1'.repeat(20),
}
const production = {
  ...demo,
  TALLYKIN_MODE: 'production',
  PUBLIC_URL: 'https://shop.example.org',
  STRIPE_SECRET_KEY: 'sk_live_12345678',
  SMTP_URL: 'smtps://mail.example.org',
}

function problems(env: Record<string, string | undefined>): string {
  try {
    loadConfig(env)
    return ''
  } catch (error) {
    return (error as Error).message
  }
}

test('the demonstration’s environment is enough, and the rest has its defaults', () => {
  expect(loadConfig(demo)).toMatchObject({
    port: 4310,
    publicUrl: 'http://localhost:4310',
    dataDir: './data',
    startsAt: null,
  })
})

test('every problem is listed at once, each line naming its variable', () => {
  const text = problems({ TALLYKIN_MODE: 'demo', PORT: '99999', STRIPE_SECRET_KEY: 'x' })
  for (const name of ['PORT', 'STRIPE_SECRET_KEY', 'STRIPE_WEBHOOK_SECRET', 'SMTP_URL', 'AUTH_SECRET'])
    expect(text).toMatch(new RegExp(`^${name} `, 'm'))
})

test.each([
  ['a clock of its own', { TALLYKIN_NOW: '2026-11-20T00:00:00Z' }, 'TALLYKIN_NOW'],
  ['a payment stand-in', { STRIPE_API_BASE: 'http://localhost:4311' }, 'STRIPE_API_BASE'],
  ['plain http', { PUBLIC_URL: 'http://shop.example.org' }, 'PUBLIC_URL'],
  ['a test key', { STRIPE_SECRET_KEY: 'sk_test_12345678' }, 'STRIPE_SECRET_KEY'],
  ['a short secret', { AUTH_SECRET: 'short' }, 'AUTH_SECRET'],
  ['an armed fault', { FAULT: 'F10:1:kill' }, 'FAULT'],
  ['no webhook secret', { STRIPE_WEBHOOK_SECRET: '' }, 'STRIPE_WEBHOOK_SECRET'],
])('production does not start with %s', (_what, changes, name) => {
  expect(problems({ ...production, ...changes })).toContain(name)
})

test('production starts with real services', () => {
  expect(problems(production)).toBe('')
})
