import fc from 'fast-check'
import { expect, test } from 'vitest'
import { renderReceipt } from './receipt.tsx'
import { expectSoundMail, hostileNames, internationalNames, links, visible } from './testing/reading.ts'
import { aReceipt, chowder, dough, pretzels, tenLines } from './testing/samples.ts'

const bytes = (text: string) => new TextEncoder().encode(text).length

const sixtyLines = Array.from({ length: 60 }, (_, place) => ({
  ...tenLines[place % 10]!,
  itemCode: String(1000 + 13 * place),
  name: `${tenLines[place % 10]!.name}, tray ${place}`,
  recipientLabel: 'the Okafors next door',
}))

test('both forms carry order number, lines, sums, credit, arrival, receipt address and whom to ask', async () => {
  const mail = await renderReceipt(aReceipt())

  expectSoundMail(mail)
  expect(mail.subject).toBe('Your order 4K7A-2MX9 for Maya L., Saltmarsh High Robotics')
  for (const form of [visible(mail.html), mail.text]) {
    for (const line of tenLines) expect(form).toContain(line.name)
    for (const line of tenLines) expect(form).toContain(line.itemCode)
    for (const said of [
      '4K7A-2MX9',
      'Thank you, Ruth Lindqvist',
      'Credit goes to Maya L. for 14 items.',
      'Maya L., Saltmarsh High Robotics',
      'Thursday, November 12, 2026',
      '40% of the price goes to Saltmarsh High Robotics, before card fees',
      'Thursday, December 17 to Friday, December 18',
      "Nothing is shipped. The seller's family brings your order to you",
      'for Ana',
      '231.00',
      'Gift to Saltmarsh High Robotics',
      '5.00',
      'Card fee, covered by you',
      '7.42',
      '$243.42',
      'https://tallykin.example/r/q3Jx0ZrT9mWfKc2vLhB8Yg',
      'Ms. Abara',
      'abara@saltmarsh.example',
      'Never send card details by mail',
    ])
      expect(form).toContain(said)
  }
  expect(links(mail.html)).toEqual([
    'mailto:abara@saltmarsh.example',
    'https://tallykin.example/r/q3Jx0ZrT9mWfKc2vLhB8Yg',
    'https://tallykin.example/r/q3Jx0ZrT9mWfKc2vLhB8Yg',
  ])
})

test('every item has its allergens, and the order their union, in the one wording', async () => {
  const mail = await renderReceipt(aReceipt({ lines: [chowder, pretzels] }))

  expect(visible(mail.html)).toContain('Sweet corn chowder. Contains: Milk. May contain: Wheat.')
  expect(visible(mail.html)).toContain('All of it together. Contains: Wheat, Milk. May contain: Sesame.')
  expect(mail.text).toContain('Major allergens by item:')
  expect(mail.text).toContain('  Sweet corn chowder\n    Contains: Milk. May contain: Wheat.\n')
  expect(mail.text).toContain('  Soft salted pretzels\n    Contains: Wheat. May contain: Milk, Sesame.\n')
  expect(`${mail.text}${mail.html}`).not.toMatch(/free from|allergen-free/i)
})

test('an item whose statement is missing is never covered up by the union', async () => {
  const unknown = { ...pretzels, allergens: { contains: [], containsNone: false, mayContain: [] } }
  const mail = await renderReceipt(aReceipt({ lines: [chowder, unknown] }))

  expect(mail.text).toContain('  Soft salted pretzels\n    Allergens are not stated.')
  expect(mail.text).not.toContain('All of it together')
})

test('frozen food: 0 °F, thawing in the refrigerator, two hours (USDA FSIS, Freezing and Food Safety)', async () => {
  const mail = await renderReceipt(aReceipt({ lines: [pretzels] }))

  for (const form of [visible(mail.html), mail.text]) {
    expect(form).toContain('0 °F (−18 °C)')
    expect(form).toContain('Thaw in the refrigerator')
    expect(form).toMatch(/2 hours, or 1 hour when it is above 90 °F/)
    expect(form).toContain('Always read the label on the package.')
    expect(form).not.toMatch(/raw dough|Cook as the package says/)
  }
})

