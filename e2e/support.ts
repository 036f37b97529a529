import AxeBuilder from '@axe-core/playwright'
import { type BrowserContextOptions, test as base, expect, type Page } from 'playwright/test'
import { PASSWORD } from '../server/demo/people.ts'
import { demoCodeFor } from '../server/demo/seed-second-factor.ts'
import { type Stack, startStack } from './stack.ts'

export { expect }

export const phone: BrowserContextOptions = { viewport: { width: 390, height: 844 }, hasTouch: true }
export const desktop: BrowserContextOptions = { viewport: { width: 1440, height: 900 } }

/** One Tallykin for all tests of a worker; each test uses people and links of its own. */
export const test = base.extend<
  { open: (options?: BrowserContextOptions) => Promise<Page> },
  { stack: Stack }
>({
  stack: [
    // biome-ignore lint/correctness/noEmptyPattern: the runner reads the pattern of the first argument
    async ({}, use) => {
      const stack = await startStack()
      await use(stack)
      await stack.stop()
    },
    { scope: 'worker', timeout: 60_000 },
  ],
  /** Opens a page in a browser of its own, in which nothing may complain and nobody else may be asked. */
  open: async ({ browser, stack }, use) => {
    const complaints: string[] = []
    await use(async (options = desktop) => {
      const context = await browser.newContext(options)
      const page = await context.newPage()
      watch(page, complaints, [stack.url, stack.payments, stack.mail])
      return page
    })
    expect(complaints).toEqual([])
  },
})

/** Console errors, page errors and requests to anybody else are complaints. A refusal we cause on purpose is not. */
export function watch(page: Page, complaints: string[], origins: string[]) {
  page.on('pageerror', error => complaints.push(`page error: ${error.message}`))
  page.on('console', message => {
    if (message.type() !== 'error') return
    if (/Failed to load resource/.test(message.text())) return
    complaints.push(`console: ${message.text()}`)
  })
  page.on('request', request => {
    const url = request.url()
    if (/^(data|blob|about):/.test(url) || origins.some(origin => url.startsWith(origin))) return
    complaints.push(`asked somebody else: ${url}`)
  })
}

/** No violation of WCAG 2.2 AA that a machine can find. */
export async function expectAccessible(page: Page) {
  const { violations } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
    .analyze()
  expect(
    violations.map(found => `${found.id}: ${found.nodes.map(node => node.target.join(' ')).join(', ')}`),
  ).toEqual([])
}

export type Mail = { to: string; subject: string; text: string; html: string }

/** The newest letter to somebody, once it is there. */
export async function readMail(stack: Stack, to: string, subject: RegExp): Promise<Mail> {
  let found: Mail | undefined
  await expect(async () => {
    const letters = (await (await fetch(`${stack.mail}/messages`)).json()) as Mail[]
    found = letters.find(letter => letter.to === to && subject.test(letter.subject))
    expect(found, `a letter to ${to}`).toBeDefined()
  }).toPass({ timeout: 15_000 })
  return found!
}

/** Signs in at the door, with the code of now where the account asks for one. */
export async function signIn(page: Page, stack: Stack, email: string) {
  await page.goto(`${stack.url}/sign-in`)
  await page.getByLabel('E-mail', { exact: true }).fill(email)
  await page.getByLabel('Password', { exact: true }).fill(PASSWORD)
  await page.getByRole('button', { name: 'Sign in', exact: true }).click()
  if (demoCodeFor(email)) {
    const field = page.getByLabel(/code/i).first()
    await field.waitFor()
    await expect(async () => {
      // A code signs in once; the next one may be needed.
      await field.fill(demoCodeFor(email)!)
      await page
        .getByRole('button', { name: /sign in|confirm|continue/i })
        .first()
        .click()
      await expect(page).not.toHaveURL(/sign-in/, { timeout: 3_000 })
    }).toPass({ timeout: 40_000, intervals: [1_000, 5_000] })
  }
  await expect(page).not.toHaveURL(/sign-in/)
}

/** Fills in who orders, on an open order pad. */
export async function fillDetails(page: Page, who: { name: string; email: string; knows: string }) {
  await page.getByLabel('Your name').fill(who.name)
  await page.getByLabel('Your e-mail').fill(who.email)
  await page.getByLabel(/How do you know/).selectOption({ label: who.knows })
}

/** Pays on the hosted page with a card. */
export async function payByCard(page: Page, card = '4242 4242 4242 4242') {
  await page.getByLabel('Card number').fill(card)
  await page.getByLabel(/Expiry/).fill('12/34')
  await page.getByLabel(/Security code/).fill('123')
  const name = page.getByLabel(/Name on card/)
  if (await name.count()) await name.fill('R Lindqvist')
  await page.getByRole('button', { name: /^Pay/ }).click()
}
