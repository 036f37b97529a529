import { and, eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { driveMember, staffMember } from '../db/schema/people.ts'
import { signedIn } from '../testing/sign-in.ts'
import { startApp } from '../testing/start-app.ts'

test.each(['lead', 'treasurer'] as const)('a %s without a second factor opens no desk', async role => {
  const app = await startApp({ fakes: false })
  const drive = app.make.drive()
  const person = app.make.user()
  app.make.member(drive, person.id, role)
  const { api } = await signedIn(app, person, { secondFactor: false })

  const answer = await api.get(`/api/drives/${drive.publicId}`)

  expect(answer).toMatchObject({ status: 403, body: { code: 'second_factor_needed' } })
})

test('neither a helper nor a guardian needs one', async () => {
  const app = await startApp({ fakes: false })
  const store = app.make.store()
  const helper = app.make.user()
  app.make.member(store.drive, helper.id, 'helper')
  const guardian = app.make.user()
  app.make.guardian(store.seller, guardian.id)

  const [ofHelper, ofGuardian] = [await signedIn(app, helper), await signedIn(app, guardian)]

  expect((await ofHelper.api.get(`/api/drives/${store.drive.publicId}`)).status).toBe(200)
  expect((await ofHelper.api.get('/api/me')).body.secondFactor).toBe('off')
  expect((await ofGuardian.api.get(`/api/sellers/${store.seller.publicId}`)).status).toBe(200)
})

test.each(['rep', 'admin'] as const)(
  'staff (%s) need one on a drive too; a stranger learns nothing',
  async role => {
    const app = await startApp({ fakes: false })
    const person = app.make.user()
    app.make.staff(person.id, role)
    const drive = app.make.drive({ repUserId: person.id })
    const stranger = app.make.user()
    const asStaff = await signedIn(app, person, { secondFactor: false })
    const asStranger = await signedIn(app, stranger)
    const path = `/api/drives/${drive.publicId}`

    expect((await asStaff.api.get(path)).body.code).toBe('second_factor_needed')
    expect((await asStranger.api.get(path)).body.code).toBe('not_found')
    const through = await signedIn(app, person)
    expect((await through.api.get(path)).status).toBe(200)
  },
)

test('a lead made a helper, or taken off the team, is so at the very next request of an open session', async () => {
  const app = await startApp({ fakes: false })
  const drive = app.make.drive()
  const person = app.make.user()
  app.make.member(drive, person.id, 'lead')
  const { api } = await signedIn(app, person)
  const path = `/api/drives/${drive.publicId}`
  expect((await api.get(path)).body.role).toBe('lead')
  const mine = and(eq(driveMember.driveId, drive.id), eq(driveMember.userId, person.id))

  app.deps.db.orm.update(driveMember).set({ role: 'helper' }).where(mine).run()
  expect((await api.get(path)).body.role).toBe('helper')
  expect((await api.post(`${path}/close`, { reason: 'Enough sold' })).status).toBe(403)

  app.deps.db.orm.delete(driveMember).where(mine).run()
  expect((await api.get(path)).status).toBe(404)
  expect((await api.get('/api/me')).body.drives).toEqual([])
})

test('staff taken off lose every drive at the next request', async () => {
  const app = await startApp({ fakes: false })
  const drive = app.make.drive()
  const person = app.make.user()
  app.make.staff(person.id, 'admin')
  const { api } = await signedIn(app, person)
  expect((await api.get(`/api/drives/${drive.publicId}`)).status).toBe(200)

  app.deps.db.orm.delete(staffMember).where(eq(staffMember.userId, person.id)).run()

  expect((await api.get(`/api/drives/${drive.publicId}`)).status).toBe(404)
})
