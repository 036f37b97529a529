import { expect, test } from 'vitest'
import { orderLine } from '../db/schema/orders.ts'
import { anOrder } from '../testing/builders.ts'
import { startApp } from '../testing/start-app.ts'

const key = (name: string) => ({ 'Idempotency-Key': `key-of-${name}` })

test('a relative orders from a seller’s link and is sent to the payment page', async () => {
  const { api, make, fakes } = await startApp()
  const store = make.store()

  const reply = await api.post(`/api/stores/${store.token}/orders`, anOrder(), key('ruth'))

  expect(reply.status).toBe(201)
  expect(reply.body.totalCents).toBe(3200)
  const [session] = await fakes.sessions()
  expect(reply.body.payUrl).toContain(session.id)
  expect(new URL(reply.body.payUrl).origin).toBe(fakes.payments.url)
  const receipt = await api.get(`/api/receipts/${reply.body.receiptUrl.split('/').at(-1)}`)
  expect(receipt.body).toMatchObject({
    orderNumber: reply.body.orderNumber,
    status: 'awaiting_payment',
    totalCents: 3200,
  })
})

test('the same key and body again give the same order, in a row and ten at once', async () => {
  const { api, make, fakes } = await startApp()
  const store = make.store()
  const send = () => api.post(`/api/stores/${store.token}/orders`, anOrder(), key('twice'))

  const replies = [await send(), ...(await Promise.all(Array.from({ length: 10 }, send)))]

  expect(new Set(replies.map(reply => reply.status))).toEqual(new Set([201]))
  expect(new Set(replies.map(reply => reply.body.orderNumber)).size).toBe(1)
  expect(await fakes.sessions()).toHaveLength(1)
})

test('the same key with another cart is refused and nothing more is ordered', async () => {
  const { api, make, fakes } = await startApp()
  const store = make.store()
  await api.post(`/api/stores/${store.token}/orders`, anOrder(), key('reused'))

  const other = anOrder({ lines: [{ itemCode: '1204', quantity: 3 }], quotedTotalCents: 4800 })
  const reply = await api.post(`/api/stores/${store.token}/orders`, other, key('reused'))

  expect(reply).toMatchObject({ status: 409, body: { code: 'key_reused' } })
  expect(await fakes.sessions()).toHaveLength(1)
})

test('a wrong quoted total is answered with the right one and nothing is ordered', async () => {
  const { api, make, fakes } = await startApp()
  const store = make.store()

  const reply = await api.post(
    `/api/stores/${store.token}/orders`,
    anOrder({ quotedTotalCents: 3199 }),
    key('quote'),
  )

  expect(reply).toMatchObject({ status: 409, body: { code: 'total_changed', totalCents: 3200 } })
  expect(await fakes.sessions()).toEqual([])
})

test('a withdrawn item is pointed out and nothing is charged', async () => {
  const { api, make, fakes } = await startApp()
  const store = make.store({
    items: [
      { code: '1204', available: false },
      { code: '2318', priceCents: 1800 },
    ],
  })
  const body = anOrder({
    lines: [
      { itemCode: '2318', quantity: 1 },
      { itemCode: '1204', quantity: 1 },
    ],
    quotedTotalCents: 3400,
  })

  const reply = await api.post(`/api/stores/${store.token}/orders`, body, key('gone'))

  expect(reply).toMatchObject({
    status: 409,
    body: { code: 'item_unavailable', errors: [{ path: 'lines.1.itemCode' }] },
  })
  expect(await fakes.sessions()).toEqual([])
})

test.each([
  ['one millisecond before the close', -1, 201],
  ['at the close', 0, 409],
  ['one millisecond after', 1, 409],
])('an order placed %s gets %i', async (_when, offset, status) => {
  const { api, make, clock } = await startApp({ now: Date.UTC(2026, 10, 20) })
  const closesAt = Date.UTC(2026, 10, 21, 5)
  const store = make.store({ closesAt })
  clock.set(closesAt + offset)

  const reply = await api.post(`/api/stores/${store.token}/orders`, anOrder(), key('close'))

  expect(reply.status).toBe(status)
  if (status === 409) expect(reply.body.code).toBe('store_closed')
})

