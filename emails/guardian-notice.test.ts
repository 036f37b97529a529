import { expect, test } from 'vitest'
import { renderGuardianNotice } from './guardian-notice.tsx'
import { expectSoundMail, hostileNames, internationalNames, links, visible } from './testing/reading.ts'
import { aGuardianNotice } from './testing/samples.ts'

test('says who ordered what from whose store, the tally, and where to open it', async () => {
  const notice = aGuardianNotice()
  const mail = await renderGuardianNotice(notice)

  expectSoundMail(mail)
  expect(mail.subject).toBe("Grandma Ruth ordered 3 items from Maya's store")
  for (const form of [visible(mail.html), mail.text])
    for (const said of [
      "Grandma Ruth ordered 3 items from Maya's store.",
      'Maya Lindqvist',
      'Grandparent',
      'Thursday, November 12, 9:09 pm',
      'Sweet corn chowder',
      'Oat and cherry cookie dough',
      '13 items sold so far. 7 more items to the next prize.',
      "I don't know this person",
      'opens the order on your family desk, where you can flag it',
      'Opening it changes nothing',
    ])
      expect(form).toContain(said)
  expect(links(mail.html)).toEqual([notice.orderUrl, notice.unknownPersonUrl])
  expect(mail.text).toContain(`Open the order:\n${notice.orderUrl}\n`)
  expect(mail.text).toContain(`I don't know this person:\n${notice.unknownPersonUrl}\n`)
  expect(mail.text).toContain('2 × Sweet corn chowder\n')
})

test('the tally is drawn in five-bar gates, and the drawing is not read aloud', async () => {
  const { html, text } = await renderGuardianNotice(aGuardianNotice())

  expect(text).toContain('||||/ ||||/ |||\n')
  const drawing = html.match(/<p aria-hidden="true"[\s\S]*?<\/p>/)![0]
  expect(drawing.match(/\|/g)).toHaveLength(16)
  expect(drawing.match(/line-through/g)).toHaveLength(4)
})

test('a large tally is said and not drawn; without prizes none is mentioned', async () => {
  const large = await renderGuardianNotice(aGuardianNotice({ tallyNow: 1204, itemsToNextPrize: 6 }))
  const plain = await renderGuardianNotice(aGuardianNotice({ prizeEvery: 0, itemsToNextPrize: 0 }))

  expect(large.text).toContain('1,204 items sold so far.')
  expect(large.text).not.toContain('||||')
  expect(plain.text).not.toContain('prize')
  expect(plain.text).toContain('13 items sold so far.\n')
})

test('one item is one item', async () => {
  const notice = aGuardianNotice({ itemCount: 1, tallyNow: 1, itemsToNextPrize: 1 })
  const { subject, text } = await renderGuardianNotice(notice)

  expect(subject).toBe("Grandma Ruth ordered 1 item from Maya's store")
  expect(text).toContain('1 item sold so far. 1 more item to the next prize.')
})

test('the customer’s address and any amount stay out of it', async () => {
  const { html, text } = await renderGuardianNotice(aGuardianNotice())

  expect(text).not.toMatch(/@|\$/)
  expect(visible(html)).not.toMatch(/@|\$/)
})

test.each([...hostileNames, ...internationalNames])('%j is shown literally', async name => {
  const mail = await renderGuardianNotice(
    aGuardianNotice({ customerName: name, sellerFullName: name, lines: [{ name, quantity: 3 }] }),
  )

  expectSoundMail(mail)
  for (const form of [mail.subject, visible(mail.html), mail.text]) expect(form).toContain(name)
})
