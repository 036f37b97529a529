import { and, eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { activity } from '../db/schema/activity.ts'
import { outbox } from '../db/schema/mail.ts'
import { order, orderFlag, sellerTally } from '../db/schema/orders.ts'
import { anOrder } from '../testing/builders.ts'
import { signedIn } from '../testing/sign-in.ts'
import { startApp } from '../testing/start-app.ts'
import { until } from '../testing/until.ts'

async function aFamily() {
  const app = await startApp()
  const store = app.make.store({ seller: { nameShown: false } })
  const mother = app.make.user({ name: 'Karin Lindqvist' })
  app.make.guardian(store.seller, mother.id)
  const { api } = await signedIn(app, mother)
  const base = `/api/sellers/${store.seller.publicId}`
  const link = async () => (await api.get(base)).body.link as { url: string; state: string }
  const place = async (token: string, key: string) =>
    app.api.post(`/api/stores/${token}/orders`, anOrder(), { 'Idempotency-Key': key })
  const pay = async (payUrl: string) => {
    await app.fakes.pay(/cs_[A-Za-z0-9_]+/.exec(payUrl)![0])
  }
  return { app, store, mother, api, base, link, place, pay }
}

test('a paused link shows itself and takes no order; resumed, it does again', async () => {
  const { app, store, api, base, place } = await aFamily()

  expect((await api.post(`${base}/link/pause`)).status).toBe(200)
  expect((await app.api.get(`/api/stores/${store.token}`)).body.drive.status).toBe('paused')
  expect((await place(store.token, 'while-paused')).body.code).toBe('store_paused')
  expect((await api.post(`${base}/link/pause`)).status).toBe(409)
  expect((await api.post(`${base}/link/resume`)).status).toBe(200)
  expect((await place(store.token, 'when-resumed')).status).toBe(201)
})

test('a leaked link is replaced while an order is being paid: dead at once, and the order still credited', async () => {
  const { app, store, api, base, link, place, pay } = await aFamily()
  const placed = await place(store.token, 'before-the-replacement')

  expect((await api.post(`${base}/link/replace`)).status).toBe(200)

  expect((await app.api.get(`/api/stores/${store.token}`)).status).toBe(404)
  expect((await place(store.token, 'by-the-old-link')).status).toBe(404)
  await pay(placed.body.payUrl)
  await until(() => app.deps.db.orm.select().from(order).get()?.status === 'paid')
  expect(
    app.deps.db.orm.select().from(sellerTally).where(eq(sellerTally.sellerId, store.seller.id)).get()
      ?.quantity,
  ).toBe(2)
  const fresh = await link()
  expect(fresh.url).not.toContain(store.token)
  expect((await place(fresh.url.split('/').at(-1)!, 'by-the-new-link')).status).toBe(201)
  // The receipt leads to no dead store.
  const receipt = placed.body.receiptUrl.split('/').at(-1)
  expect((await app.api.get(`/api/receipts/${receipt}`)).body.storeUrl).toBeNull()
})

test('ten replacements at once leave exactly one link alive', async () => {
  const { app, api, base, store } = await aFamily()
  await Promise.all(Array.from({ length: 10 }, () => api.post(`${base}/link/replace`)))
  const alive = app.deps.db.raw
    .prepare("select count(*) as n from store_link where seller_id = ? and state <> 'replaced'")
    .get(store.seller.id)
  expect(alive).toEqual({ n: 1 })
})

test('until a guardian agrees the store names only the group; the answer counts at once', async () => {
  const { app, store, api, base } = await aFamily()
  const seen = async () => (await app.api.get(`/api/stores/${store.token}`)).body.seller

  expect(await seen()).toBeNull()
  await api.post(`${base}/consent`, { show: true })
  expect(await seen()).toEqual({ displayName: 'Maya L.' })
  await api.post(`${base}/consent`, { show: false })
  expect(await seen()).toBeNull()
})

test('an order from somebody unknown is flagged once, the lead is told and settles it', async () => {
  const { app, store, api, base, place, pay } = await aFamily()
  const lead = app.make.user({ name: 'Ms. Abara' })
  app.make.member(store.drive, lead.id, 'lead')
  const desk = await signedIn(app, lead)
  const placed = await place(store.token, 'from-a-stranger')
  await pay(placed.body.payUrl)
  await until(() => app.deps.db.orm.select().from(order).get()?.status === 'paid')
  const id = app.deps.db.orm.select().from(order).get()!.publicId
  const flag = () => api.post(`${base}/orders/${id}/flag`, { note: 'Nobody we know' })

  await Promise.all([flag(), flag(), flag()])

  expect(app.deps.db.orm.select().from(orderFlag).all()).toHaveLength(1)
  expect((await api.get(base)).body.orders[0].flagged).toBe(true)
  const told = app.deps.db.orm
    .select()
    .from(outbox)
    .where(and(eq(outbox.kind, 'staff_notice'), eq(outbox.recipient, lead.email)))
    .all()
  expect(told).toHaveLength(1)
  await app.sendMail()
  const letter = (await app.fakes.mailbox()).find(mail => mail.to === lead.email)!
  expect(letter.text).toContain('does not know who placed order')
  const page = `/api/drives/${store.drive.publicId}/orders/${id}`
  expect((await desk.api.get(page)).body.flags).toMatchObject([{ note: 'Nobody we know', resolution: null }])
  expect((await desk.api.get(`/api/drives/${store.drive.publicId}`)).body.needs.flags).toBe(1)
  expect((await desk.api.post(`${page}/flags/settle`, { reason: 'It is the new neighbor' })).status).toBe(200)
  expect((await desk.api.post(`${page}/flags/settle`, { reason: 'Once more' })).status).toBe(409)
  expect((await api.get(base)).body.orders[0].flagged).toBe(false)
  expect(
    app.deps.db.orm
      .select()
      .from(activity)
      .all()
      .map(row => row.action),
  ).toContain('flag_resolved')
})

test('refunding a flagged order settles its flag', async () => {
  const { app, store, api, base, place, pay } = await aFamily()
  const lead = app.make.user()
  app.make.member(store.drive, lead.id, 'lead')
  const desk = await signedIn(app, lead)
  const placed = await place(store.token, 'flag-and-refund')
  await pay(placed.body.payUrl)
  await until(() => app.deps.db.orm.select().from(order).get()?.status === 'paid')
  const id = app.deps.db.orm.select().from(order).get()!.publicId
  await api.post(`${base}/orders/${id}/flag`, { note: '' })

  await desk.api.post(`/api/drives/${store.drive.publicId}/orders/${id}/refunds`, {
    what: 'everything',
    reason: 'A stranger',
  })

  expect(app.deps.db.orm.select().from(orderFlag).all()).toMatchObject([{ resolution: 'refunded' }])
})

test('an order that waits, or that credits another seller, cannot be flagged', async () => {
  const { app, store, api, base, place } = await aFamily()
  await place(store.token, 'still-waiting')
  const id = app.deps.db.orm.select().from(order).get()!.publicId
  expect((await api.post(`${base}/orders/${id}/flag`, { note: '' })).status).toBe(404)
  expect((await api.post(`${base}/orders/${'A'.repeat(22)}/flag`, { note: '' })).status).toBe(404)
  expect((await api.post(`${base}/orders/${id}/flag`, { note: 'x\0y' })).status).toBe(400)
})

test('the QR code is a picture of the link as it is now', async () => {
  const { api, base } = await aFamily()
  const reply = await api.get(`${base}/link/qr.svg`)
  expect(reply.headers.get('content-type')).toContain('image/svg+xml')
  expect(reply.body).toContain('<svg')
})
