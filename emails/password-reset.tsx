import type { Locale } from '#shared/wire.ts'
import { writeLetter } from './parts/letter.tsx'
import { literalFacts } from './parts/literal.ts'
import { type Mail, wordsFor } from './parts/words.ts'

export type PasswordResetMail = { locale: Locale; url: string; minutes: number }

/** The link by which somebody who signs in with a password chooses a new one. */
export async function renderPasswordReset(props: PasswordResetMail): Promise<Mail> {
  const mail = literalFacts(props)
  const { t, locale } = wordsFor(mail.locale)
  return writeLetter({
    locale,
    ply: 'white',
    band: t('band.account'),
    subject: t('reset.subject'),
    preview: t('signIn.preview', { minutes: mail.minutes }),
    title: t('reset.title'),
    sentences: [t('reset.body', { minutes: mail.minutes }), t('reset.sessions')],
    action: { label: t('reset.button'), url: mail.url, plainLabel: t('common.plainLink') },
    after: [t('reset.ignore')],
    footer: [t('common.sent'), t('common.secret')],
  })
}
