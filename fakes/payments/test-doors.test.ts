import { expect, test } from 'vitest'
import { aSession, refusalOf, startForTest } from './start-for-test.ts'

test.each([
  ['4000000000000002', 'card_declined', 'generic_decline'],
  ['4000000000009995', 'card_declined', 'insufficient_funds'],
  ['4000000000000069', 'expired_card', 'expired_card'],
  ['4000000000000127', 'incorrect_cvc', 'incorrect_cvc'],
  ['4000000000000119', 'processing_error', 'processing_error'],
  ['4242424242424241', 'incorrect_number', 'incorrect_number'],
])('paying with %s is declined with 402 and the page stays open', async (card, code, declineCode) => {
  const { stripe, pay } = await startForTest()
  const session = await stripe.checkout.sessions.create(aSession())

  const declined = await pay(session.id, card)
  const then = await stripe.checkout.sessions.retrieve(session.id, { expand: ['payment_intent'] })

  expect(declined).toMatchObject({
    status: 402,
    body: { error: { type: 'card_error', code, decline_code: declineCode, message: expect.any(String) } },
  })
  expect(then).toMatchObject({
    status: 'open',
    payment_status: 'unpaid',
    payment_intent: { status: 'requires_payment_method', last_payment_error: { code } },
  })
  expect((await pay(session.id)).body.status).toBe('complete')
})

test('a page is paid once', async () => {
  const { stripe, pay, door } = await startForTest()
  const session = await stripe.checkout.sessions.create(aSession())

  const tries = await Promise.all([pay(session.id), pay(session.id), pay(session.id)])

  expect(tries.map(attempt => attempt.status).sort()).toEqual([200, 400, 400])
  expect((await door('GET', '/events')).body).toHaveLength(1)
  expect((await pay('cs_test_none')).status).toBe(404)
})

test('the next payment can be of another amount and currency than was asked, only once', async () => {
  const { stripe, pay, behave } = await startForTest()
  const [one, two] = [
    await stripe.checkout.sessions.create(aSession()),
    await stripe.checkout.sessions.create(aSession()),
  ]
  await behave({ wrongAmountNext: -1, wrongCurrencyNext: 'cad' })

  const wrong = (await pay(one.id)).body
  const right = (await pay(two.id)).body

  expect(wrong).toMatchObject({ amount_total: 5_699, currency: 'cad' })
  expect(right).toMatchObject({ amount_total: 5_700, currency: 'usd' })
  expect(await stripe.paymentIntents.retrieve(wrong.payment_intent)).toMatchObject({
    amount: 5_699,
    currency: 'cad',
  })
})

test('five hundred sessions of the past are loaded in less than 300 ms and announce nothing', async () => {
  const { stripe, door } = await startForTest()
  const sessions = Array.from({ length: 500 }, (_, n) => ({
    id: `cs_test_past${n}`,
    paymentIntentId: `pi_past${n}`,
    amountTotalCents: 4_000 + n,
    currency: 'usd',
    created: 1_790_000_000 + n,
    clientReferenceId: `order-${n}`,
    metadata: { order: `order-${n}` },
    customerEmail: `person${n}@example.org`,
    refunds:
      n % 10 === 0 ? [{ id: `re_past${n}`, amountCents: 1_000, created: 1_790_009_000, metadata: {} }] : [],
  }))

  const begun = performance.now()
  const loaded = await door('POST', '/import', { sessions })
  const took = performance.now() - begun
  await door('POST', '/import', { sessions })
  const listed = await stripe.checkout.sessions.list({ limit: 100 }).autoPagingToArray({ limit: 1_000 })

  expect(loaded.body).toEqual({ imported: 500 })
  expect(took).toBeLessThan(300)
  expect(listed).toHaveLength(500)
  expect(listed[0]).toMatchObject({
    id: 'cs_test_past499',
    status: 'complete',
    payment_status: 'paid',
    payment_intent: 'pi_past499',
    amount_total: 4_499,
    customer_details: { email: 'person499@example.org' },
  })
  expect((await door('GET', '/refunds')).body).toHaveLength(50)
  expect((await door('GET', '/events')).body).toEqual([])
  expect(await refusalOf(stripe.refunds.create({ payment_intent: 'pi_past0', amount: 3_001 }))).toMatchObject(
    {
      code: 'amount_too_large',
    },
  )
  expect(await stripe.refunds.create({ payment_intent: 'pi_past0' })).toMatchObject({ amount: 3_000 })
})

test('an unsound session loads nothing at all', async () => {
  const { door } = await startForTest()
  const sound = {
    id: 'cs_test_a',
    paymentIntentId: 'pi_a',
    amountTotalCents: 100,
    currency: 'usd',
    created: 1_790_000_000,
  }

  const refused = await door('POST', '/import', { sessions: [sound, { ...sound, amountTotalCents: 0 }] })

  expect(refused).toMatchObject({ status: 400, body: { error: { param: 'sessions[1][amountTotalCents]' } } })
  expect((await door('GET', '/sessions')).body).toEqual([])
})

test('a refund that the bank sends back is failed and may be given again', async () => {
  const { stripe, pay, door, webhooks } = await startForTest()
  const session = (await pay((await stripe.checkout.sessions.create(aSession())).id)).body
  const refund = await stripe.refunds.create({ payment_intent: session.payment_intent })

  await door('POST', `/refunds/${refund.id}/fail`)

  expect((await stripe.refunds.retrieve(refund.id)).status).toBe('failed')
  expect((await stripe.refunds.create({ payment_intent: session.payment_intent })).amount).toBe(5_700)
  expect((await webhooks(9)).map(delivery => delivery.event.type)).toContain('refund.failed')
})

test('an event of any kind can be made up: a later version, another account', async () => {
  const { door, webhooks } = await startForTest()

  await door('POST', '/events', {
    type: 'moon.rose',
    object: { id: 'm1' },
    account: 'acct_2',
    apiVersion: '2031-01-01',
  })

  expect((await webhooks(1))[0]!.event).toMatchObject({
    type: 'moon.rose',
    account: 'acct_2',
    api_version: '2031-01-01',
    data: { object: { id: 'm1' } },
  })
})

test('a behaviour nobody knows is refused and changes nothing', async () => {
  const { behave, door } = await startForTest()

  expect((await behave({ duplicate: 2, dupe: 1 })).status).toBe(400)
  expect((await behave({ latencyMs: -1 })).status).toBe(400)
  expect((await behave({ drop: 'yes' })).status).toBe(400)
  expect((await door('GET', '/behaviour')).body.duplicate).toBe(0)
})

test('reset makes it behave as usual and keeps the books; asked to, it empties them', async () => {
  const { stripe, behave, door } = await startForTest()
  await stripe.checkout.sessions.create(aSession())
  await behave({ failNextCalls: 9, drop: true })

  await door('POST', '/reset')
  const kept = (await stripe.checkout.sessions.list()).data
  await door('POST', '/reset', { books: true })

  expect(kept).toHaveLength(1)
  expect((await stripe.checkout.sessions.list()).data).toEqual([])
})

test('a body that is no JSON is the caller’s mistake', async () => {
  const { url } = await startForTest()
  const answer = await fetch(`${url}/_test/behaviour`, { method: 'POST', body: '{' })
  expect(answer.status).toBe(400)
  expect(await (await fetch(`${url}/healthz`)).json()).toEqual({ status: 'ok' })
})
