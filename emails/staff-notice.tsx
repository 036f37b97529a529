import { plainLetter } from './parts/plain-letter.tsx'
import { mailTranslator } from './parts/say.ts'

/** Something on the operator desk needs somebody. */
export function renderStaffNotice(mail: { title: string; sentences: string[]; url: string }) {
  const t = mailTranslator('en')
  return plainLetter({
    locale: 'en',
    ply: 'white',
    subject: mail.title,
    title: mail.title,
    sentences: mail.sentences,
    action: { href: mail.url, label: t('staff.open') },
    footer: 'Tallykin',
  })
}
