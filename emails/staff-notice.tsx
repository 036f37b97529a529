import type { Locale } from '#shared/wire.ts'
import { writeLetter } from './parts/letter.tsx'
import { literalFacts } from './parts/literal.ts'
import { type Mail, wordsFor } from './parts/words.ts'

export type StaffNoticeMail = { locale?: Locale; title: string; sentences: string[]; url: string }

/** Something on the operator desk needs somebody: a payment that was put aside. */
export async function renderStaffNotice(props: StaffNoticeMail): Promise<Mail> {
  const mail = literalFacts(props)
  const { t, locale } = wordsFor(mail.locale ?? 'en')
  return writeLetter({
    locale,
    ply: 'white',
    band: t('band.operator'),
    subject: mail.title,
    preview: mail.sentences[0] ?? mail.title,
    title: mail.title,
    sentences: mail.sentences,
    action: { label: t('staff.open'), url: mail.url, plainLabel: t('common.plainLink') },
    after: [],
    footer: [t('staff.why')],
  })
}
