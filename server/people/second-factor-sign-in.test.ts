import { eq } from 'drizzle-orm'
import { beforeEach, expect, onTestFinished, test, vi } from 'vitest'
import { session } from '../db/schema/identity.ts'
import { codeFor, cookiesOf, enterPassword, TEST_PASSWORD } from '../testing/sign-in.ts'
import { startApp, type TestApp } from '../testing/start-app.ts'

const VERIFY = '/api/auth/two-factor/verify-totp'
const RECOVER = '/api/auth/two-factor/verify-backup-code'

/** Codes and locks go by the machine's clock, which stands still here until a test moves it. */
beforeEach(() => {
  vi.useFakeTimers({ toFake: ['Date'], now: Date.UTC(2026, 10, 16, 15, 0, 10) })
  onTestFinished(() => void vi.useRealTimers())
})
const forward = (ms: number) => vi.setSystemTime(Date.now() + ms)

/** A lead with password and second factor, and a way to begin to sign in as them. */
async function aLead(app: TestApp) {
  const drive = app.make.drive()
  const lead = app.make.user({ name: 'Ms. Abara' })
  app.make.member(drive, lead.id, 'lead')
  await app.make.password(lead.id, TEST_PASSWORD)
  const { recoveryCodes } = await app.make.secondFactor(lead.id)
  const begin = async () => app.api.withCookie(cookiesOf(await enterPassword(app, lead.email)))
  const sessions = () =>
    app.deps.db.orm.select().from(session).where(eq(session.userId, lead.id)).all().length
  return { drive, lead, recoveryCodes, begin, sessions }
}

test('the password alone gives no session; with the code the desk opens', async () => {
  const app = await startApp({ fakes: false })
  const { drive, lead, begin, sessions } = await aLead(app)

  const half = await begin()
  expect((await half.get('/api/me')).status).toBe(401)
  expect(sessions()).toBe(0)
  const done = await half.post(VERIFY, { code: await codeFor(app, lead.id) })

  expect(done.status).toBe(200)
  const api = app.api.withCookie(cookiesOf(done))
  expect((await api.get('/api/me')).body).toMatchObject({ name: 'Ms. Abara', secondFactor: 'on' })
  expect((await api.get(`/api/drives/${drive.publicId}`)).status).toBe(200)
})

test.each([
  [-2, 401],
  [-1, 200],
  [0, 200],
  [1, 200],
  [2, 401],
])('a code %i steps from now is answered %i', async (steps, status) => {
  const app = await startApp({ fakes: false })
  const { lead, begin } = await aLead(app)

  const answer = await (await begin()).post(VERIFY, { code: await codeFor(app, lead.id, steps) })

  expect(answer.status).toBe(status)
})

test('a code signs in once, also in another browser; the next one does again', async () => {
  const app = await startApp({ fakes: false })
  const { lead, begin, sessions } = await aLead(app)
  const code = await codeFor(app, lead.id)
  const [first, second] = [await begin(), await begin()]

  expect((await first.post(VERIFY, { code })).status).toBe(200)
  expect(await second.post(VERIFY, { code })).toMatchObject({ status: 401, body: { code: 'INVALID_CODE' } })
  // An older code has not been used, yet somebody may have watched it: later ones only.
  const older = await codeFor(app, lead.id, -1)
  expect((await second.post(VERIFY, { code: older })).status).toBe(401)
  expect(sessions()).toBe(1)
  forward(30_000)
  expect((await second.post(VERIFY, { code: await codeFor(app, lead.id) })).status).toBe(200)
})

test('the same code sent ten times at once opens one session', async () => {
  const app = await startApp({ fakes: false })
  const { lead, begin, sessions } = await aLead(app)
  const code = await codeFor(app, lead.id)
  const browsers = await Promise.all([begin(), begin(), begin(), begin(), begin()])

  const answers = await Promise.all(
    [...browsers, ...browsers].map(async browser => (await browser.post(VERIFY, { code })).status),
  )

  expect(answers.filter(status => status === 200)).toHaveLength(1)
  expect(sessions()).toBe(1)
})