test.each([
  [
    'not open yet',
    { opensAt: Date.UTC(2027, 0, 1), closesAt: Date.UTC(2027, 1, 1) },
    'store_not_open',
    'not_open',
  ],
  ['closed', { opensAt: Date.UTC(2026, 0, 1), closesAt: Date.UTC(2026, 1, 1) }, 'store_closed', 'closed'],
])('a store that is %s shows itself and takes no order', async (_what, options, code, status) => {
  const { api, make } = await startApp()
  const store = make.store(options)

  expect(await api.get(`/api/stores/${store.token}`)).toMatchObject({
    status: 200,
    body: { drive: { status } },
  })
  expect(await api.post(`/api/stores/${store.token}/orders`, anOrder(), key('state'))).toMatchObject({
    status: 409,
    body: { code },
  })
})

test('a paused link shows itself and takes no order; a replaced one is like one that never was', async () => {
  const { api, make } = await startApp()
  const drive = make.drive()
  const paused = make.link(make.seller(drive), { state: 'paused' })
  const replaced = make.link(make.seller(drive), { state: 'replaced' })

  expect((await api.get(`/api/stores/${paused.token}`)).body.drive.status).toBe('paused')
  expect((await api.post(`/api/stores/${paused.token}/orders`, anOrder(), key('paused'))).body.code).toBe(
    'store_paused',
  )
  const gone = await api.get(`/api/stores/${replaced.token}`)
  const never = await api.get('/api/stores/AAAAAAAAAAAAAAAAAAAAAA')
  expect(gone.status).toBe(404)
  expect({ ...gone.body, requestId: '' }).toEqual({ ...never.body, requestId: '' })
})

test.each([
  ['quantity 0', { lines: [{ itemCode: '1204', quantity: 0 }] }],
  ['quantity 1.5', { lines: [{ itemCode: '1204', quantity: 1.5 }] }],
  ['quantity "1"', { lines: [{ itemCode: '1204', quantity: '1' }] }],
  ['quantity [5]', { lines: [{ itemCode: '1204', quantity: [5] }] }],
  ['quantity null', { lines: [{ itemCode: '1204', quantity: null }] }],
  ['quantity 10,000', { lines: [{ itemCode: '1204', quantity: 10_000 }] }],
  ['a price of its own', { lines: [{ itemCode: '1204', quantity: 2, price: 1 }] }],
  ['a status of its own', { status: 'paid' }],
  ['a seller of its own', { sellerId: 7 }],
  ['a gift of 0.5 cents', { giftCents: 0.5 }],
  ['a negative gift', { giftCents: -5 }],
  [
    'an e-mail with two addresses',
    { customer: { name: 'A', email: 'a@b.co,evil@c.co', relationship: 'friend' } },
  ],
  [
    'a name with a line break',
    { customer: { name: 'A\r\nBcc: x', email: 'a@b.co', relationship: 'friend' } },
  ],
  [
    'a name of nothing visible',
    { customer: { name: '\u200b\u00a0', email: 'a@b.co', relationship: 'friend' } },
  ],
  ['a relationship of its own', { customer: { name: 'A', email: 'a@b.co', relationship: 'stranger' } }],
])('%s is refused with its place named, and nothing is written', async (_what, changes) => {
  const { api, make, deps } = await startApp()
  const store = make.store()

  const reply = await api.post(`/api/stores/${store.token}/orders`, { ...anOrder(), ...changes }, key('bad'))

  expect(reply.status).toBe(400)
  expect(reply.headers.get('content-type')).toContain('application/problem+json')
  expect(reply.body.errors.length).toBeGreaterThan(0)
  expect(deps.db.orm.select().from(orderLine).all()).toEqual([])
})

