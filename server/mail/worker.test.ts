import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { outbox } from '../db/schema/mail.ts'
import { anOrder } from '../testing/builders.ts'
import { startApp, type TestApp } from '../testing/start-app.ts'
import { until } from '../testing/until.ts'

async function paidOrder(app: TestApp) {
  const store = app.make.store({
    items: [
      { code: '1204', name: 'Sweet corn chowder', contains: ['milk'], mayContain: ['wheat'] },
      {
        code: '6521',
        name: 'Oat and cherry cookie dough',
        contains: ['wheat', 'egg'],
        storage: 'frozen_raw_dough',
        priceCents: 2000,
      },
    ],
  })
  const mother = app.make.user({ name: 'Karin' })
  app.make.guardian(store.seller, mother.id)
  const lines = [
    { itemCode: '1204', quantity: 2 },
    { itemCode: '6521', quantity: 1 },
  ]
  const reply = await app.api.post(
    `/api/stores/${store.token}/orders`,
    anOrder({ lines, quotedTotalCents: 5200 }),
    {
      'Idempotency-Key': `key-${Math.random()}`,
    },
  )
  await app.fakes.pay(/cs_[A-Za-z0-9_]+/.exec(reply.body.payUrl)![0])
  await until(() => app.deps.db.orm.select().from(outbox).all().length === 2)
  return {
    store,
    mother,
    number: reply.body.orderNumber as string,
    receiptUrl: reply.body.receiptUrl as string,
  }
}

const receiptRow = (app: TestApp) =>
  app.deps.db.orm.select().from(outbox).where(eq(outbox.kind, 'receipt')).get()!

test('the receipt arrives with everything a customer needs to know', async () => {
  const app = await startApp()
  const paid = await paidOrder(app)

  await app.sendMail()

  const mail = (await app.fakes.mailbox()).find(message => message.to === 'ruth@example.com')!
  for (const part of [mail.text, mail.html]) {
    for (const said of [
      'Sweet corn chowder',
      'Oat and cherry cookie dough',
      paid.number,
      'Maya L.',
      paid.receiptUrl,
      'Contains',
      'allergens',
      '0 °F',
      '−18 °C',
      'raw dough',
      'December 17',
    ])
      expect(part, said).toContain(said)
  }
  expect(mail.text).toContain('$52.00')
  expect(receiptRow(app)).toMatchObject({ state: 'sent', response: expect.stringMatching(/^250/) })
})

test('the guardian is told who ordered what, and never the e-mail address', async () => {
  const app = await startApp()
  const paid = await paidOrder(app)

  await app.sendMail()

  const mail = (await app.fakes.mailbox()).find(message => message.to === paid.mother.email)!
  expect(mail.subject).toContain('Ruth Lindqvist')
  expect(mail.text).toContain("I don't know this person")
  expect(mail.text).toMatch(/3 items/)
  expect(mail.text + mail.html).not.toContain('ruth@example.com')
})

test('a mail server that puts letters off gets them later, once each', async () => {
  const app = await startApp()
  await paidOrder(app)
  await app.fakes.behaveMail({ refuseNext: 2 })

  await app.sendMail()
  expect(await app.fakes.mailbox()).toEqual([])
  app.clock.forward(60_000)
  await app.sendMail()

  expect((await app.fakes.mailbox()).map(message => message.to).sort()).toHaveLength(2)
  expect(receiptRow(app)).toMatchObject({ state: 'sent', attempts: 2 })
})

test('a connection that breaks in the middle leaves no half letter', async () => {
  const app = await startApp()
  await paidOrder(app)
  await app.fakes.behaveMail({ dropConnectionNext: 1 })

  await app.sendMail()
  app.clock.forward(60_000)
  await app.sendMail()

  const to = (await app.fakes.mailbox()).map(message => message.to)
  expect(to.filter(address => address === 'ruth@example.com')).toHaveLength(1)
})

test('a refusal for good is left for staff and not tried again', async () => {
  const app = await startApp()
  await paidOrder(app)
  await app.fakes.behaveMail({ rejectNext: 2 })

  await app.sendMail()
  app.clock.forward(48 * 3_600_000)
  await app.sendMail()

  expect(await app.fakes.mailbox()).toEqual([])
  expect(receiptRow(app)).toMatchObject({ state: 'failed', attempts: 1 })
})

test('a letter whose sender died is sent by the next after a minute, under the same id', async () => {
  const app = await startApp()
  await paidOrder(app)
  app.deps.db.raw.exec(
    `update outbox set state = 'sending', attempts = 1, lease_until = ${app.clock.now() + 60_000}`,
  )

  await app.sendMail()
  expect(await app.fakes.mailbox()).toEqual([])
  app.clock.forward(61_000)
  await app.sendMail()

  const mail = (await app.fakes.mailbox()).find(message => message.to === 'ruth@example.com')!
  expect(mail.headers['message-id']).toContain(receiptRow(app).messageId)
})