test('spaces in a code are overlooked, and nothing lets a device off the factor', async () => {
  const app = await startApp({ fakes: false })
  const { lead, begin } = await aLead(app)
  const code = (await codeFor(app, lead.id)).replace(/^(...)/, '$1 ')

  const done = await (await begin()).post(VERIFY, { code, trustDevice: true })

  expect(done.status).toBe(200)
  expect(done.headers.getSetCookie().join()).not.toContain('trust_device')
  const again = await app.api.withCookie(cookiesOf(done)).post('/api/auth/sign-in/email', {
    email: lead.email,
    password: TEST_PASSWORD,
  })
  expect(again.body).toMatchObject({ twoFactorRedirect: true })
})

test('five wrong codes lock the account for fifteen minutes, the right code and other browsers included', async () => {
  const app = await startApp({ fakes: false })
  const { lead, begin, sessions } = await aLead(app)
  const half = await begin()
  const guess = async (browser: typeof half) => (await browser.post(VERIFY, { code: '000000' })).body.code

  const answers = [await guess(half), await guess(half), await guess(half), await guess(half)]
  answers.push(await guess(await begin()), await guess(half))

  expect(answers.slice(0, 5)).toEqual(Array(5).fill('INVALID_CODE'))
  expect(answers[5]).toBe('ACCOUNT_TEMPORARILY_LOCKED')
  const right = await (await begin()).post(VERIFY, { code: await codeFor(app, lead.id) })
  expect(right).toMatchObject({ status: 429, body: { code: 'ACCOUNT_TEMPORARILY_LOCKED' } })
  expect(sessions()).toBe(0)
  forward(15 * 60_000 + 1)
  expect((await (await begin()).post(VERIFY, { code: await codeFor(app, lead.id) })).status).toBe(200)
})

test('many guesses at once are all counted', async () => {
  const app = await startApp({ fakes: false })
  const { lead, begin, sessions } = await aLead(app)
  const browsers = await Promise.all(Array.from({ length: 8 }, begin))

  await Promise.all(browsers.map(browser => browser.post(VERIFY, { code: '111111' })))

  const right = await (await begin()).post(VERIFY, { code: await codeFor(app, lead.id) })
  expect(right.body.code).toBe('ACCOUNT_TEMPORARILY_LOCKED')
  expect(sessions()).toBe(0)
})

test('guessing codes counts and locks also where somebody else is signed in', async () => {
  const app = await startApp({ fakes: false })
  const { lead } = await aLead(app)
  const helper = app.make.user()
  await app.make.password(helper.id, TEST_PASSWORD)
  const own = cookiesOf(await enterPassword(app, helper.email))
  const half = cookiesOf(await enterPassword(app, lead.email))
  const both = app.api.withCookie(`${own}; ${half}`)

  for (let n = 0; n < 5; n++) expect((await both.post(VERIFY, { code: '000000' })).status).toBe(401)

  expect((await both.post(VERIFY, { code: '000000' })).body.code).toBe('ACCOUNT_TEMPORARILY_LOCKED')
})

test('a recovery code signs in once, typed in small letters and without its dash; the others stay good', async () => {
  const app = await startApp({ fakes: false })
  const { begin, recoveryCodes } = await aLead(app)
  const typed = recoveryCodes[0]!.toLowerCase().replace('-', ' ')

  const first = await (await begin()).post(RECOVER, { code: typed })
  const again = await (await begin()).post(RECOVER, { code: recoveryCodes[0] })
  const other = await (await begin()).post(RECOVER, { code: recoveryCodes[1] })

  expect([first.status, again.status, other.status]).toEqual([200, 401, 200])
  const api = app.api.withCookie(cookiesOf(other))
  expect((await api.get('/api/account/second-factor')).body).toEqual({ isOn: true, recoveryCodesLeft: 8 })
})

test('one recovery code sent from five browsers at once opens one session', async () => {
  const app = await startApp({ fakes: false })
  const { begin, recoveryCodes, sessions } = await aLead(app)
  const browsers = await Promise.all([begin(), begin(), begin(), begin(), begin()])

  await Promise.all(browsers.map(browser => browser.post(RECOVER, { code: recoveryCodes[0] })))

  expect(sessions()).toBe(1)
})

