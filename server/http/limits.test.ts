import { expect, test } from 'vitest'
import { anOrder } from '../testing/builders.ts'
import { enterPassword } from '../testing/sign-in.ts'
import { startApp } from '../testing/start-app.ts'

test('a thousand guesses from one address find nothing and are put off, while a good link works on from there', async () => {
  const app = await startApp()
  const store = app.make.store()
  const guess = (n: number) => app.api.get(`/api/stores/${String(n).padStart(22, 'A')}`)

  const answers: number[] = []
  for (let n = 0; n < 60; n++) answers.push((await guess(n)).status)

  expect(answers.slice(0, 30).every(status => status === 404)).toBe(true)
  expect(answers.slice(30).every(status => status === 429)).toBe(true)
  expect((await app.api.get(`/api/stores/${store.token}`)).status).toBe(200)
  const order = await app.api.post(`/api/stores/${store.token}/orders`, anOrder(), {
    'Idempotency-Key': 'from-next-door',
  })
  expect(order.status).toBe(201)
})

test('a school behind one address: 600 shoppers look, 60 make mistakes, 60 order, nobody is put off', async () => {
  const app = await startApp()
  const drive = app.make.drive()
  const links = Array.from({ length: 12 }, (_, n) =>
    app.make.link(app.make.seller(drive, { number: 200 + n })),
  )
  const link = (n: number) => links[n % links.length]!.token
  const statuses = new Map<number, number>()
  const count = (status: number) => statuses.set(status, (statuses.get(status) ?? 0) + 1)

  for (let n = 0; n < 600; n++) count((await app.api.get(`/api/stores/${link(n)}`)).status)
  for (let n = 0; n < 60; n++)
    count(
      (
        await app.api.post(`/api/stores/${link(n)}/orders`, anOrder({ quotedTotalCents: 1 }), {
          'Idempotency-Key': `mistake-${n}`,
        })
      ).status,
    )
  for (let n = 0; n < 60; n++)
    count(
      (await app.api.post(`/api/stores/${link(n)}/orders`, anOrder(), { 'Idempotency-Key': `an-order-${n}` }))
        .status,
    )

  expect(Object.fromEntries(statuses)).toEqual({ 200: 600, 409: 60, 201: 60 })
})

test('sixty people of a school sign in from one address; one account is guarded wherever the tries come from', async () => {
  const app = await startApp({ fakes: false })
  const people = Array.from({ length: 60 }, () => app.make.user())
  const statuses = await Promise.all(
    people.map(async person => (await enterPassword(app, person.email, 'a wrong password')).status),
  )
  expect(new Set(statuses)).toEqual(new Set([401]))

  const one = app.make.user()
  const tries = []
  for (let n = 0; n < 12; n++)
    tries.push(
      (
        await app.api.post(
          '/api/auth/sign-in/email',
          { email: one.email, password: `guess number ${n}` },
          { 'X-Forwarded-For': `10.0.0.${n}` },
        )
      ).status,
    )
  expect(tries.slice(0, 10).every(status => status === 401)).toBe(true)
  expect(tries.slice(10)).toEqual([429, 429])
})

test.each(['https://evil.example', 'null', 'http://localhost.evil.example'])(
  'a form of %s uses nobody’s sign-in',
  async origin => {
    const app = await startApp({ fakes: false })
    for (const headers of [
      { Origin: origin, 'Sec-Fetch-Site': 'cross-site' },
      { Origin: origin, 'Sec-Fetch-Site': 'same-site' },
    ] as Record<string, string>[]) {
      const answer = await app.api.request('POST', '/api/sign-out-everywhere', {}, headers)
      expect(answer).toMatchObject({ status: 403, body: { code: 'cross_site' } })
    }
    const bare = await fetch(`${app.url}/api/sign-out-everywhere`, {
      method: 'POST',
      headers: { Cookie: 'tallykin.session_token=x' },
    })
    expect(bare.status).toBe(403)
  },
)