test.each([
  ['no key', anOrder(), {}, 400],
  ['half a body', '{"lines":[', key('half'), 400],
  ['a body that is a text', '"order"', key('text'), 400],
  ['nested 4,000 deep', `${'['.repeat(4_000)}${']'.repeat(4_000)}`, key('deep'), 400],
  ['text/plain', anOrder(), { ...key('plain'), 'Content-Type': 'text/plain' }, 415],
  [
    'another charset',
    anOrder(),
    { ...key('charset'), 'Content-Type': 'application/json; charset=utf-16' },
    415,
  ],
  ['100 kB', { ...anOrder(), locale: 'x'.repeat(100_000) }, key('large'), 413],
  [
    'from another site',
    anOrder(),
    { ...key('csrf'), 'Sec-Fetch-Site': 'cross-site', Origin: 'https://evil.example' },
    403,
  ],
])('%s is refused calmly', async (_what, body, headers, status) => {
  const { api, make } = await startApp()
  const store = make.store()

  const reply = await api.request('POST', `/api/stores/${store.token}/orders`, body, headers)

  expect(reply.status).toBe(status)
  expect(JSON.stringify(reply.body)).not.toMatch(/at .*\.ts|SQLITE|select /i)
})

test('a client that is no browser may order by a link it knows', async () => {
  const { url, make } = await startApp()
  const store = make.store()

  const response = await fetch(`${url}/api/stores/${store.token}/orders`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json', ...key('plain-client') },
    body: JSON.stringify(anOrder()),
  })

  expect(response.status).toBe(201)
})

test('a silent payment service leaves the order kept; the same key goes on with it', async () => {
  const { api, make, fakes } = await startApp()
  const store = make.store()
  await fakes.behave({ failNextCalls: 2 })

  const first = await api.post(`/api/stores/${store.token}/orders`, anOrder(), key('retry'))
  const second = await api.post(`/api/stores/${store.token}/orders`, anOrder(), key('retry'))

  expect(first).toMatchObject({ status: 503, body: { code: 'payment_service_unreachable' } })
  expect(first.headers.get('retry-after')).toBe('5')
  expect(second.status).toBe(201)
  expect(await fakes.sessions()).toHaveLength(1)
})

test('a changed order takes the place of the one that was not paid, whose page ends', async () => {
  const { api, make, fakes } = await startApp()
  const store = make.store()
  const first = await api.post(`/api/stores/${store.token}/orders`, anOrder(), key('first'))
  const receipt = first.body.receiptUrl.split('/').at(-1)

  const changed = anOrder({
    lines: [{ itemCode: '1204', quantity: 1 }],
    quotedTotalCents: 1600,
    replaces: receipt,
  })
  const second = await api.post(`/api/stores/${store.token}/orders`, changed, key('second'))

  expect(second.status).toBe(201)
  expect((await api.get(`/api/receipts/${receipt}`)).body.status).toBe('expired')
  const states = (await fakes.sessions()).map(session => session.status).sort()
  expect(states).toEqual(['expired', 'open'])
})

test('gift, cover and a label for somebody are on the order and on the payment page', async () => {
  const { api, make, fakes } = await startApp()
  const store = make.store()
  const body = anOrder({
    lines: [{ itemCode: '1204', quantity: 1, recipientLabel: 'Ana' }],
    giftCents: 3400,
    coverFee: true,
    quotedTotalCents: 5180,
  })

  const reply = await api.post(`/api/stores/${store.token}/orders`, body, key('gift'))

  const receipt = await api.get(`/api/receipts/${reply.body.receiptUrl.split('/').at(-1)}`)
  expect(receipt.body).toMatchObject({ itemsCents: 1600, giftCents: 3400, coverCents: 180, totalCents: 5180 })
  expect(receipt.body.lines[0].recipientLabel).toBe('Ana')
  expect((await fakes.sessions())[0].amount_total).toBe(5180)
})

test('who orders by a group’s link is credited to the group and told that the school hands the food over', async () => {
  const { api, make } = await startApp()
  const drive = make.drive()
  const group = make.group(drive, 'Chassis')
  const link = make.link(make.houseSeller(drive, group))

  expect((await api.get(`/api/stores/${link.token}`)).body).toMatchObject({
    seller: null,
    group: { name: 'Chassis' },
  })
  const reply = await api.post(`/api/stores/${link.token}/orders`, anOrder(), key('group'))

  const receipt = await api.get(`/api/receipts/${reply.body.receiptUrl.split('/').at(-1)}`)
  expect(receipt.body).toMatchObject({ creditedTo: 'Chassis', handover: 'school' })
})
