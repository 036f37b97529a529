import { expect, test } from 'vitest'
import { aSession, pause, startForTest } from './start-for-test.ts'

const NOW = Date.parse('2026-11-20T15:00:00Z')
const GOOD = { number: '4242 4242 4242 4242', expiry: '08/30', code: '123', name: 'Ruth Okafor' }

async function openPage(changes: Parameters<typeof aSession>[0] = {}) {
  const fake = await startForTest({ now: () => NOW })
  const session = await fake.stripe.checkout.sessions.create(
    aSession({ expires_at: NOW / 1000 + 1_860, ...changes }),
  )
  return {
    ...fake,
    session,
    get: (headers = {}) => fetch(session.url!, { headers }),
    fill: (typed: Record<string, string>) =>
      fetch(session.url!, { method: 'POST', redirect: 'manual', body: new URLSearchParams(typed) }),
  }
}

test('the page says that it is a stand-in, what is paid, and leads back to the store', async () => {
  const { get, session } = await openPage()

  const answer = await get()
  const page = await answer.text()

  expect(answer.status).toBe(200)
  expect(page).toContain('<html lang="en">')
  expect(page).toContain('charges nobody')
  for (const label of ['Card number', 'Expiry', 'Security code', 'Name on card'])
    expect(page).toMatch(new RegExp(`<label for="\\w+">${label}</label>`))
  expect(page).toContain('<button type="submit">Pay $57.00</button>')
  expect(page).toContain(`<a href="${session.cancel_url}">Go back to the store</a>`)
  expect(page).toContain('2 × Barley soup')
  expect(page).toContain('This page closes in 31 minutes.')
  expect(page).not.toContain('<script')
})

test('a good card leads to the store with the id of the page filled in', async () => {
  const { fill, session, stripe } = await openPage()

  const answer = await fill(GOOD)
  const then = await stripe.checkout.sessions.retrieve(session.id)

  expect(answer.status).toBe(303)
  expect(answer.headers.get('location')).toBe(`http://localhost:4310/r/abc?session=${session.id}`)
  expect(then).toMatchObject({ status: 'complete', customer_details: { name: 'Ruth Okafor' } })
})

test('the browser is let through to the store after the form', async () => {
  const { get } = await openPage()
  const policy = (await get()).headers.get('content-security-policy')
  expect(policy).toContain("form-action 'self' http://localhost:4310")
  expect(policy).toContain("default-src 'none'")
})

test.each([
  ['4000000000000002', 402, 'Try another card, or ask the bank'],
  ['4000000000009995', 402, 'not enough money on this card'],
  ['4000000000000069', 422, 'This card has expired'],
  ['4000000000000127', 422, 'The security code does not match'],
  ['4000000000000119', 402, 'could not be processed just now'],
  ['4242424242424241', 422, 'a digit is wrong or missing'],
])('%s is refused in plain words and the form stays filled in', async (number, status, words) => {
  const { fill, session, stripe } = await openPage()

  const answer = await fill({ ...GOOD, number })
  const page = await answer.text()

  expect(answer.status).toBe(status)
  expect(page).toContain(words)
  expect(page).toContain('<title>Not paid yet: Pay $57.00')
  for (const value of [number, '08/30', '123', 'Ruth Okafor']) expect(page).toContain(`value="${value}"`)
  expect(page.match(/autofocus/g)).toHaveLength(1)
  expect((await stripe.checkout.sessions.retrieve(session.id)).status).toBe('open')
})

test('every field that is missing or wrong is named at once, and nothing is tried', async () => {
  const { fill, session, stripe } = await openPage()

  const page = await (await fill({ number: '', expiry: '10/26', code: '12', name: ' ' })).text()

  for (const words of ['Type the card number', 'in the past', 'three or four digits', 'Type the name'])
    expect(page).toContain(words)
  expect(page.match(/aria-invalid="true"/g)).toHaveLength(4)
  expect((await stripe.checkout.sessions.retrieve(session.id)).payment_intent).toBeNull()
})

test('a card is good to the end of its month', async () => {
  const { fill } = await openPage()
  expect((await fill({ ...GOOD, expiry: '11 / 2026' })).status).toBe(303)
})

test('a number that could be a real card is refused, not shown again and not kept', async () => {
  const { fill, stripe, session, door } = await openPage()

  const page = await (await fill({ ...GOOD, number: '4539578763621486' })).text()

  expect(page).toContain('Only demonstration numbers work here')
  expect(page).not.toContain('4539578763621486')
  expect(page).not.toContain('value="123"')
  expect((await stripe.checkout.sessions.retrieve(session.id)).status).toBe('open')
  expect(JSON.stringify((await door('GET', '/sessions')).body)).not.toContain('4539578763621486')
})

test('what was typed is written out as text, never as markup', async () => {
  const { fill } = await openPage({
    line_items: [
      {
        quantity: 1,
        price_data: { currency: 'usd', unit_amount: 900, product_data: { name: '<b>Soup</b>' } },
      },
    ],
  })
  const page = await (await fill({ ...GOOD, code: '1', name: '"><script>x</script>' })).text()
  expect(page).not.toContain('<script>')
  expect(page).not.toContain('<b>Soup')
  expect(page).toContain('&lt;b&gt;Soup')
})

test('a page in Spanish', async () => {
  const { get, fill } = await openPage({ locale: 'es' })

  const page = await (await get()).text()
  const refused = await (await fill({ ...GOOD, number: '4000000000000002' })).text()

  expect(page).toContain('<html lang="es">')
  for (const words of [
    'Número de tarjeta',
    'Vencimiento',
    'Código de seguridad',
    'Pagar $57.00',
    'Volver a la tienda',
  ])
    expect(page).toContain(words)
  expect(refused).toContain('La tarjeta fue rechazada')
})

test('without a locale the browser’s own language is spoken', async () => {
  const { get } = await openPage({ locale: 'auto' })
  expect(await (await get({ 'accept-language': 'es-MX,es;q=0.9' })).text()).toContain('Pagar $57.00')
  expect(await (await get({ 'accept-language': 'fr' })).text()).toContain('Pay $57.00')
})

test('a paid page says so and leads to the receipt; pressing Pay again leads there too', async () => {
  const { get, fill, pay, session } = await openPage()
  await pay(session.id)

  const page = await (await get()).text()
  const again = await fill(GOOD)

  expect(page).toContain('This order is paid')
  expect(page).toContain(`href="http://localhost:4310/r/abc?session=${session.id}"`)
  expect(page).not.toContain('<form')
  expect(again.status).toBe(303)
})

test('an expired page says so, leads back to the store and takes no money', async () => {
  const { get, fill, setClock, session } = await openPage()
  await setClock(NOW + 1_860_000)

  const page = await (await get()).text()
  const late = await (await fill(GOOD)).text()

  expect(page).toContain('This payment page has expired')
  expect(page).toContain(`href="${session.cancel_url}"`)
  expect(late).toContain('Nothing was charged')
})

test('an unknown page is not found', async () => {
  const { url } = await startForTest()
  const answer = await fetch(`${url}/pay/cs_test_none`)
  expect(answer.status).toBe(404)
  expect(await answer.text()).toContain('There is no payment page here')
})

test('paying twice at once takes the money once', async () => {
  const { fill, door } = await openPage()

  const answers = await Promise.all([fill(GOOD), fill(GOOD), fill(GOOD)])
  await pause(20)

  expect(answers.map(answer => answer.status)).toEqual([303, 303, 303])
  expect((await door('GET', '/events')).body).toHaveLength(1)
})
