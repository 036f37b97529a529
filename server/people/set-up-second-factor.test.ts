import { eq } from 'drizzle-orm'
import { beforeEach, expect, onTestFinished, test, vi } from 'vitest'
import { activity } from '../db/schema/activity.ts'
import { session, twoFactor } from '../db/schema/identity.ts'
import { codeFor, cookiesOf, enterPassword, signedIn, TEST_PASSWORD } from '../testing/sign-in.ts'
import { startApp } from '../testing/start-app.ts'

const SET_UP = '/api/account/second-factor'

beforeEach(() => {
  vi.useFakeTimers({ toFake: ['Date'], now: Date.UTC(2026, 10, 16, 15, 0, 10) })
  onTestFinished(() => void vi.useRealTimers())
})

/** A treasurer who has never set up a second factor, signed in by password. */
async function aNewTreasurer() {
  const app = await startApp({ fakes: false })
  const drive = app.make.drive()
  const person = app.make.user({ name: 'Paul Whitlock', email: 'p.whitlock@saltmarsh.example.org' })
  app.make.member(drive, person.id, 'treasurer')
  const { api, cookie } = await signedIn(app, person, { secondFactor: false })
  return { app, drive, person, api, cookie, path: `/api/drives/${drive.publicId}` }
}

test('a treasurer without one is led to set it up, and then the desk opens', async () => {
  const { app, person, api, path } = await aNewTreasurer()
  expect(await api.get(path)).toMatchObject({ status: 403, body: { code: 'second_factor_needed' } })
  expect((await api.get('/api/me')).body.secondFactor).toBe('needed')

  const begun = await api.post(SET_UP, { password: TEST_PASSWORD })
  const proven = await api.post(`${SET_UP}/prove`, { code: await codeFor(app, person.id) })

  expect(begun.body.qrSvg).toMatch(/^<svg[^>]+viewBox/)
  expect(begun.body.qrSvg).not.toContain('style=')
  expect(begun.body.secret).toMatch(/^([A-Z2-7]{4} ){12}[A-Z2-7]{4}$/)
  expect(proven.status).toBe(200)
  expect(new Set(proven.body.recoveryCodes).size).toBe(10)
  expect(proven.body.recoveryCodes[0]).toMatch(/^[A-HJ-NP-TV-Z2-9]{5}-[A-HJ-NP-TV-Z2-9]{5}$/)
  const through = app.api.withCookie(cookiesOf(proven))
  expect((await through.get(path)).status).toBe(200)
  expect((await through.get('/api/me')).body.secondFactor).toBe('on')
  expect((await through.get(SET_UP)).body).toEqual({ isOn: true, recoveryCodesLeft: 10 })
  const log = app.deps.db.orm.select().from(activity).all()
  expect(log).toMatchObject([
    { actor: person.id, action: 'second_factor_set_up', subject: `user:${person.id}` },
  ])
})

test('what is kept tells neither secret nor recovery codes', async () => {
  const { app, person, api } = await aNewTreasurer()
  await api.post(SET_UP, { password: TEST_PASSWORD })
  const proven = await api.post(`${SET_UP}/prove`, { code: await codeFor(app, person.id) })

  const row = app.deps.db.orm.select().from(twoFactor).where(eq(twoFactor.userId, person.id)).get()!

  const secret = await app.deps.identity.secondFactor.open(row.secret)
  expect(JSON.stringify(row)).not.toContain(secret)
  for (const code of proven.body.recoveryCodes) expect(row.backupCodes).not.toContain(code)
  expect(app.logged.join()).not.toContain(secret)
})

test('sessions from before the set-up, which never passed it, end with it', async () => {
  const { app, person, api, cookie, path } = await aNewTreasurer()
  const elsewhere = app.api.withCookie(cookiesOf(await enterPassword(app, person.email)))
  await api.post(SET_UP, { password: TEST_PASSWORD })
  const proven = await api.post(`${SET_UP}/prove`, { code: await codeFor(app, person.id) })

  expect((await elsewhere.get(path)).status).toBe(401)
  expect((await app.api.withCookie(cookie).get(path)).status).toBe(401)
  expect((await app.api.withCookie(cookiesOf(proven)).get(path)).status).toBe(200)
  expect(app.deps.db.orm.select().from(session).all()).toHaveLength(1)
})

