import { expect, expectAccessible, readMail, signIn, test } from './support.ts'

test('a wrong password is said calmly, and a desk leads to the door and back', async ({ open, stack }) => {
  const page = await open()
  await page.goto(`${stack.url}/family`)
  await expect(page).toHaveURL(/sign-in\?next=/)
  await page.getByLabel('E-mail', { exact: true }).fill('sean.obrien@example.com')
  await page.getByLabel('Password', { exact: true }).fill('not the password')
  await page.getByRole('button', { name: 'Sign in', exact: true }).click()
  await expect(page.getByText('E-mail and password do not fit together')).toBeVisible()
  await expectAccessible(page)
})

test('a family signs in by a mailed link, which works once and only by its button', async ({
  open,
  stack,
}) => {
  const page = await open()
  await page.goto(`${stack.url}/sign-in`)
  await page.getByLabel('E-mail', { exact: true }).fill('karin.lindqvist@example.com')
  await page.getByRole('button', { name: 'Mail me a link' }).click()
  const letter = await readMail(stack, 'karin.lindqvist@example.com', /link to sign in/)
  const link = /http:\/\/localhost:\d+\/sign-in\/link#\S+/.exec(letter.text)![0]
  // A scanner that follows the link uses nothing up.
  await fetch(link)

  await page.goto(link)
  await page.getByRole('button', { name: 'Sign in now' }).click()
  await expect(page.getByRole('link', { name: 'Maya Lindqvist' })).toBeVisible()
  await expectAccessible(page)
  const again = await open()
  await again.goto(link)
  await again.getByRole('button', { name: 'Sign in now' }).click()
  await expect(again.getByText(/was used already/)).toBeVisible()
})

test('a clerk sees the operator desk and ends the session', async ({ open, stack }) => {
  const page = await open()
  await signIn(page, stack, 'odile.marsh@frostbell.example.com')
  await expect(page.getByRole('heading', { name: 'Fundraisers by stage' })).toBeVisible()
  await expectAccessible(page)
  await page.getByText('Odile Marsh').click()
  await page.getByRole('button', { name: 'Sign out', exact: true }).click()
  await expect(page).toHaveURL(/sign-in/)
  await page.goto(`${stack.url}/operator`)
  await expect(page).toHaveURL(/sign-in/)
})