test('the caution about raw dough names the dough and nothing else (FDA, Handling Flour Safely)', async () => {
  const mail = await renderReceipt(aReceipt({ lines: [chowder, dough, pretzels] }))

  expect(mail.text).toContain('- Oat and cherry cookie dough: Do not taste raw dough or batter')
  expect(mail.text).toContain('- Sweet corn chowder: Cook as the package says before eating.')
  expect(visible(mail.html)).toContain('Oat and cherry cookie dough: Do not taste raw dough or batter')
  expect(mail.text).toContain('- Keep at 0 °F (−18 °C) or below.')
})

test('beside something for the shelf, the freezer is for all that is frozen', async () => {
  const shelf = { ...pretzels, itemCode: '7700', name: 'Cocoa tin', storage: 'shelf_stable' }
  const { text } = await renderReceipt(aReceipt({ lines: [pretzels, shelf] }))

  expect(text).toContain('- All that is frozen: Keep at 0 °F (−18 °C) or below.')
  expect(text).toContain('- Cocoa tin: Keep in a cool, dry place.')
})

test('best quality is a window counted from delivery, about taste (USDA FoodKeeper rows 198 and 309)', async () => {
  const cheesecake = { ...pretzels, itemCode: '6198', name: 'Ginger cheesecake' }
  const { text, html } = await renderReceipt(
    aReceipt({
      deliveryFrom: '2026-12-05',
      deliveryTo: '2026-12-05',
      lines: [dough, { ...cheesecake, bestQualityMonths: [3, 6] }, chowder],
    }),
  )

  for (const form of [text, visible(html)]) {
    expect(form).toMatch(/3 to 6 months: Ginger cheesecake, until about March 5\s–\sJune 5, 2027/)
    expect(form).toContain('12 months: Oat and cherry cookie dough, until about December 5, 2027')
    expect(form).toContain('This is about taste, not safety; the date on the package comes first.')
    expect(form).not.toMatch(/expire|spoil|unsafe|safe until|use by/i)
  }
  expect(text.indexOf('3 to 6 months')).toBeLessThan(text.indexOf('12 months'))
})

test('the same item for two recipients stands twice among the lines and once among the allergens', async () => {
  const { text } = await renderReceipt(aReceipt({ lines: [dough, { ...dough, recipientLabel: null }] }))

  expect(text.match(/6521 {2}Oat and cherry cookie dough/g)).toHaveLength(2)
  expect(text.match(/Contains: Wheat, Milk, Egg\./g)).toHaveLength(1)
})

test('two items of one name with different allergens both keep their own', async () => {
  const small = { ...chowder, itemCode: '1205', allergens: { ...chowder.allergens, contains: ['soy'] } }
  const { text } = await renderReceipt(aReceipt({ lines: [chowder, small] }))

  expect(text).toContain('Contains: Milk. May contain: Wheat.')
  expect(text).toContain('Contains: Soy. May contain: Wheat.')
})

test('a gift alone brings no food, so nothing is said of arrival or storage', async () => {
  const mail = await renderReceipt(aReceipt({ lines: [], giftCents: 2500, coverCents: 0 }))

  expectSoundMail(mail)
  expect(mail.subject).toBe('Your gift to Saltmarsh High Robotics, order 4K7A-2MX9')
  for (const form of [visible(mail.html), mail.text]) {
    expect(form).toContain('$25.00')
    expect(form).not.toMatch(/freezer|allergen|Arrives|Nothing is shipped/)
  }
})

test('an order for the whole organization names it once, and its handing over is at the school', async () => {
  const { subject, text } = await renderReceipt(
    aReceipt({ creditedTo: 'Saltmarsh High Robotics', handover: 'school' }),
  )

  expect(subject).toBe('Your order 4K7A-2MX9 for Saltmarsh High Robotics')
  expect(text).toContain('Your order is handed over at the school')
  expect(text).not.toContain("seller's family")
})

test('who bears the card fees is not guessed: without them the share is said in full', async () => {
  const { text } = await renderReceipt(
    aReceipt({ organizationBearsCardFees: false, organizationShareBp: 4250 }),
  )

  expect(text).toContain('42.5% of the price goes to Saltmarsh High Robotics\n')
})

