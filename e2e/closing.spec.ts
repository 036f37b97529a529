import { test as base, expect } from 'playwright/test'
import { demoLinks } from '../server/demo/demo-ids.ts'
import { type Stack, startStack } from './stack.ts'
import { desktop, expectAccessible, fillDetails, payByCard } from './support.ts'

/** The change to standard time lies between the seeding and the close: 11:59 pm on 1 November 2026 in New York. */
const SEEDED = '2026-10-24T16:00:00Z'
const CLOSE = '2026-11-02T05:00:00Z'
const secondsBeforeClose = (seconds: number) => new Date(Date.parse(CLOSE) - seconds * 1000).toISOString()

const test = base.extend<{ stack: Stack }>({
  // biome-ignore lint/correctness/noEmptyPattern: the runner reads the pattern of the first argument
  stack: async ({}, use) => {
    const stack = await startStack({ seededAt: SEEDED, now: secondsBeforeClose(14) })
    await use(stack)
    await stack.stop()
  },
})

test('the store closes by the clock, after the change to standard time; who ordered in time may still pay', async ({
  browser,
  stack,
}) => {
  test.setTimeout(90_000)
  const drive = async () => (await (await fetch(`${stack.url}/api/stores/${demoLinks.maya}`)).json()).drive
  expect((await drive()).closesAt).toBe('2026-11-02T05:00:00.000Z')
  const context = await browser.newContext(desktop)
  const page = await context.newPage()
  await page.goto(`${stack.url}/s/${demoLinks.maya}`)
  await expect(page.getByText('The store closes at Sunday, November 1, 11:59 pm')).toBeVisible()
  await page.getByRole('button', { name: 'Add Sweet corn chowder' }).click()
  await fillDetails(page, { name: 'Papa Joe', email: 'joe@example.com', knows: 'Grandparent' })
  await page.getByRole('button', { name: /^Pay \$/ }).click()
  await page.waitForURL(url => url.origin === stack.payments)
  const watcher = await (await browser.newContext(desktop)).newPage()
  await watcher.goto(`${stack.url}/s/${demoLinks.zoe}`)

  await expect.poll(async () => (await drive()).status, { timeout: 30_000 }).toBe('closed')
  await expect(watcher.getByText('This store has closed')).toBeVisible({ timeout: 40_000 })
  await expectAccessible(watcher)
  const late = await fetch(`${stack.url}/api/stores/${demoLinks.maya}/orders`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json', 'Idempotency-Key': 'too-late-by-seconds' },
    body: JSON.stringify({
      lines: [{ itemCode: '1204', quantity: 1 }],
      giftCents: 0,
      coverFee: false,
      quotedTotalCents: 1600,
      customer: { name: 'Late', email: 'late@example.com', relationship: 'friend' },
      locale: 'en',
    }),
  })
  expect(late.status).toBe(409)
  expect((await late.json()).code).toBe('store_closed')

  await payByCard(page)
  await expect(page.getByRole('heading', { name: /Your order is paid/ })).toBeVisible()
})
