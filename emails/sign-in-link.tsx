import type { Locale } from '#shared/wire.ts'
import { plainLetter } from './parts/plain-letter.tsx'
import { mailTranslator } from './parts/say.ts'

/** The link by which a family signs in. It opens a page with a button, so that a mail scanner cannot use it up. */
export function renderSignInLink(mail: { locale: Locale; url: string; minutes: number; email: string }) {
  const t = mailTranslator(mail.locale)
  return plainLetter({
    locale: mail.locale,
    ply: 'pink',
    subject: t('signIn.subject'),
    title: t('signIn.title'),
    sentences: [t('signIn.body', { minutes: mail.minutes, email: mail.email })],
    action: { href: mail.url, label: t('signIn.button') },
    after: [t('signIn.ignore')],
    footer: 'Tallykin',
  })
}
