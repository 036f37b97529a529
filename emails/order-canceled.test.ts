import { expect, test } from 'vitest'
import { renderOrderCanceled } from './order-canceled.tsx'
import { expectSoundMail, hostileNames, internationalNames, links, visible } from './testing/reading.ts'
import { aRefundNotice } from './testing/samples.ts'

test('a refund of a part says what goes back and what is left', async () => {
  const notice = aRefundNotice()
  const mail = await renderOrderCanceled(notice)

  expectSoundMail(mail)
  expect(mail.subject).toBe('$32.00 of order 4K7A-2MX9 goes back to your card')
  for (const form of [visible(mail.html), mail.text])
    for (const said of [
      'Dear Ruth Lindqvist,',
      '$32.00 goes back to your card',
      'A part of order 4K7A-2MX9 is refunded. The rest of it stands.',
      '$25.00',
      'Sweet corn chowder',
      'Banks usually take 5 to 10 days',
      'Write to Ms. Abara at abara@saltmarsh.example',
    ])
      expect(form).toContain(said)
  expect(mail.text).toContain('2 × Sweet corn chowder\n')
  expect(links(mail.html)).toContain(notice.receiptUrl)
})

test('a whole refund says that the order is canceled and that nothing of it comes', async () => {
  const mail = await renderOrderCanceled(aRefundNotice({ whole: true, remainingTotalCents: 0 }))

  expectSoundMail(mail)
  expect(mail.subject).toBe('Order 4K7A-2MX9 is canceled, and $32.00 goes back to your card')
  expect(mail.text).toContain('canceled and refunded in full. Nothing of it will be delivered.')
  expect(mail.text).not.toContain('What is left')
})

test('a refund of the gift alone lists no items', async () => {
  const mail = await renderOrderCanceled(aRefundNotice({ lines: [], whole: true, remainingTotalCents: 0 }))

  expectSoundMail(mail)
  expect(mail.html).not.toContain('Quantity')
})

test.each([...hostileNames, ...internationalNames])('%j is shown literally', async name => {
  const mail = await renderOrderCanceled(
    aRefundNotice({ customerName: name, lines: [{ name, quantity: 1 }] }),
  )

  expectSoundMail(mail)
  for (const form of [visible(mail.html), mail.text]) expect(form.split(name)).toHaveLength(3)
})
