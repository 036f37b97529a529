import { demoLinks } from '../server/demo/demo-ids.ts'
import { expect, expectAccessible, signIn, test } from './support.ts'

test('a lead moves the close and then closes at once; an open store page learns of it', async ({
  open,
  stack,
}) => {
  const lead = await open()
  await signIn(lead, stack, 'n.abara@saltmarsh.example.org')
  await lead.getByRole('button', { name: 'Close the store now' }).click()
  await expect(lead.getByText(/All 48 stores close at once/)).toBeVisible()
  await expectAccessible(lead)
  await lead.getByLabel('Why').fill('The freezer at the school is full')
  await lead.getByRole('button', { name: 'Close now' }).click()

  await expect(lead.getByText(/^Closed early/)).toBeVisible()
  const page = await open()
  await page.goto(`${stack.url}/s/${demoLinks.maya}`)
  await expect(page.getByText('This store has closed')).toBeVisible()

  await lead.getByRole('button', { name: 'Close at another time' }).click()
  const later = new Date(Date.now() + 5 * 86_400_000).toISOString().slice(0, 10)
  await lead.getByLabel('Day').fill(later)
  await lead.getByLabel('Why').fill('The freezer was repaired')
  await expectAccessible(lead)
  await lead.getByRole('button', { name: 'Move the close' }).click()
  await expect(lead.getByText(/^Open until/)).toBeVisible()
  await page.reload()
  await expect(page.getByRole('button', { name: 'Add Sweet corn chowder' })).toBeVisible()
})
