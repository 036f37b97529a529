import { demoLinks } from '../server/demo/demo-ids.ts'
import { expect, expectAccessible, phone, test } from './support.ts'

test.describe('a link shows where its store stands', () => {
  for (const [state, token, said] of [
    ['not open yet', demoLinks.notOpen, /^Opens /],
    ['paused', demoLinks.paused, 'This store is paused'],
    ['closed', demoLinks.closed, 'This store has closed'],
    ['unknown', 'AAAAAAAAAAAAAAAAAAAAAA', 'There is nothing at this address'],
  ] as const)
    test(`${state}`, async ({ open, stack }) => {
      const page = await open(phone)
      const answer = await page.goto(`${stack.url}/s/${token}`)
      expect(answer?.status()).toBe(state === 'unknown' ? 404 : 200)
      await expect(page.getByText(said).first()).toBeVisible()
      await expect(page.getByRole('button', { name: /^(Add|Pay)/ })).toHaveCount(0)
      await expectAccessible(page)
    })

  test('a group’s link is credited to the group', async ({ open, stack }) => {
    const page = await open()
    await page.goto(`${stack.url}/s/${demoLinks.group}`)
    await expect(page.getByRole('img', { name: 'Chassis' })).toBeVisible()
    await expect(page.getByText(/handed over at the school/)).toBeVisible()
    await expectAccessible(page)
  })
})

test('a preview names the seller as the public may know them, and nothing may be indexed', async ({
  open,
  stack,
}) => {
  const page = await open()
  const answer = await page.goto(`${stack.url}/s/${demoLinks.maya}`)
  await expect(page).toHaveTitle("Maya L.'s store for Saltmarsh High Robotics")
  await expect(page.locator('meta[property="og:title"]')).toHaveAttribute(
    'content',
    "Maya L.'s store for Saltmarsh High Robotics",
  )
  await expect(page.locator('meta[name="robots"]')).toHaveAttribute('content', /noindex/)
  expect(answer?.headers()['x-robots-tag']).toContain('noindex')
  expect(await answer?.text()).not.toContain('Lindqvist')
})

test('without JavaScript catalog, prices, allergens and deadline can be read, and how to order on paper', async ({
  open,
  stack,
}) => {
  const page = await open({ ...phone, javaScriptEnabled: false })
  await page.goto(`${stack.url}/s/${demoLinks.maya}`)
  await expect(page.getByText('Sweet corn chowder').first()).toBeVisible()
  await expect(page.getByText('$16.00').first()).toBeVisible()
  await expect(page.getByText(/Contains: Milk\./).first()).toBeVisible()
  await expect(page.getByText(/11:59 pm/).first()).toBeVisible()
  await expect(page.getByText(/paper order form/)).toBeVisible()
})

test('at 320 pixels nothing has to be scrolled sideways', async ({ open, stack }) => {
  const page = await open({ viewport: { width: 320, height: 640 } })
  await page.goto(`${stack.url}/s/${demoLinks.maya}`)
  await page.getByRole('button', { name: 'Add Sweet corn chowder' }).click()
  await page.getByRole('button', { name: 'See your order' }).click()
  const tooWide = await page.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  )
  expect(tooWide).toBeLessThanOrEqual(0)
})

test('who looks from another zone reads the deadline on their own clock as well', async ({ open, stack }) => {
  const page = await open({ timezoneId: 'America/Los_Angeles' })
  await page.goto(`${stack.url}/s/${demoLinks.maya}`)
  await expect(page.getByText(/8:59 pm where you are/)).toBeVisible()
  const near = await open()
  await near.goto(`${stack.url}/s/${demoLinks.maya}`)
  await expect(near.getByText(/11:59 pm/).first()).toBeVisible()
  await expect(near.getByText(/where you are/)).toHaveCount(0)
})
