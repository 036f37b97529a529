import type { Locale } from '#shared/wire.ts'
import { writeLetter } from './parts/letter.tsx'
import { literalFacts } from './parts/literal.ts'
import { type Mail, wordsFor } from './parts/words.ts'

export type StaffNoticeMail = {
  locale?: Locale
  /** Whose desk it is about; the operator's, if nothing is said. */
  desk?: 'operator' | 'organizer'
  title: string
  sentences: string[]
  url: string
}

/** Something on a desk needs somebody: a payment that was put aside, an order that a family flagged. */
export async function renderStaffNotice(props: StaffNoticeMail): Promise<Mail> {
  const mail = literalFacts(props)
  const { t, locale } = wordsFor(mail.locale ?? 'en')
  const isOrganizers = mail.desk === 'organizer'
  return writeLetter({
    locale,
    ply: isOrganizers ? 'canary' : 'white',
    band: isOrganizers ? t('band.organizer') : t('band.operator'),
    subject: mail.title,
    preview: mail.sentences[0] ?? mail.title,
    title: mail.title,
    sentences: mail.sentences,
    action: {
      label: isOrganizers ? t('staff.openOrganizer') : t('staff.open'),
      url: mail.url,
      plainLabel: t('common.plainLink'),
    },
    after: [],
    footer: [isOrganizers ? t('staff.whyOrganizer') : t('staff.why')],
  })
}
