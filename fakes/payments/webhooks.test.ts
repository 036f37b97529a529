import { expect, test } from 'vitest'
import { aSession, pause, startForTest } from './start-for-test.ts'
import { signatureOf, waitAfter } from './webhook-sender.ts'

const NOW = Date.parse('2026-11-20T15:00:00Z')

// The documented scheme, computed independently over the same secret, stamp and body.
test('the signature is the documented one', () => {
  const body = '{"id":"evt_test_1","object":"event","type":"checkout.session.completed"}'
  expect(signatureOf(body, 'whsec_test_secret', 1_790_000_000)).toBe(
    't=1790000000,v1=5cce3a0ec564f3cd83d33b15f716dca10a58cad9c8bcd43ffa04158329787dc6',
  )
})

test('waits double from half a second to thirty seconds', () => {
  expect([1, 2, 3, 4, 5, 6, 7, 8, 20].map(waitAfter)).toEqual([
    500, 1_000, 2_000, 4_000, 8_000, 16_000, 30_000, 30_000, 30_000,
  ])
})

test('the stamp is of the stand-in’s own clock', async () => {
  const { stripe, pay, webhooks } = await startForTest({ now: () => NOW })
  await pay((await stripe.checkout.sessions.create(aSession())).id)

  const [delivery] = await webhooks(1)

  expect(delivery!.signature).toMatch(new RegExp(`^t=${NOW / 1000},v1=[0-9a-f]{64}$`))
  expect(delivery!.event.created).toBe(NOW / 1000)
})

test('an event is sent again until it is taken, always the same', async () => {
  const { stripe, pay, webhooks } = await startForTest({ answer: tries => (tries < 3 ? 500 : 204) })
  await pay((await stripe.checkout.sessions.create(aSession())).id)

  const deliveries = await webhooks(3)

  expect(deliveries).toHaveLength(3)
  expect(new Set(deliveries.map(delivery => delivery.body)).size).toBe(1)
})

test('a refund announces the refund, the charge and the change', async () => {
  const { stripe, pay, webhooks } = await startForTest()
  const session = (await pay((await stripe.checkout.sessions.create(aSession())).id)).body
  await webhooks(1)

  await stripe.refunds.create({ payment_intent: session.payment_intent, amount: 700 })
  const events = (await webhooks(4)).slice(1).map(delivery => delivery.event)

  expect(events.map(event => event.type).sort()).toEqual([
    'charge.refunded',
    'refund.created',
    'refund.updated',
  ])
  expect(events.find(event => event.type === 'charge.refunded')).toMatchObject({
    data: {
      object: {
        payment_intent: session.payment_intent,
        amount: 5_700,
        amount_refunded: 700,
        refunded: false,
      },
      previous_attributes: { amount_refunded: 0 },
    },
  })
})

test('a page whose time is up expires by itself and says so', async () => {
  const { stripe, setClock, webhooks, pay } = await startForTest({ now: () => NOW })
  const session = await stripe.checkout.sessions.create(aSession({ expires_at: NOW / 1000 + 1_800 }))

  await setClock(NOW + 1_800_000 - 1)
  const before = await stripe.checkout.sessions.retrieve(session.id)
  await setClock(NOW + 1_800_000)
  const [delivery] = await webhooks(1)

  expect(before.status).toBe('open')
  expect(delivery!.event).toMatchObject({
    type: 'checkout.session.expired',
    data: { object: { id: session.id, status: 'expired', payment_status: 'unpaid' } },
  })
  expect((await pay(session.id)).body.error.code).toBe('checkout_session_expired')
})

test('the sweep expires a page that nobody looks at', async () => {
  let now = NOW
  const { stripe, webhooks } = await startForTest({ now: () => now })
  await stripe.checkout.sessions.create(aSession({ expires_at: NOW / 1000 + 1_800 }))

  now += 1_800_000

  expect((await webhooks(1)).map(delivery => delivery.event.type)).toEqual(['checkout.session.expired'])
})

test('duplicate: each event comes once and so many times more', async () => {
  const { stripe, pay, behave, webhooks } = await startForTest()
  await behave({ duplicate: 5 })
  await pay((await stripe.checkout.sessions.create(aSession())).id)

  const deliveries = await webhooks(6)

  expect(deliveries).toHaveLength(6)
  expect(new Set(deliveries.map(delivery => delivery.event.id)).size).toBe(1)
})

test('delayMs: an event comes so much later', async () => {
  const { stripe, pay, behave, webhooks, received } = await startForTest()
  await behave({ delayMs: 300 })
  await pay((await stripe.checkout.sessions.create(aSession())).id)

  await pause(200)
  const early = received.length

  expect(early).toBe(0)
  expect(await webhooks(1)).toHaveLength(1)
})

test('shuffle: events come in another order, all within two seconds', async () => {
  const { behave, door, webhooks } = await startForTest()
  await behave({ shuffle: true })
  for (let n = 0; n < 12; n++)
    await door('POST', '/events', { type: `made.up.${n}`, object: { id: `x${n}` } })

  const types = (await webhooks(12)).map(delivery => delivery.event.type as string)

  expect(types).toHaveLength(12)
  expect(types).not.toEqual(Array.from({ length: 12 }, (_, n) => `made.up.${n}`))
})

test('drop: nothing is delivered while it lasts, and afterwards everything is', async () => {
  const { stripe, pay, behave, webhooks, received } = await startForTest()
  await behave({ drop: true })
  await pay((await stripe.checkout.sessions.create(aSession())).id)
  await pause(150)
  const during = received.length

  await behave({ drop: false })

  expect(during).toBe(0)
  expect(await webhooks(1)).toHaveLength(1)
})

test('what was not delivered before a restart is delivered after it', async () => {
  const before = await startForTest()
  await before.behave({ drop: true })
  const session = await before.stripe.checkout.sessions.create(aSession())
  await before.pay(session.id)
  await before.close()

  const after = await startForTest({ dataDir: before.dataDir })

  expect((await after.webhooks(1)).map(delivery => delivery.event.type)).toEqual([
    'checkout.session.completed',
  ])
  expect((await after.stripe.checkout.sessions.retrieve(session.id)).status).toBe('complete')
})

test('an event is sent once more when asked, and the answer is told', async () => {
  const { stripe, pay, door, webhooks } = await startForTest()
  await pay((await stripe.checkout.sessions.create(aSession())).id)
  const [first] = await webhooks(1)

  const resent = await door('POST', `/events/${first!.event.id}/resend`)

  expect(resent.body).toEqual({ id: first!.event.id, delivered: true, answer: '200' })
  expect((await webhooks(2)).map(delivery => delivery.body)).toEqual([first!.body, first!.body])
  expect((await door('POST', '/events/evt_none/resend')).status).toBe(404)
})

test('closing does not wait for a receiver that hangs', async () => {
  const { stripe, pay, close, received } = await startForTest({ answer: () => null })
  await pay((await stripe.checkout.sessions.create(aSession())).id)
  while (received.length === 0) await pause(5)

  const begun = performance.now()
  await close()

  expect(performance.now() - begun).toBeLessThan(1_000)
})
