import { expect, test } from 'vitest'
import { inTransaction } from '../db/transaction.ts'
import { cookiesOf, enterPassword, TEST_PASSWORD } from '../testing/sign-in.ts'
import { startApp } from '../testing/start-app.ts'
import { organizers, otherLeads, staff } from './people.ts'
import { demoCodeFor, demoCodes, sealDemoFactors, seedSecondFactors } from './seed-second-factor.ts'

test('an invented lead signs in with the code that the mail catcher shows', async () => {
  const app = await startApp({ fakes: false })
  const people = [...staff, ...organizers, ...Object.values(otherLeads)]
  const users = new Map(people.map(({ email }) => [email as string, app.make.user({ email }).id]))
  const sealed = await sealDemoFactors(app.deps.identity.secondFactor)
  inTransaction(app.deps.db, tx => seedSecondFactors(tx, { users, sealed, at: app.clock.now() }))
  const lead = organizers[0]
  await app.make.password(users.get(lead.email)!, TEST_PASSWORD)

  const half = app.api.withCookie(cookiesOf(await enterPassword(app, lead.email)))
  const shown = demoCodes().rows.find(row => row.label.startsWith(lead.name))!
  const done = await half.post('/api/auth/two-factor/verify-totp', { code: shown.value })

  expect(done.status).toBe(200)
})

test('codes are shown for staff, leads and treasurers, each their own; helpers have none', () => {
  const at = Date.UTC(2026, 10, 16, 15)
  const shown = demoCodes(at).rows.filter(row => /^\d{6}$/.test(row.value))

  expect(shown).toHaveLength(8)
  expect(new Set(shown.map(row => row.value)).size).toBe(8)
  expect(demoCodeFor('d.ruiz@saltmarsh.example.org', at)).toBeNull()
  expect(demoCodeFor(organizers[0].email, at)).not.toBe(demoCodeFor(organizers[0].email, at + 30_000))
})