test('the code that proved the set-up signs in nobody afterwards', async () => {
  const { app, person, api } = await aNewTreasurer()
  await api.post(SET_UP, { password: TEST_PASSWORD })
  const code = await codeFor(app, person.id)
  await api.post(`${SET_UP}/prove`, { code })

  const half = app.api.withCookie(cookiesOf(await enterPassword(app, person.email)))

  expect((await half.post('/api/auth/two-factor/verify-totp', { code })).status).toBe(401)
})

test('a wrong password or code changes nothing and says at which field', async () => {
  const { app, person, api, path } = await aNewTreasurer()

  const password = await api.post(SET_UP, { password: 'not this one at all' })
  await api.post(SET_UP, { password: TEST_PASSWORD })
  const wrong = await api.post(`${SET_UP}/prove`, { code: '000000' })
  const short = await api.post(`${SET_UP}/prove`, { code: '123' })
  const late = await api.post(`${SET_UP}/prove`, { code: await codeFor(app, person.id, 2) })

  expect(password).toMatchObject({ status: 400, body: { errors: [{ path: 'password' }] } })
  for (const answer of [wrong, short, late])
    expect(answer).toMatchObject({ status: 400, body: { errors: [{ path: 'code' }] } })
  expect((await api.get(path)).status).toBe(403)
  expect((await enterPassword(app, person.email)).body.twoFactorRedirect).toBeUndefined()
})

test('an unfinished set-up can be begun anew; a finished one is not replaced by whoever has the session', async () => {
  const { app, person, api } = await aNewTreasurer()
  const first = await api.post(SET_UP, { password: TEST_PASSWORD })
  const second = await api.post(SET_UP, { password: TEST_PASSWORD })
  expect(second.body.secret).not.toBe(first.body.secret)
  const proven = await api.post(`${SET_UP}/prove`, { code: await codeFor(app, person.id) })
  const through = app.api.withCookie(cookiesOf(proven))

  expect((await through.post(SET_UP, { password: TEST_PASSWORD })).status).toBe(409)
  expect((await through.post(`${SET_UP}/prove`, { code: '123456' })).status).toBe(409)
})

test('new recovery codes take the password and end the old ones', async () => {
  const app = await startApp({ fakes: false })
  const person = app.make.user()
  app.make.staff(person.id, 'clerk')
  const { recoveryCodes: old } = await app.make.secondFactor(person.id)
  const { api } = await signedIn(app, person)

  const refused = await api.post(`${SET_UP}/recovery-codes`, { password: 'not this one at all' })
  const renewed = await api.post(`${SET_UP}/recovery-codes`, { password: TEST_PASSWORD })

  expect(refused).toMatchObject({ status: 400, body: { errors: [{ path: 'password' }] } })
  const half = app.api.withCookie(cookiesOf(await enterPassword(app, person.email)))
  const use = async (code: string) =>
    (await half.post('/api/auth/two-factor/verify-backup-code', { code })).status
  expect(await use(old[0]!)).toBe(401)
  expect(await use(renewed.body.recoveryCodes[0])).toBe(200)
})

test('a set-up cannot be begun from another site, nor the password be guessed there for long', async () => {
  const { app, api, cookie } = await aNewTreasurer()

  const foreign = await app.api.withCookie(cookie).post(
    SET_UP,
    { password: TEST_PASSWORD },
    {
      Origin: 'https://elsewhere.example',
      'Sec-Fetch-Site': 'cross-site',
    },
  )
  const guesses = []
  for (let n = 0; n < 12; n++) guesses.push((await api.post(SET_UP, { password: `guess ${n}` })).status)

  expect(foreign).toMatchObject({ status: 403, body: { code: 'cross_site' } })
  expect(guesses.at(-1)).toBe(429)
})

test('a sign-in as somebody else, left half done in the same browser, has no say in a set-up', async () => {
  const { app, person, cookie, path } = await aNewTreasurer()
  const other = app.make.user()
  await app.make.password(other.id, TEST_PASSWORD)
  await app.make.secondFactor(other.id)
  const half = cookiesOf(await enterPassword(app, other.email))
  const both = app.api.withCookie(`${cookie}; ${half}`)

  await both.post(SET_UP, { password: TEST_PASSWORD })
  const proven = await both.post(`${SET_UP}/prove`, { code: await codeFor(app, person.id) })

  expect((await app.api.withCookie(cookiesOf(proven)).get(path)).status).toBe(200)
})
