import { expect, test } from 'vitest'
import { aSession, refusalOf, startForTest } from './start-for-test.ts'

// "Idempotent requests" of the payment service's API reference: what is remembered, refused and forgotten.
const NOW = Date.parse('2026-11-20T15:00:00Z')
const KEY = { idempotencyKey: 'order_1' }

test('the same key and parameters give the first page again, whenever it is asked within a day', async () => {
  const { stripe, door, setClock } = await startForTest({ now: () => NOW })
  const params = aSession({ expires_at: NOW / 1000 + 1_860 })
  const first = await stripe.checkout.sessions.create(params, KEY)

  await setClock(NOW + 24 * 3_600_000 - 1)
  const again = await stripe.checkout.sessions.create(params, KEY)

  expect(again.id).toBe(first.id)
  expect(again.status).toBe('open')
  expect(again.lastResponse.headers['idempotent-replayed']).toBe('true')
  expect((await door('GET', '/sessions')).body).toHaveLength(1)
})

test('other parameters under the same key are refused, and so is another endpoint', async () => {
  const { stripe } = await startForTest()
  const session = await stripe.checkout.sessions.create(aSession(), KEY)

  const other = await refusalOf(stripe.checkout.sessions.create(aSession({ locale: 'es' }), KEY))
  const elsewhere = await refusalOf(stripe.checkout.sessions.expire(session.id, {}, KEY))

  expect(other).toMatchObject({ statusCode: 400, rawType: 'idempotency_error' })
  expect(elsewhere).toMatchObject({ statusCode: 400, rawType: 'idempotency_error' })
})

test('while the first call is under way a second one with its key is turned away', async () => {
  const { stripe, behave, door } = await startForTest()
  await behave({ latencyMs: 150 })

  const tries = await Promise.allSettled([
    stripe.checkout.sessions.create(aSession(), KEY),
    stripe.checkout.sessions.create(aSession(), KEY),
  ])
  const refused = tries.find(attempt => attempt.status === 'rejected')
  const later = await stripe.checkout.sessions.create(aSession(), KEY)

  expect(refused?.reason).toMatchObject({ statusCode: 409, code: 'idempotency_key_in_use' })
  expect((await door('GET', '/sessions')).body.map((session: { id: string }) => session.id)).toEqual([
    later.id,
  ])
})

test('a call that fails validation is not remembered', async () => {
  const { stripe } = await startForTest()

  await refusalOf(stripe.checkout.sessions.create(aSession({ customer_email: 'ruth' }), KEY))

  expect((await stripe.checkout.sessions.create(aSession(), KEY)).status).toBe('open')
})

test('a refusal met while carrying the call out is given again', async () => {
  const { stripe, pay } = await startForTest()
  const session = (await pay((await stripe.checkout.sessions.create(aSession())).id)).body
  const params = { payment_intent: session.payment_intent as string, amount: 9_900 }

  const first = await refusalOf(stripe.refunds.create(params, KEY))
  const again = await refusalOf(stripe.refunds.create(params, KEY))

  expect(first.code).toBe('amount_too_large')
  expect(again.code).toBe('amount_too_large')
  expect(again.headers?.['idempotent-replayed']).toBe('true')
})

test('a 500 in the midst of the work is given again, and the work was not done', async () => {
  const { stripe, behave, door } = await startForTest()
  await behave({ breakNextCalls: 1 })

  const first = await refusalOf(stripe.checkout.sessions.create(aSession(), KEY))
  const again = await refusalOf(stripe.checkout.sessions.create(aSession(), KEY))

  expect([first.statusCode, again.statusCode]).toEqual([500, 500])
  expect((await door('GET', '/sessions')).body).toEqual([])
})

test('an outage at the front door leaves nothing behind: the same key works afterwards', async () => {
  const { stripe, behave } = await startForTest()
  await behave({ failNextCalls: 2, failStatus: 503 })

  const tries = [
    await refusalOf(stripe.checkout.sessions.create(aSession(), KEY)),
    await refusalOf(stripe.checkout.sessions.create(aSession(), KEY)),
  ]

  expect(tries.map(attempt => attempt.statusCode)).toEqual([503, 503])
  expect((await stripe.checkout.sessions.create(aSession(), KEY)).status).toBe('open')
})

test.each(['loseNextAnswers', 'truncateNextAnswers'])(
  '%s: the page exists, and its key brings it back',
  async name => {
    const { stripe, behave, door } = await startForTest()
    // The SDK itself tries once more when a connection is closed on it, so two answers go missing.
    await behave({ [name]: 2 })
    const lost = await refusalOf(stripe.checkout.sessions.create(aSession(), KEY))
    await behave({ [name]: 0 })

    const found = await stripe.checkout.sessions.create(aSession(), KEY)

    expect(lost.type).toBe('StripeConnectionError')
    expect((await door('GET', '/sessions')).body.map((session: { id: string }) => session.id)).toEqual([
      found.id,
    ])
  },
)

test('after a day a key is forgotten and makes another page', async () => {
  const { stripe, setClock } = await startForTest({ now: () => NOW })
  const first = await stripe.checkout.sessions.create(aSession(), KEY)

  await setClock(NOW + 24 * 3_600_000)
  const second = await stripe.checkout.sessions.create(aSession(), KEY)

  expect(second.id).not.toBe(first.id)
})

test('keys are known after a restart', async () => {
  const before = await startForTest()
  const first = await before.stripe.checkout.sessions.create(aSession(), KEY)
  await before.close()

  const after = await startForTest({ dataDir: before.dataDir })

  expect((await after.stripe.checkout.sessions.create(aSession(), KEY)).id).toBe(first.id)
})

test('a key of 256 characters is too long', async () => {
  const { stripe } = await startForTest()
  const refusal = await refusalOf(
    stripe.checkout.sessions.create(aSession(), { idempotencyKey: 'k'.repeat(256) }),
  )
  expect(refusal.statusCode).toBe(400)
})
