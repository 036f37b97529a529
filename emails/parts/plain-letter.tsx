import { render } from '@react-email/render'
import type { Locale } from '#shared/wire.ts'
import { ActionLink, Para, type plies, Sheet } from './look.tsx'
import { type Mail, oneLine } from './say.ts'

/** A short letter: a title, a few sentences and one thing to do. */
export async function plainLetter(letter: {
  locale: Locale
  ply: keyof typeof plies
  subject: string
  title: string
  sentences: string[]
  action: { href: string; label: string }
  after?: string[]
  footer: string
}): Promise<Mail> {
  const after = letter.after ?? []
  const html = await render(
    <Sheet
      locale={letter.locale}
      ply={letter.ply}
      preview={letter.sentences[0] ?? letter.title}
      title={letter.title}
      footer={letter.footer}
    >
      {letter.sentences.map(sentence => (
        <Para key={sentence}>{sentence}</Para>
      ))}
      <ActionLink href={letter.action.href}>{letter.action.label}</ActionLink>
      {after.map(sentence => (
        <Para key={sentence}>{sentence}</Para>
      ))}
    </Sheet>,
  )
  const text = [
    letter.title,
    '',
    ...letter.sentences,
    '',
    `${letter.action.label}:`,
    letter.action.href,
    '',
    ...after,
    letter.footer,
    '',
  ].join('\n')
  return { subject: oneLine(letter.subject), html, text }
}
