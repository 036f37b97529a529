import { demoLinks } from '../server/demo/demo-ids.ts'
import {
  desktop,
  expect,
  expectAccessible,
  fillDetails,
  payByCard,
  phone,
  readMail,
  signIn,
  test,
} from './support.ts'

for (const [device, options] of [
  ['phone', phone],
  ['desktop', desktop],
] as const)
  test(`on a ${device} a grandmother orders from Maya’s link, pays, and everybody learns of it`, async ({
    open,
    stack,
  }) => {
    const mother = await open()
    await signIn(mother, stack, 'karin.lindqvist@example.com')
    await mother.getByRole('link', { name: 'Maya Lindqvist' }).click()
    const sold = mother.getByText(/items? sold/)
    const before = Number.parseInt((await sold.textContent()) ?? '', 10)
    await expectAccessible(mother)
    const page = await open(options)
    await page.goto(`${stack.url}/s/${demoLinks.maya}`)

    await expect(page.getByRole('heading', { level: 1 })).toContainText(
      'regional trip for Saltmarsh High Robotics',
    )
    await expect(page.getByText(/brought by Maya's family/)).toBeVisible()
    await expectAccessible(page)
    await page.getByRole('button', { name: 'Add Sweet corn chowder' }).click()
    await page.getByRole('button', { name: 'Add Oat and cherry cookie dough' }).click()
    if (device === 'phone') await page.getByRole('button', { name: 'See your order' }).click()
    const pad =
      device === 'phone' ? page.getByRole('dialog') : page.getByRole('complementary', { name: 'Your order' })
    await pad.getByRole('button', { name: 'One Sweet corn chowder more' }).click()
    await pad.getByLabel(/Gift to Saltmarsh/).fill('5.00')
    await pad.getByLabel(/for the card fee/).check()
    await fillDetails(page, {
      name: `Ruth on a ${device}`,
      email: `ruth.${device}@example.com`,
      knows: 'Grandparent',
    })
    await expectAccessible(page)
    await pad.getByRole('button', { name: /^Pay \$/ }).click()

    await page.waitForURL(url => url.origin === stack.payments)
    await expectAccessible(page)
    await payByCard(page)
    await expect(page.getByRole('heading', { name: /Your order is paid/ })).toBeVisible()
    await expect(page.getByText('Maya L. is credited with 3 items.')).toBeVisible()
    await expectAccessible(page)

    const receipt = await readMail(stack, `ruth.${device}@example.com`, /Your order/)
    for (const said of [
      'Sweet corn chowder',
      'Oat and cherry cookie dough',
      'Contains',
      'allergens',
      '0 °F',
      '−18 °C',
      'raw dough',
    ])
      expect(receipt.text).toContain(said)
    await expect(mother.getByText(`Ruth on a ${device}`)).toBeVisible()
    await expect(sold).toContainText(`${before + 3} items sold`)
    const notice = await readMail(stack, 'karin.lindqvist@example.com', new RegExp(`Ruth on a ${device}`))
    expect(notice.text).toContain("I don't know this person")
    expect(notice.text).not.toContain(`ruth.${device}@example.com`)

    // What was paid is off the pad; the name stays for the next order.
    await page.goto(`${stack.url}/s/${demoLinks.maya}`)
    await expect(page.getByRole('button', { name: 'Add Sweet corn chowder' })).toBeVisible()
  })

test('the lead sees an order within two seconds of its payment, and gives back one line of three', async ({
  open,
  stack,
}) => {
  const lead = await open()
  await signIn(lead, stack, 'n.abara@saltmarsh.example.org')
  await expectAccessible(lead)
  await lead.getByRole('link', { name: 'Orders', exact: true }).click()
  await lead.getByLabel(/Search by name/).fill('Bo Three-Lines')
  await expect(lead.getByText('No orders')).toBeVisible()
  const page = await open()
  await page.goto(`${stack.url}/s/${demoLinks.zoe}`)
  for (const item of ['Sweet corn chowder', 'Apple and cardamom hand pies', 'Oat and cherry cookie dough'])
    await page.getByRole('button', { name: `Add ${item}` }).click()
  await fillDetails(page, { name: 'Bo Three-Lines', email: 'bo@example.com', knows: 'Neighbor' })
  await page.getByRole('button', { name: /^Pay \$/ }).click()
  await payByCard(page)
  await expect(page.getByRole('heading', { name: /Your order is paid/ })).toBeVisible()
  const paidAt = Date.now()

  await expect(lead.getByText('Bo Three-Lines')).toBeVisible({ timeout: 2_000 })
  expect(Date.now() - paidAt).toBeLessThan(2_000)
  await expectAccessible(lead)
  await lead.getByRole('link', { name: /^[0-9A-Z]{4}-[0-9A-Z]{4}$/ }).click()
  await expectAccessible(lead)
  await lead.getByRole('button', { name: 'Cancel or refund' }).click()
  await lead.getByRole('radio', { name: /Some lines/ }).check()
  await lead.getByRole('button', { name: 'One Apple and cardamom hand pies more' }).click()
  await lead.getByLabel('Why').fill('Out of stock')
  await expectAccessible(lead)
  await lead.getByRole('button', { name: 'Give back $18.00' }).click()

  await expect(lead.getByText('On its way to the card')).toBeVisible()
  const letter = await readMail(stack, 'bo@example.com', /goes back to your card/)
  expect(letter.text).toContain('Apple and cardamom hand pies')
  await page.reload()
  await expect(page.getByText('1 refunded')).toBeVisible()
})
