import type { Locale } from '#shared/wire.ts'
import { writeLetter } from './parts/letter.tsx'
import { literalFacts } from './parts/literal.ts'
import { type Mail, wordsFor } from './parts/words.ts'

export type FamilyInvitationMail = {
  locale: Locale
  sellerFullName: string
  organizationName: string
  inviterName: string
  url: string
  days: number
}

/** Asks a parent or guardian to look after a seller's store. */
export async function renderFamilyInvitation(props: FamilyInvitationMail): Promise<Mail> {
  const mail = literalFacts(props)
  const { t, locale } = wordsFor(mail.locale)
  const who = {
    seller: mail.sellerFullName,
    organization: mail.organizationName,
    inviter: mail.inviterName,
  }
  return writeLetter({
    locale,
    ply: 'pink',
    band: t('band.family'),
    bandAside: mail.organizationName,
    subject: t('familyInvitation.subject', who),
    preview: t('familyInvitation.preview', who),
    title: t('familyInvitation.title', who),
    sentences: [t('familyInvitation.body', who), t('familyInvitation.who', who)],
    action: { label: t('invitation.button'), url: mail.url, plainLabel: t('common.plainLink') },
    after: [t('invitation.days', { days: mail.days }), t('familyInvitation.notYours', who)],
    footer: [t('common.sentFor', who), t('common.secret')],
  })
}
