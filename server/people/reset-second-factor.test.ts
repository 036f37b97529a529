import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { activity } from '../db/schema/activity.ts'
import { user } from '../db/schema/identity.ts'
import { cookiesOf, enterPassword, signedIn } from '../testing/sign-in.ts'
import { startApp, type TestApp } from '../testing/start-app.ts'

const body = { reason: 'Phone lost, called back at the school' }

/** A drive with two leads, a treasurer and a helper, all but the helper behind a second factor. */
async function aTeam(app: TestApp) {
  const rep = app.make.user({ name: 'Tobias Renn' })
  app.make.staff(rep.id, 'rep')
  const drive = app.make.drive({ repUserId: rep.id })
  const member = (name: string, role: 'lead' | 'treasurer' | 'helper') => {
    const person = app.make.user({ name })
    app.make.member(drive, person.id, role)
    return person
  }
  const lead = member('Ms. Abara', 'lead')
  const other = member('Dev Grady', 'lead')
  const treasurer = member('Paul Whitlock', 'treasurer')
  const helper = member('Dana Ruiz', 'helper')
  for (const person of [rep, lead, other, treasurer]) await app.make.secondFactor(person.id)
  const path = (of: { id: string }) => `/api/drives/${drive.publicId}/members/${of.id}/reset-second-factor`
  return { drive, rep, lead, other, treasurer, helper, path }
}

test('another lead resets a lost factor: sessions end, the owner is told, the log keeps why, the password alone signs in', async () => {
  const app = await startApp()
  const { drive, lead, other, path } = await aTeam(app)
  const lost = await signedIn(app, other)
  const { api } = await signedIn(app, lead)

  const answer = await api.post(path(other), body)

  expect(answer).toMatchObject({ status: 200, body: { reset: true } })
  expect((await lost.api.get('/api/me')).status).toBe(401)
  const log = app.deps.db.orm.select().from(activity).all()
  expect(log).toMatchObject([
    {
      driveId: drive.id,
      actor: lead.id,
      action: 'second_factor_reset',
      subject: `user:${other.id}`,
      before: '{"secondFactor":true}',
      after: '{"secondFactor":false}',
      reason: body.reason,
    },
  ])
  await app.sendMail()
  const [mail] = await app.fakes.mailbox()
  expect(mail!.to).toContain(other.email)
  expect(mail!.text).toContain('Ms. Abara')
  expect(mail!.text).toContain(body.reason)
  const after = app.api.withCookie(cookiesOf(await enterPassword(app, other.email)))
  expect((await after.get('/api/me')).body.secondFactor).toBe('needed')
  expect((await after.get(`/api/drives/${drive.publicId}`)).body.code).toBe('second_factor_needed')
})

test('a sign-in half done when the factor is taken off does not go on', async () => {
  const app = await startApp({ fakes: false })
  const { lead, other, path } = await aTeam(app)
  await signedIn(app, other)
  const half = app.api.withCookie(cookiesOf(await enterPassword(app, other.email)))
  const { api } = await signedIn(app, lead)
  await api.post(path(other), body)

  const answer = await half.post('/api/auth/two-factor/verify-totp', { code: '123456' })

  expect(answer.status).toBe(401)
})

test('the rep of the drive and an admin may; another rep finds nothing', async () => {
  const app = await startApp({ fakes: false })
  const { rep, other, treasurer, path } = await aTeam(app)
  const admin = app.make.user()
  app.make.staff(admin.id, 'admin')
  const stranger = app.make.user()
  app.make.staff(stranger.id, 'rep')

  expect((await (await signedIn(app, stranger)).api.post(path(other), body)).status).toBe(404)
  expect((await (await signedIn(app, rep)).api.post(path(other), body)).status).toBe(200)
  expect((await (await signedIn(app, admin)).api.post(path(treasurer), body)).status).toBe(200)
})

