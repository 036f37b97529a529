import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { activity } from '../db/schema/activity.ts'
import { outbox } from '../db/schema/mail.ts'
import { driveDay, order, sellerTally } from '../db/schema/orders.ts'
import { trialBalance } from '../ledger/queries.ts'
import { anOrder } from '../testing/builders.ts'
import { signedIn } from '../testing/sign-in.ts'
import { startApp, type TestApp } from '../testing/start-app.ts'
import { until } from '../testing/until.ts'

/** A drive with a signed-in lead and a paid order of three lines, 16.00, 2 × 18.00 and 20.00. */
async function aPaidOrder(role: 'lead' | 'treasurer' | 'helper' = 'lead') {
  const app = await startApp()
  const store = app.make.store({
    items: [
      { code: '1204', priceCents: 1600 },
      { code: '2318', priceCents: 1800 },
      { code: '6521', priceCents: 2000 },
    ],
  })
  const member = app.make.user({ name: 'Ms. Abara' })
  app.make.member(store.drive, member.id, role)
  const { api } = await signedIn(app, member)
  const lines = [
    { itemCode: '1204', quantity: 1 },
    { itemCode: '2318', quantity: 2 },
    { itemCode: '6521', quantity: 1 },
  ]
  const placed = await app.api.post(
    `/api/stores/${store.token}/orders`,
    anOrder({ lines, coverFee: true, quotedTotalCents: 7446 }),
    {
      'Idempotency-Key': 'three-lines',
    },
  )
  expect(placed.status).toBe(201)
  await app.fakes.pay(/cs_[A-Za-z0-9_]+/.exec(placed.body.payUrl)![0])
  await until(() => app.deps.db.orm.select().from(order).get()?.status === 'paid')
  const row = app.deps.db.orm.select().from(order).get()!
  const base = `/api/drives/${store.drive.publicId}/orders`
  return { app, store, api, base, page: `${base}/${row.publicId}`, id: row.publicId, number: row.number }
}

const credited = (app: TestApp, sellerId: number) =>
  app.deps.db.orm
    .select()
    .from(sellerTally)
    .where(eq(sellerTally.sellerId, sellerId))
    .all()
    .reduce((sum, row) => ({ items: sum.items + row.quantity, cents: sum.cents + row.amountCents }), {
      items: 0,
      cents: 0,
    })

test('a lead refunds one line of three: card, tally, day, ledger, letter and log follow', async () => {
  const { app, store, api, page, id } = await aPaidOrder()
  const { lines } = (await api.get(page)).body
  const line = lines.find((row: { itemCode: string }) => row.itemCode === '2318')

  const reply = await api.post(`${page}/refunds`, {
    what: [{ lineId: line.lineId, quantity: 2 }],
    reason: 'Out of stock',
  })

  expect(reply).toMatchObject({ status: 201, body: { amountCents: 3600, state: 'succeeded' } })
  expect((await app.fakes.refunds()).map(refund => refund.amount)).toEqual([3600])
  expect(credited(app, store.seller.id)).toEqual({ items: 2, cents: 3600 })
  expect(app.deps.db.orm.select().from(driveDay).all()).toMatchObject([
    { items: 2, itemsCents: 3600, refundedCents: 3600 },
  ])
  const balance = trialBalance(app.deps.db.orm, store.drive.id)
  expect(Object.values(balance).reduce((a, b) => a + b, 0)).toBe(0)
  expect(balance.refunds).toBe(3600)
  expect((await app.api.get(`/api/receipts/${id}`)).body).toMatchObject({
    status: 'partly_refunded',
    refundedCents: 3600,
  })
  expect(app.deps.db.orm.select().from(outbox).where(eq(outbox.kind, 'refund_notice')).all()).toHaveLength(1)
  const { history } = (await api.get(page)).body
  expect(history.map((entry: { action: string }) => entry.action)).toEqual([
    'order_placed',
    'order_paid',
    'refund_requested',
    'refunded',
  ])
  expect(history.at(-1)).toMatchObject({ who: 'Ms. Abara', reason: 'Out of stock' })
})

test('refunding everything gives back the cover too, and nothing is left to refund', async () => {
  const { app, store, api, page } = await aPaidOrder()

  const whole = await api.post(`${page}/refunds`, { what: 'everything', reason: 'Ordered by mistake' })
  const again = await api.post(`${page}/refunds`, { what: 'everything', reason: 'Once more' })

  expect(whole).toMatchObject({ status: 201, body: { amountCents: 7446 } })
  expect(again).toMatchObject({ status: 409 })
  expect(credited(app, store.seller.id)).toEqual({ items: 0, cents: 0 })
  expect((await api.get(page)).body).toMatchObject({ status: 'refunded', refundableCents: null })
})

test('ten refunds of everything at once give back once', async () => {
  const { app, api, page } = await aPaidOrder()

  const replies = await Promise.all(
    Array.from({ length: 10 }, (_, n) =>
      api.post(`${page}/refunds`, { what: 'everything', reason: `Try ${n}` }),
    ),
  )

  expect(replies.filter(reply => reply.status === 201)).toHaveLength(1)
  expect(replies.filter(reply => reply.status === 409)).toHaveLength(9)
  expect((await app.fakes.refunds()).map(refund => refund.amount)).toEqual([7446])
})

