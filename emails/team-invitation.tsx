import type { DriveRole } from '#shared/people/contract.ts'
import type { Locale } from '#shared/wire.ts'
import { writeLetter } from './parts/letter.tsx'
import { literalFacts } from './parts/literal.ts'
import { type Mail, wordsFor } from './parts/words.ts'

export type TeamInvitationMail = {
  locale: Locale
  role: DriveRole
  driveName: string
  organizationName: string
  inviterName: string
  url: string
  days: number
}

/** Asks an adult to help run a drive: as its lead, its treasurer or a helper. */
export async function renderTeamInvitation(props: TeamInvitationMail): Promise<Mail> {
  const mail = literalFacts(props)
  const { t, locale } = wordsFor(mail.locale)
  const who = {
    drive: mail.driveName,
    organization: mail.organizationName,
    inviter: mail.inviterName,
    role: t(`role.${mail.role}`),
  }
  return writeLetter({
    locale,
    ply: 'canary',
    band: t('band.organizer'),
    bandAside: mail.organizationName,
    subject: t('teamInvitation.subject', who),
    preview: t('teamInvitation.preview', who),
    title: t('teamInvitation.title', who),
    sentences: [
      t('teamInvitation.body', who),
      t(`teamInvitation.${mail.role}`),
      ...(mail.role === 'helper' ? [] : [t('teamInvitation.secondFactor')]),
    ],
    action: { label: t('invitation.button'), url: mail.url, plainLabel: t('common.plainLink') },
    after: [t('invitation.days', { days: mail.days }), t('teamInvitation.notYours', who)],
    footer: [t('common.sentFor', who), t('common.secret')],
  })
}