test('wrong recovery codes lock as wrong codes do', async () => {
  const app = await startApp({ fakes: false })
  const { begin, recoveryCodes } = await aLead(app)
  const half = await begin()
  for (let n = 0; n < 5; n++)
    expect((await half.post(RECOVER, { code: 'AAAAA-AAAAA' })).body.code).toBe('INVALID_BACKUP_CODE')

  expect((await (await begin()).post(RECOVER, { code: recoveryCodes[0] })).status).toBe(429)
})

test('ten minutes after the password, the code comes too late', async () => {
  const app = await startApp({ fakes: false })
  const { lead, begin } = await aLead(app)
  const half = await begin()
  forward(10 * 60_000 + 1)

  const late = await half.post(VERIFY, { code: await codeFor(app, lead.id) })

  expect(late).toMatchObject({ status: 401, body: { code: 'INVALID_TWO_FACTOR_COOKIE' } })
})

test('a new password ends all sessions and still asks for the code', async () => {
  const app = await startApp()
  const { lead, begin, sessions } = await aLead(app)
  await (await begin()).post(VERIFY, { code: await codeFor(app, lead.id) })
  await app.api.post('/api/auth/request-password-reset', { email: lead.email })
  await app.sendMail()
  const token = /#([\w-]+)/.exec((await app.fakes.mailbox())[0]!.text)![1]!
  await app.api.post('/api/auth/reset-password', { token, newPassword: 'another password now' })

  expect(sessions()).toBe(0)
  const answer = await enterPassword(app, lead.email, 'another password now')
  expect(answer.body).toMatchObject({ twoFactorRedirect: true })
})

test.each(['lead', 'staff', 'factor'])(
  'no link by e-mail for an account with %s, and no hint of it',
  async what => {
    const app = await startApp()
    const person = app.make.user()
    const store = app.make.store()
    app.make.guardian(store.seller, person.id)
    if (what === 'lead') app.make.member(store.drive, person.id, 'lead')
    if (what === 'staff') app.make.staff(person.id, 'clerk')
    if (what === 'factor') await app.make.secondFactor(person.id)
    const guardian = app.make.user()
    app.make.guardian(store.seller, guardian.id)

    const ask = (email: string) => app.api.post('/api/auth/sign-in/magic-link', { email })
    const [refused, sent] = [await ask(person.email), await ask(guardian.email)]

    expect([refused.status, refused.body]).toEqual([sent.status, sent.body])
    await app.sendMail()
    expect((await app.fakes.mailbox()).map(mail => mail.to)).toEqual([guardian.email])
  },
)

test('a link mailed before somebody became a lead opens no desk of theirs', async () => {
  const app = await startApp()
  const store = app.make.store()
  const person = app.make.user()
  app.make.guardian(store.seller, person.id)
  await app.api.post('/api/auth/sign-in/magic-link', { email: person.email })
  await app.sendMail()
  const token = /#([\w-]+)/.exec((await app.fakes.mailbox())[0]!.text)![1]!
  app.make.member(store.drive, person.id, 'lead')
  await app.make.secondFactor(person.id)

  const used = await app.api.post('/api/sign-in/link', { token })

  expect(used).toMatchObject({ status: 400 })
  expect(used.headers.getSetCookie().join()).not.toContain('session_token')
})

test.each([
  ['POST', '/api/auth/two-factor/disable'],
  ['POST', '/api/auth/two-factor/enable'],
  ['POST', '/api/auth/two-factor/get-totp-uri'],
  ['POST', '/api/auth/two-factor/generate-backup-codes'],
  ['POST', '/api/auth/two-factor/send-otp'],
  ['POST', '/api/auth/change-email'],
  ['POST', '/api/auth/update-user'],
  ['GET', '/api/auth/list-sessions'],
  ['GET', '/api/auth/magic-link/verify?token=abc'],
  ['POST', '/api/auth/sign-up/email'],
])('%s %s is no door of this house', async (method, path) => {
  const app = await startApp({ fakes: false })
  const { lead, begin } = await aLead(app)
  const done = await (await begin()).post(VERIFY, { code: await codeFor(app, lead.id) })
  const api = app.api.withCookie(cookiesOf(done))

  const answer = await api.request(method, path, method === 'POST' ? { password: TEST_PASSWORD } : undefined)

  expect(answer.status).toBe(404)
})
