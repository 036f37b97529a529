import { demoLinks } from '../server/demo/demo-ids.ts'
import { expect, expectAccessible, fillDetails, payByCard, phone, readMail, signIn, test } from './support.ts'

test('a parent replaces a leaked link while an order is being paid, and flags whom they do not know', async ({
  open,
  stack,
}) => {
  const parent = await open(phone)
  await signIn(parent, stack, 'maeve.obrien@example.com')
  await expect(parent.getByRole('heading', { name: 'Credited orders' })).toBeVisible()
  await expect(parent.getByRole('img', { name: 'QR code of the store link' })).toBeVisible()
  await expectAccessible(parent)
  const page = await open()
  await page.goto(`${stack.url}/s/${demoLinks.zoe}`)
  await page.getByRole('button', { name: 'Add Sweet corn chowder' }).click()
  await fillDetails(page, { name: 'A Stranger', email: 'stranger@example.com', knows: 'In another way' })
  await page.getByRole('button', { name: /^Pay \$/ }).click()
  await page.waitForURL(url => url.origin === stack.payments)

  await parent.getByRole('button', { name: 'Replace the link' }).click()
  await expectAccessible(parent)
  await parent.getByRole('dialog').getByRole('button', { name: 'Replace the link' }).click()
  await expect(parent.getByRole('dialog')).toBeHidden()
  expect((await fetch(`${stack.url}/api/stores/${demoLinks.zoe}`)).status).toBe(404)
  await payByCard(page)
  await expect(page.getByRole('heading', { name: /Your order is paid/ })).toBeVisible()
  await expect(parent.getByText('A Stranger')).toBeVisible()

  const order = parent.getByRole('listitem').filter({ hasText: 'A Stranger' })
  await order.getByRole('button', { name: "I don't know this person" }).click()
  await expect(parent.getByText(/hand over nothing of it/)).toBeVisible()
  await expectAccessible(parent)
  await parent.getByRole('button', { name: 'Tell the organizer' }).click()
  await expect(order.getByText(/Flagged/)).toBeVisible()
  const letter = await readMail(stack, 'n.abara@saltmarsh.example.org', /does not know who placed order/)
  const lead = await open()
  await signIn(lead, stack, 'n.abara@saltmarsh.example.org')
  await lead.goto(/http:\/\/localhost:\d+\/organizer\/\S+/.exec(letter.text)![0])
  await expect(lead.getByRole('heading', { name: 'Flagged by the family' })).toBeVisible()
  await lead.getByRole('button', { name: 'Move to the right seller' }).click()
  await lead.getByLabel('Number of the right seller').fill('102')
  await lead.getByRole('dialog').getByLabel('Why').fill('He knows Andre')
  await expectAccessible(lead)
  await lead.getByRole('button', { name: 'Move the order' }).click()
  await expect(lead.getByText('Settled: moved to the right seller.')).toBeVisible()
})

test('a paused store says so to customers and opens again', async ({ open, stack }) => {
  const parent = await open()
  await signIn(parent, stack, 'karin.lindqvist@example.com')
  await parent.getByRole('link', { name: 'Nils Lindqvist' }).click()
  await parent.getByRole('button', { name: 'Pause the link' }).click()
  await expect(parent.getByText(/people see that the store is paused/)).toBeVisible()
  const url = (await parent.getByRole('link', { name: /\/s\// }).getAttribute('href'))!
  const page = await open()
  await page.goto(url)
  await expect(page.getByText('This store is paused')).toBeVisible()

  await parent.getByRole('button', { name: 'Resume the link' }).click()
  await expect(parent.getByText('Live', { exact: true })).toBeVisible()
  await page.reload()
  await expect(page.getByRole('button', { name: 'Add Sweet corn chowder' })).toBeVisible()
})
