import { expect, test } from 'vitest'
import { renderFamilyInvitation } from './family-invitation.tsx'
import { renderPasswordReset } from './password-reset.tsx'
import { renderSignInLink } from './sign-in-link.tsx'
import { renderStaffNotice } from './staff-notice.tsx'
import { renderTeamInvitation } from './team-invitation.tsx'
import { expectSoundMail, hostileNames, internationalNames, links, visible } from './testing/reading.ts'
import { aFamilyInvitation, aTeamInvitation } from './testing/samples.ts'

const url = 'https://tallykin.example/sign-in/link#kq9f3TzR8yXcVb2NmL4pWd'

test('the sign-in link says for whom and how long, and that it opens a page with a button', async () => {
  const mail = await renderSignInLink({ locale: 'en', url, minutes: 10, email: 'ines@mail.example' })

  expectSoundMail(mail)
  for (const form of [visible(mail.html), mail.text])
    for (const said of ['within 10 minutes', 'ines@mail.example', 'opens a page with a button', url])
      expect(form).toContain(said)
  expect(links(mail.html)).toEqual([url, url])
  expect(mail.text).toContain(`\n${url}\n`)
  expect(mail.subject).not.toContain('kq9f')
})

test('the password letter says how long it works and that it may be ignored', async () => {
  const mail = await renderPasswordReset({ locale: 'en', url, minutes: 1 })

  expectSoundMail(mail)
  for (const form of [visible(mail.html), mail.text])
    for (const said of ['within 1 minute ', 'Your password stays as it is.', 'signed out', url])
      expect(form).toContain(said)
})

test('the family invitation says who invites, to what, and that the seller gives nothing', async () => {
  const invitation = aFamilyInvitation()
  const mail = await renderFamilyInvitation(invitation)

  expectSoundMail(mail)
  expect(mail.subject).toBe("Saltmarsh High Robotics: Maya Lindqvist's store is ready for your family")
  for (const form of [visible(mail.html), mail.text])
    for (const said of [
      "Ms. Abara of Saltmarsh High Robotics invites you to look after Maya Lindqvist's store",
      'Accounts are for adults.',
      'The link works for 14 days.',
      'If Maya Lindqvist is not in your family',
      invitation.url,
    ])
      expect(form).toContain(said)
})

test.each([
  ['lead', 'A lead sets the fundraiser up', true],
  ['treasurer', 'A treasurer counts and deposits the money', true],
  ['helper', 'A helper keys in paper forms', false],
] as const)(
  'the invitation of a %s says what they do, and whether a second factor is needed',
  async (role, deed, secondFactor) => {
    const mail = await renderTeamInvitation(aTeamInvitation({ role }))

    expectSoundMail(mail)
    for (const form of [visible(mail.html), mail.text]) {
      expect(form).toContain(deed)
      expect(form).toContain('Winter Larder')
      expect(form.includes('second factor')).toBe(secondFactor)
    }
  },
)

test('a staff notice says its sentences and opens the desk', async () => {
  const mail = await renderStaffNotice({
    title: 'A payment was put aside',
    sentences: ['A payment of 57.00 USD was not credited.', 'It waits for somebody to look at it.'],
    url: 'https://tallykin.example/operator',
  })

  expectSoundMail(mail)
  expect(mail.subject).toBe('A payment was put aside')
  for (const form of [visible(mail.html), mail.text])
    expect(form).toMatch(/57\.00 USD was not credited\.[\s\S]*somebody to look at it\.[\s\S]*\/operator/)
})

test.each([...hostileNames, ...internationalNames])('%j is shown literally in every letter', async name => {
  const mails = await Promise.all([
    renderFamilyInvitation(aFamilyInvitation({ sellerFullName: name, inviterName: name })),
    renderTeamInvitation(aTeamInvitation({ driveName: name, inviterName: name })),
    renderStaffNotice({ title: `About ${name}`, sentences: [name], url }),
    renderSignInLink({ locale: 'en', url, minutes: 10, email: name }),
  ])

  for (const mail of mails) {
    expectSoundMail(mail)
    for (const form of [visible(mail.html), mail.text]) expect(form).toContain(name)
  }
})
