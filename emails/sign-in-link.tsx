import type { Locale } from '#shared/wire.ts'
import { writeLetter } from './parts/letter.tsx'
import { literalFacts } from './parts/literal.ts'
import { type Mail, wordsFor } from './parts/words.ts'

export type SignInLinkMail = { locale: Locale; url: string; minutes: number; email: string }

/** The link by which a family signs in. It opens a page with a button, so that a mail scanner cannot use it up. */
export async function renderSignInLink(props: SignInLinkMail): Promise<Mail> {
  const mail = literalFacts(props)
  const { t, locale } = wordsFor(mail.locale)
  return writeLetter({
    locale,
    ply: 'pink',
    band: t('band.family'),
    subject: t('signIn.subject'),
    preview: t('signIn.preview', { minutes: mail.minutes }),
    title: t('signIn.title'),
    sentences: [t('signIn.body', { minutes: mail.minutes, email: mail.email }), t('signIn.once')],
    action: { label: t('signIn.button'), url: mail.url, plainLabel: t('common.plainLink') },
    after: [t('signIn.ignore')],
    footer: [t('common.sent'), t('common.secret')],
  })
}
