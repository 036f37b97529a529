import { demoLinks } from '../server/demo/demo-ids.ts'
import { expect, expectAccessible, fillDetails, payByCard, test } from './support.ts'

const who = { name: 'Walter Grimshaw', email: 'walter@example.com', knows: 'Neighbor' }

test('coming back without paying, reloading and a second tab all keep the order', async ({ open, stack }) => {
  const page = await open()
  const store = `${stack.url}/s/${demoLinks.anh}`
  await page.goto(store)
  await page.getByRole('button', { name: 'Add Sweet corn chowder' }).click()
  await fillDetails(page, who)
  await page.getByRole('button', { name: /^Pay \$/ }).click()
  await page.waitForURL(url => url.origin === stack.payments)
  await page.getByRole('link', { name: /back/i }).first().click()

  await expect(page.getByText('You came back without paying')).toBeVisible()
  await expectAccessible(page)
  await page.reload()
  await expect(page.getByRole('button', { name: 'Pay $16.00' })).toBeVisible()
  const tab = await page.context().newPage()
  await tab.goto(store)
  await tab.getByRole('button', { name: 'One Sweet corn chowder more' }).first().click()
  await expect(page.getByRole('button', { name: 'Pay $32.00' })).toBeVisible()
})

test('a declined card is said calmly, and another one pays the same order', async ({ open, stack }) => {
  const page = await open()
  await page.goto(`${stack.url}/s/${demoLinks.anh}`)
  await page.getByRole('button', { name: 'Add Oat and cherry cookie dough' }).click()
  await fillDetails(page, who)
  await page.getByRole('button', { name: /^Pay \$/ }).click()
  await payByCard(page, '4000 0000 0000 0002')
  await expect(page.getByText(/declined/i).first()).toBeVisible()
  await payByCard(page)
  await expect(page.getByRole('heading', { name: /Your order is paid/ })).toBeVisible()
})

test('an order that was not paid in time says so, and the pad is kept', async ({ open, stack }) => {
  const page = await open()
  await page.goto(`${stack.url}/s/${demoLinks.anh}`)
  await page.getByRole('button', { name: 'Add Seeded country loaf' }).click()
  await fillDetails(page, who)
  await page.getByRole('button', { name: /^Pay \$/ }).click()
  await page.waitForURL(url => url.origin === stack.payments)
  const session = /cs_[A-Za-z0-9_]+/.exec(page.url())![0]
  const sessions = await (await fetch(`${stack.payments}/_test/sessions`)).json()
  const receipt = sessions.find((made: { id: string }) => made.id === session).success_url as string
  await page.goto(receipt)
  await expect(page.getByRole('heading', { name: 'This order is waiting for its payment.' })).toBeVisible()
  await expect(page.getByRole('link', { name: 'Go on to the payment page' })).toBeVisible()
  await expectAccessible(page)
  await fetch(`${stack.payments}/_test/sessions/${session}/expire`, { method: 'POST' })

  await expect(page.getByRole('heading', { name: 'This order was not paid in time.' })).toBeVisible()
  await page.getByRole('link', { name: 'Back to the store' }).click()
  await expect(page.getByRole('button', { name: 'One Seeded country loaf more' }).first()).toBeVisible()
})

test('what is missing is named at its field, and the first of them gets the focus', async ({
  open,
  stack,
}) => {
  const page = await open()
  await page.goto(`${stack.url}/s/${demoLinks.zoe}`)
  await page.getByRole('button', { name: 'Add Sweet corn chowder' }).click()
  await page.getByLabel('Your e-mail').fill('ruth@example')
  await page.getByRole('button', { name: /^Pay \$/ }).click()

  await expect(page.getByLabel('Your name')).toBeFocused()
  await expect(page.getByLabel('Your name')).toHaveAccessibleDescription(/Please write your name/)
  await expect(page.getByLabel('Your e-mail')).toHaveAccessibleDescription(/Please check this e-mail address/)
  await expect(page.getByLabel(/How do you know/)).toHaveAccessibleDescription(/Please choose one/)
  await expectAccessible(page)
})

test('taking an item off can be undone; a network that is away loses nothing', async ({ open, stack }) => {
  const page = await open()
  await page.goto(`${stack.url}/s/${demoLinks.zoe}`)
  await page.getByRole('button', { name: 'Add Butter knot rolls' }).click()
  await page.getByRole('button', { name: 'Take Butter knot rolls off' }).click()
  await page.getByRole('button', { name: 'Put it back' }).click()
  await fillDetails(page, { name: 'Uncle Bjorn', email: 'bjorn@example.com', knows: 'Other relative' })
  await page.route('**/orders', route => route.abort())
  const pay = page.getByRole('button', { name: /^Pay \$/ })
  await pay.click()
  await expect(page.getByText(/your order is kept here/)).toBeVisible()
  await page.unroute('**/orders')

  await pay.click()
  await page.waitForURL(url => url.origin === stack.payments)
})
