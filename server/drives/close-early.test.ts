import { expect, test } from 'vitest'
import { activity } from '../db/schema/activity.ts'
import { anOrder } from '../testing/builders.ts'
import { signedIn } from '../testing/sign-in.ts'
import { startApp } from '../testing/start-app.ts'
import { until } from '../testing/until.ts'

test('a lead closes early: customers see it at once, what was placed before can still be paid, the log keeps why', async () => {
  const app = await startApp()
  const store = app.make.store()
  const lead = app.make.user({ name: 'Ms. Abara' })
  app.make.member(store.drive, lead.id, 'lead')
  const { api } = await signedIn(app, lead)
  const placed = await app.api.post(`/api/stores/${store.token}/orders`, anOrder(), {
    'Idempotency-Key': 'before-the-close',
  })

  const closed = await api.post(`/api/drives/${store.drive.publicId}/close`, { reason: 'Freezer is full' })

  expect(closed).toMatchObject({ status: 200, body: { awaitingPayment: 1 } })
  expect((await app.api.get(`/api/stores/${store.token}`)).body.drive.status).toBe('closed')
  const late = await app.api.post(`/api/stores/${store.token}/orders`, anOrder(), {
    'Idempotency-Key': 'after-the-close',
  })
  expect(late).toMatchObject({ status: 409, body: { code: 'store_closed' } })
  await app.fakes.pay(/cs_[A-Za-z0-9_]+/.exec(placed.body.payUrl)![0])
  const receipt = placed.body.receiptUrl.split('/').at(-1)
  await until(async () => (await app.api.get(`/api/receipts/${receipt}`)).body.status === 'paid')
  const log = app.deps.db.orm.select().from(activity).all()
  expect(log.find(row => row.action === 'closed_early')).toMatchObject({
    actor: lead.id,
    reason: 'Freezer is full',
  })
})

test('closing twice, or with no reason, changes nothing', async () => {
  const app = await startApp({ fakes: false })
  const store = app.make.store()
  const lead = app.make.user()
  app.make.member(store.drive, lead.id, 'lead')
  const { api } = await signedIn(app, lead)
  const close = (reason: string) => api.post(`/api/drives/${store.drive.publicId}/close`, { reason })

  expect(await close('')).toMatchObject({ status: 400, body: { errors: [{ path: 'reason' }] } })
  expect((await close('Enough')).status).toBe(200)
  expect((await close('Again')).status).toBe(409)
})
