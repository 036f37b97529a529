import { createHmac } from 'node:crypto'
import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { outbox } from '../db/schema/mail.ts'
import { order, sellerTally } from '../db/schema/orders.ts'
import { paymentEvent, paymentPutAside } from '../db/schema/payments.ts'
import { trialBalance } from '../ledger/queries.ts'
import { anOrder } from '../testing/builders.ts'
import { startApp, type TestApp, WEBHOOK_SECRET } from '../testing/start-app.ts'
import { until } from '../testing/until.ts'

async function placeOne(app: TestApp, store = app.make.store(), changes = {}) {
  const reply = await app.api.post(`/api/stores/${store.token}/orders`, anOrder(changes), {
    'Idempotency-Key': `key-${Math.random()}`,
  })
  expect(reply.status).toBe(201)
  const receipt = reply.body.receiptUrl.split('/').at(-1) as string
  const sessionId = /cs_[A-Za-z0-9_]+/.exec(reply.body.payUrl)![0]
  const status = async () => (await app.api.get(`/api/receipts/${receipt}`)).body.status as string
  return { store, receipt, sessionId, status, number: reply.body.orderNumber as string }
}

const credited = (app: TestApp, sellerId: number) =>
  app.deps.db.orm
    .select()
    .from(sellerTally)
    .where(eq(sellerTally.sellerId, sellerId))
    .all()
    .reduce((sum, row) => sum + row.quantity, 0)

test('a payment credits the seller, balances the ledger and queues one receipt and the guardians’ notices', async () => {
  const app = await startApp()
  const store = app.make.store()
  const mother = app.make.user()
  const father = app.make.user()
  app.make.guardian(store.seller, mother.id)
  app.make.guardian(store.seller, father.id)
  const placed = await placeOne(app, store, { giftCents: 500, coverFee: true, quotedTotalCents: 3841 })

  await app.fakes.pay(placed.sessionId)
  await until(async () => (await placed.status()) === 'paid')

  expect(credited(app, store.seller.id)).toBe(2)
  const balance = trialBalance(app.deps.db.orm, store.drive.id)
  expect(Object.values(balance).reduce((a, b) => a + b, 0)).toBe(0)
  // 38.41 charged: 32.00 goods, 5.00 gift, 1.41 cover, which is what the card service keeps.
  expect(balance).toMatchObject({
    sales: -3200,
    gifts: -500,
    cover: -141,
    card_fees: 141,
    cash_operator: 3700,
  })
  const letters = app.deps.db.orm.select().from(outbox).all()
  expect(letters.filter(letter => letter.kind === 'receipt')).toHaveLength(1)
  expect(
    letters
      .filter(letter => letter.kind === 'guardian_notice')
      .map(letter => letter.recipient)
      .sort(),
  ).toEqual([mother.email, father.email].sort())
})

test('the same event six times in parallel, and twice more later, has one effect', async () => {
  const app = await startApp()
  await app.fakes.behave({ duplicate: 5 })
  const placed = await placeOne(app)

  await app.fakes.pay(placed.sessionId)
  await until(async () => (await placed.status()) === 'paid')
  const [event] = (await app.fakes.events()).filter(e => e.type === 'checkout.session.completed')
  await Promise.all([app.fakes.resend(event.id), app.fakes.resend(event.id)])
  await app.reconcile()

  expect(credited(app, placed.store.seller.id)).toBe(2)
  expect(app.deps.db.orm.select().from(outbox).all()).toHaveLength(1)
})

test('with webhooks off the reconciler alone gets there', async () => {
  const app = await startApp()
  await app.fakes.behave({ drop: true })
  const placed = await placeOne(app)
  await app.fakes.pay(placed.sessionId)
  expect(await placed.status()).toBe('awaiting_payment')

  await app.reconcile()

  expect(await placed.status()).toBe('paid')
  expect(credited(app, placed.store.seller.id)).toBe(2)
})

test('the customer who comes back asks the payment service, whatever was announced', async () => {
  const app = await startApp()
  await app.fakes.behave({ drop: true })
  const placed = await placeOne(app)
  await app.fakes.pay(placed.sessionId)

  const reply = await app.api.post(`/api/receipts/${placed.receipt}/check`)

  expect(reply).toMatchObject({ status: 200, body: { status: 'paid' } })
})

test('an order placed before the close and paid after it is credited', async () => {
  const app = await startApp({ now: Date.UTC(2026, 10, 21, 4, 59) })
  const store = app.make.store({ closesAt: Date.UTC(2026, 10, 21, 5) })
  const placed = await placeOne(app, store)
  app.clock.forward(20 * 60_000)

  await app.fakes.pay(placed.sessionId)
  await until(async () => (await placed.status()) === 'paid')

  expect(credited(app, store.seller.id)).toBe(2)
})