test.each([...hostileNames, ...internationalNames])(
  '%j is shown literally wherever a name stands',
  async name => {
    const mail = await renderReceipt(
      aReceipt({
        customerName: name,
        creditedTo: name,
        organizationName: `${name} Club`,
        contact: { name, email: 'abara@saltmarsh.example' },
        lines: [{ ...chowder, name: `${name} pie`, recipientLabel: name }, pretzels],
      }),
    )

    expectSoundMail(mail)
    expect(mail.subject).toContain(name)
    for (const form of [visible(mail.html), mail.text])
      for (const shown of [name, `${name} Club`, `${name} pie`]) expect(form).toContain(shown)
  },
)

test('a name written from right to left does not turn the sentence around it', async () => {
  const { subject, text } = await renderReceipt(aReceipt({ creditedTo: 'אבג דן' }))

  expect(text).toContain('Credit goes to \u2068אבג דן\u2069 for 14 items.')
  expect(subject).toContain('\u2068אבג דן\u2069, Saltmarsh High Robotics')
})

test('line breaks and direction marks in a name reach neither subject nor text', async () => {
  const mail = await renderReceipt(
    aReceipt({ creditedTo: 'Maya\r\nBcc: x@evil.example', customerName: 'Ruth\u202e\u0000\nLind' }),
  )

  expect(mail.subject).toBe('Your order 4K7A-2MX9 for Maya Bcc: x@evil.example, Saltmarsh High Robotics')
  expect(mail.text).toMatch(/^Thank you, Ruth Lind\n/)
  expect(mail.html).not.toContain('\u202e')
})

test('any name at all leaves the subject on one line and the HTML without a tag of its own', async () => {
  const tags = (html: string) => html.match(/<\/?[a-z0-9]+/gi)?.length
  const plain = await renderReceipt(aReceipt({ lines: [chowder] }))

  await fc.assert(
    fc.asyncProperty(fc.string({ unit: 'binary', maxLength: 60 }), async name => {
      const mail = await renderReceipt(
        aReceipt({ customerName: name, creditedTo: `M${name}`, lines: [{ ...chowder, name: `P${name}` }] }),
      )
      expect(mail.subject).not.toMatch(/[\p{Cc}\u2028\u2029]/u)
      expect(tags(mail.html)).toBe(tags(plain.html))
    }),
    { numRuns: 60 },
  )
})

test('sixty lines fit into what mail programs show without clipping', async () => {
  const mail = await renderReceipt(aReceipt({ lines: sixtyLines }))

  expect(bytes(mail.html)).toBeLessThan(100_000)
  for (const line of sixtyLines) expect(visible(mail.html)).toContain(line.name)
})

test('a longer receipt keeps totals, storage and address in its HTML, and its text stays whole', async () => {
  const lines = Array.from({ length: 600 }, (_, place) => ({
    ...sixtyLines[place % 60]!,
    name: `Pie ${place}`,
  }))
  const mail = await renderReceipt(aReceipt({ lines }))

  expectSoundMail(mail)
  expect(bytes(mail.html)).toBeLessThan(30_000)
  expect(visible(mail.html)).toContain('Every one is listed on your receipt page.')
  expect(visible(mail.html)).toContain('lists the allergens of each item')
  expect(visible(mail.html)).toContain('All of it together. Contains: ')
  expect(visible(mail.html)).toContain('0 °F (−18 °C)')
  expect(links(mail.html)).toContain('https://tallykin.example/r/q3Jx0ZrT9mWfKc2vLhB8Yg')
  for (const line of lines) expect(mail.text).toContain(`${line.itemCode}  ${line.name}\n`)
})

test('an address that is no web address stops the mail', async () => {
  await expect(renderReceipt(aReceipt({ receiptUrl: 'javascript:alert(1)' }))).rejects.toThrow(TypeError)
})

test('a reader whose language is not written yet gets one language, not two', async () => {
  const { html, text } = await renderReceipt(aReceipt({ locale: 'es' }))

  expect(html).toMatch(/<html[^>]* lang="en"/)
  expect(text).toContain('Arrives: Thursday, December 17 to Friday, December 18')
})