test('nobody resets their own, and neither treasurer nor helper anybody else’s', async () => {
  const app = await startApp({ fakes: false })
  const { lead, other, treasurer, helper, path } = await aTeam(app)

  const own = await (await signedIn(app, lead)).api.post(path(lead), body)
  const byTreasurer = await (await signedIn(app, treasurer)).api.post(path(other), body)
  const byHelper = await (await signedIn(app, helper)).api.post(path(other), body)

  expect([own.status, byTreasurer.status, byHelper.status]).toEqual([403, 403, 403])
  expect(app.deps.db.orm.select().from(activity).all()).toEqual([])
})

test('a lead of another drive finds nothing, and in their own drive nobody who is not of it', async () => {
  const app = await startApp({ fakes: false })
  const { other, path } = await aTeam(app)
  const neighbor = app.make.user()
  const next = app.make.drive({ organizationName: 'Juniper Flats Garden Club' })
  app.make.member(next, neighbor.id, 'lead')
  const { api } = await signedIn(app, neighbor)

  expect((await api.post(path(other), body)).status).toBe(404)
  const through = `/api/drives/${next.publicId}/members/${other.id}/reset-second-factor`
  expect((await api.post(through, body)).status).toBe(404)
  expect((await api.get(path(other).replace(/\/members.*/, '/team'))).status).toBe(404)
})

test('a lead has no say over staff who belong to the drive too; an admin has', async () => {
  const app = await startApp({ fakes: false })
  const { lead, other, path } = await aTeam(app)
  app.make.staff(other.id, 'clerk')
  const admin = app.make.user()
  app.make.staff(admin.id, 'admin')

  expect((await (await signedIn(app, lead)).api.post(path(other), body)).status).toBe(403)
  expect((await (await signedIn(app, admin)).api.post(path(other), body)).status).toBe(200)
})

test('an admin resets staff, never oneself; a rep does not, and whoever is no staff is not found', async () => {
  const app = await startApp({ fakes: false })
  const { rep, lead } = await aTeam(app)
  const admin = app.make.user()
  app.make.staff(admin.id, 'admin')
  const path = (of: { id: string }) => `/api/staff/${of.id}/reset-second-factor`
  const asRep = (await signedIn(app, rep)).api
  const asAdmin = (await signedIn(app, admin)).api

  expect((await asRep.post(path(admin), body)).status).toBe(404)
  expect((await asAdmin.post(path(admin), body)).status).toBe(403)
  expect((await asAdmin.post(path(lead), body)).status).toBe(404)
  expect((await asAdmin.post(path(rep), body)).status).toBe(200)
  const row = app.deps.db.orm.select().from(user).where(eq(user.id, rep.id)).get()
  expect(row?.twoFactorEnabled).toBe(false)
})

test('no reason, or nothing to take off, changes nothing', async () => {
  const app = await startApp({ fakes: false })
  const { lead, other, helper, path } = await aTeam(app)
  const { api } = await signedIn(app, lead)

  expect(await api.post(path(other), { reason: ' ' })).toMatchObject({
    status: 400,
    body: { errors: [{ path: 'reason' }] },
  })
  expect((await api.post(path(helper), body)).status).toBe(409)
  expect(app.deps.db.orm.select().from(activity).all()).toEqual([])
})

test('the team is listed with roles and factors; addresses only for lead, rep and admin', async () => {
  const app = await startApp({ fakes: false })
  const { drive, rep, lead, other, helper } = await aTeam(app)
  const path = `/api/drives/${drive.publicId}/team`

  const seen = async (person: { id: string; email: string }) =>
    (await (await signedIn(app, person)).api.get(path)).body.members as Record<string, unknown>[]

  expect(await seen(lead)).toMatchObject([
    { name: 'Dana Ruiz', role: 'helper', secondFactor: false, email: helper.email, mayReset: false },
    { name: 'Dev Grady', role: 'lead', secondFactor: true, email: other.email, mayReset: true },
    { name: 'Ms. Abara', role: 'lead', secondFactor: true, isMe: true, mayReset: false },
    { name: 'Paul Whitlock', role: 'treasurer', secondFactor: true, mayReset: true },
  ])
  expect((await seen(rep)).filter(row => row.mayReset)).toHaveLength(3)
  for (const row of await seen(helper)) expect(row).toMatchObject({ email: null, mayReset: false })
})
