import type { Locale } from '#shared/wire.ts'
import { plainLetter } from './parts/plain-letter.tsx'
import { mailTranslator } from './parts/say.ts'

export function renderPasswordReset(mail: { locale: Locale; url: string; minutes: number }) {
  const t = mailTranslator(mail.locale)
  return plainLetter({
    locale: mail.locale,
    ply: 'canary',
    subject: t('reset.subject'),
    title: t('reset.title'),
    sentences: [t('reset.body', { minutes: mail.minutes })],
    action: { href: mail.url, label: t('reset.button') },
    after: [t('signIn.ignore')],
    footer: 'Tallykin',
  })
}