test('an order that was not paid in its half hour expires on the payment service’s word', async () => {
  const app = await startApp()
  const placed = await placeOne(app)

  app.clock.forward(40 * 60_000)
  await app.reconcile()

  expect(await placed.status()).toBe('expired')
  expect(credited(app, placed.store.seller.id)).toBe(0)
})

test('a declined card leaves the order waiting, and another card pays it', async () => {
  const app = await startApp()
  const placed = await placeOne(app)

  const declined = await app.fakes.pay(placed.sessionId, '4000000000000002')
  expect(declined.status).toBe(402)
  expect(await placed.status()).toBe('awaiting_payment')
  await app.fakes.pay(placed.sessionId)

  await until(async () => (await placed.status()) === 'paid')
})

test.each([
  ['one cent too little', { wrongAmountNext: -1 }, 'wrong_amount'],
  ['another currency', { wrongCurrencyNext: 'cad' }, 'wrong_currency'],
])('%s is put aside for the operator and never credited', async (_what, behaviour, reason) => {
  const app = await startApp()
  const admin = app.make.user()
  app.make.staff(admin.id, 'admin')
  const placed = await placeOne(app)
  await app.fakes.behave(behaviour)

  await app.fakes.pay(placed.sessionId)
  await until(() => app.deps.db.orm.select().from(paymentPutAside).all().length === 1)
  await app.reconcile()

  expect(app.deps.db.orm.select().from(paymentPutAside).all()).toMatchObject([{ reason }])
  expect(await placed.status()).toBe('awaiting_payment')
  expect(credited(app, placed.store.seller.id)).toBe(0)
  expect(app.deps.db.orm.select().from(outbox).all()).toMatchObject([
    { kind: 'staff_notice', recipient: admin.email },
  ])
})

test('a page lost in a crash is found again by the order’s own key', async () => {
  const app = await startApp()
  await app.fakes.behave({ loseNextAnswers: 2 })
  const store = app.make.store()
  const reply = await app.api.post(`/api/stores/${store.token}/orders`, anOrder(), {
    'Idempotency-Key': 'lost-page',
  })
  expect(reply.status).toBe(503)
  const [session] = await app.fakes.sessions()
  await app.fakes.pay(session.id)

  await app.reconcile()

  const [row] = app.deps.db.orm.select().from(order).all()
  expect(row).toMatchObject({ status: 'paid' })
  expect(await app.fakes.sessions()).toHaveLength(1)
})

/** A webhook as the payment service would sign it, with whatever is to be wrong about it. */
function signed(body: string, options: { at: number; secret?: string }) {
  const stamp = Math.floor(options.at / 1000)
  const signature = createHmac('sha256', options.secret ?? WEBHOOK_SECRET)
    .update(`${stamp}.${body}`)
    .digest('hex')
  return `t=${stamp},v1=${signature}`
}

test('only what the payment service signed, lately, is taken', async () => {
  const app = await startApp()
  const now = app.clock.now()
  const body = JSON.stringify({
    id: 'evt_1',
    object: 'event',
    type: 'customer.created',
    created: Math.floor(now / 1000),
    data: { object: { id: 'cus_1', object: 'customer' } },
  })
  const send = (signature: string | undefined, text = body) =>
    app.api.request(
      'POST',
      '/api/webhooks/payments',
      text,
      signature ? { 'Stripe-Signature': signature } : {},
    )

  expect((await send(undefined)).status).toBe(400)
  expect((await send('nonsense')).status).toBe(400)
  expect((await send(signed(body, { at: now, secret: 'whsec_wrong' }))).status).toBe(400)
  expect((await send(signed(body, { at: now }), `${body} `)).status).toBe(400)
  expect((await send(signed(body, { at: now }).replace('v1', 'v0'))).status).toBe(400)
  expect((await send(signed(body, { at: now - 301_000 }))).status).toBe(400)
  expect((await send(signed(body, { at: now + 86_400_000 }))).status).toBe(400)
  expect(app.deps.db.orm.select().from(paymentEvent).all()).toEqual([])
  expect((await send(signed(body, { at: now - 299_000 }))).status).toBe(200)
  expect(app.deps.db.orm.select().from(paymentEvent).all()).toMatchObject([{ outcome: 'not for us' }])
})

test('the signature is the documented one (stripe-node, src/Webhooks.ts, worked value)', () => {
  const body = '{"id":"evt_test_1","object":"event","type":"checkout.session.completed"}'
  expect(signed(body, { at: 1_790_000_000_000, secret: 'whsec_test_secret' })).toBe(
    't=1790000000,v1=5cce3a0ec564f3cd83d33b15f716dca10a58cad9c8bcd43ffa04158329787dc6',
  )
})