test.each([
  ['more than was bought', (lineId: number) => [{ lineId, quantity: 3 }], 409],
  ['none', (lineId: number) => [{ lineId, quantity: 0 }], 400],
  ['half of one', (lineId: number) => [{ lineId, quantity: 0.5 }], 400],
  ['a line of nobody', () => [{ lineId: 999_999, quantity: 1 }], 409],
  ['nothing', () => [], 400],
])('refunding %s is refused and nothing changes', async (_what, what, status) => {
  const { app, api, page } = await aPaidOrder()
  const { lines } = (await api.get(page)).body

  const reply = await api.post(`${page}/refunds`, { what: what(lines[0].lineId), reason: 'Because' })

  expect(reply.status).toBe(status)
  expect(await app.fakes.refunds()).toEqual([])
})

test('a refund whose answer is lost is finished later with the same key, once', async () => {
  const { app, api, page } = await aPaidOrder()
  await app.fakes.behave({ loseNextAnswers: 2 })

  const reply = await api.post(`${page}/refunds`, { what: 'everything', reason: 'Lost answer' })
  expect(reply).toMatchObject({ status: 201, body: { state: 'requested' } })
  const { finishOpenRefunds } = await import('../orders/refund-order.ts')
  await finishOpenRefunds(app.deps)

  expect((await api.get(page)).body.status).toBe('refunded')
  expect(await app.fakes.refunds()).toHaveLength(1)
})

test('an order is moved to the right seller, and both tallies follow', async () => {
  const { app, store, api, page } = await aPaidOrder()
  const right = app.make.seller(store.drive, { firstName: 'Maya', lastName: 'Lorimer', number: 777 })

  const moved = await api.post(`${page}/move`, { sellerNumber: 777, reason: 'Meant for the other Maya' })

  expect(moved.status).toBe(200)
  expect(credited(app, store.seller.id)).toEqual({ items: 0, cents: 0 })
  expect(credited(app, right.id)).toEqual({ items: 4, cents: 7200 })
  expect((await api.post(`${page}/move`, { sellerNumber: 777, reason: 'Again' })).status).toBe(409)
  expect((await api.post(`${page}/move`, { sellerNumber: 778, reason: 'Nobody' })).body.errors[0].path).toBe(
    'sellerNumber',
  )
})

test('orders are searched, filtered, sorted, paged and exported on the server', async () => {
  const { api, base, number } = await aPaidOrder()
  const total = async (search: string) => (await api.get(`${base}${search}`)).body.total

  expect(await total('')).toBe(1)
  expect(await total('?search=lindqvist')).toBe(1)
  expect(await total('?search=ruth%40example')).toBe(1)
  expect(await total(`?search=${number.toLowerCase()}`)).toBe(1)
  expect(await total('?search=%25')).toBe(0)
  expect(await total('?status=refunded')).toBe(0)
  expect(await total('?status=paid&sort=total&direction=up&page=7')).toBe(1)
  expect((await api.get(`${base}?sort=drop`)).status).toBe(400)
  expect((await api.get(`${base}?page=-1`)).status).toBe(400)
  const csv = await api.get(`${base}.csv?status=paid`)
  expect(csv.headers.get('content-type')).toContain('text/csv')
  expect(csv.body.split('\r\n')).toHaveLength(3)
  expect(csv.body).toContain(number)
})

test('a helper sees orders and may neither refund nor move nor export', async () => {
  const { api, base, page } = await aPaidOrder('helper')

  expect((await api.get(page)).body).toMatchObject({ mayRefund: false, mayMove: false })
  expect((await api.post(`${page}/refunds`, { what: 'everything', reason: 'Because' })).status).toBe(403)
  expect((await api.post(`${page}/move`, { sellerNumber: 777, reason: 'Because' })).status).toBe(403)
  expect((await api.get(`${base}.csv`)).status).toBe(403)
})

test('the close is moved later, earlier and open again; each is logged; impossible ones are refused', async () => {
  const { app, store, api } = await aPaidOrder()
  const closeAt = (date: string, time = '23:59') =>
    api.post(`/api/drives/${store.drive.publicId}/close-at`, { date, time, reason: 'Snow days' })
  const status = async () => (await app.api.get(`/api/stores/${store.token}`)).body.drive.status

  expect((await closeAt('2026-11-30')).body.closesAt).toBe('2026-12-01T05:00:00.000Z')
  await api.post(`/api/drives/${store.drive.publicId}/close`, { reason: 'By mistake' })
  expect(await status()).toBe('closed')
  expect((await closeAt('2026-11-20')).status).toBe(200)
  expect(await status()).toBe('open')
  for (const [date, time] of [
    ['2026-11-01', '10:00'],
    ['2026-02-30', '10:00'],
    ['9999-12-31', '10:00'],
    ['2027-03-14', '02:30'],
  ])
    expect((await closeAt(date!, time)).status, `${date} ${time}`).toBe(400)
  const log = app.deps.db.orm
    .select()
    .from(activity)
    .all()
    .map(row => row.action)
  expect(log.filter(action => ['extended', 'close_moved', 'closed_early'].includes(action))).toEqual([
    'extended',
    'closed_early',
    'extended',
  ])
})
