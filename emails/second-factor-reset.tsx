import type { Locale } from '#shared/wire.ts'
import { writeLetter } from './parts/letter.tsx'
import { literalFacts } from './parts/literal.ts'
import { type Mail, wordsFor } from './parts/words.ts'

export type SecondFactorResetMail = {
  locale: Locale
  /** Who took it off, by name. */
  by: string
  reason: string
  signInUrl: string
  newPasswordUrl: string
}

/** Tells the owner of an account that somebody took their second factor off it. */
export async function renderSecondFactorReset(props: SecondFactorResetMail): Promise<Mail> {
  const mail = literalFacts(props)
  const { t, locale } = wordsFor(mail.locale)
  return writeLetter({
    locale,
    ply: 'white',
    band: t('band.account'),
    subject: t('secondFactorReset.subject'),
    preview: t('secondFactorReset.preview'),
    title: t('secondFactorReset.title'),
    sentences: [
      t('secondFactorReset.by', { by: mail.by, reason: mail.reason }),
      t('secondFactorReset.sessions'),
    ],
    action: { label: t('secondFactorReset.button'), url: mail.signInUrl, plainLabel: t('common.plainLink') },
    after: [t('secondFactorReset.notYou', { url: mail.newPasswordUrl })],
    footer: [t('common.sent')],
  })
}
