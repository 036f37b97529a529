import { render } from '@react-email/render'
import type { ReactNode } from 'react'
import type { Locale } from '#shared/wire.ts'
import { Action, PlainLink } from './action.tsx'
import type { Ply } from './ink.ts'
import { subjectLine } from './literal.ts'
import { blocks, linkLines } from './plain-text.ts'
import { Sheet } from './sheet.tsx'
import type { Mail } from './words.ts'
import { Para, Part, Small, Title } from './writing.tsx'

export type Letter = {
  /** The language it is written in. */
  locale: Locale
  ply: Ply
  band: string
  bandAside?: string
  subject: string
  preview: string
  title: string
  sentences: readonly string[]
  /** Between the sentences and what there is to do: a table, and the same in lines of text. */
  facts?: { html: ReactNode; text: readonly string[] }
  action: { label: string; url: string; plainLabel: string }
  after: readonly string[]
  footer: readonly string[]
}

/** A short letter: a title, a few sentences and one thing to do. */
export async function writeLetter(letter: Letter): Promise<Mail> {
  const { action } = letter
  const html = await render(
    <Sheet {...letter} subject={subjectLine(letter.subject)}>
      <Part>
        <Title>{letter.title}</Title>
        {letter.sentences.map((sentence, place) => (
          <Para key={place}>{sentence}</Para>
        ))}
        {letter.facts?.html}
        <Action href={action.url}>{action.label}</Action>
        <Small>
          {action.plainLabel} <PlainLink href={action.url} />
        </Small>
        {letter.after.map((sentence, place) => (
          <Para key={place}>{sentence}</Para>
        ))}
      </Part>
    </Sheet>,
  )
  const text = blocks(
    letter.title,
    ...letter.sentences,
    letter.facts?.text ?? '',
    linkLines(action.label, action.url),
    ...letter.after,
    letter.footer,
  )
  return { subject: subjectLine(letter.subject), html, text }
}
