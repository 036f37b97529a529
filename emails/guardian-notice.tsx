import { render } from '@react-email/render'
import { formatInstant } from '#shared/deadline/formatting.ts'
import type { Relationship } from '#shared/orders/contract.ts'
import type { Locale } from '#shared/wire.ts'
import { Action } from './parts/action.tsx'
import { FactsTable } from './parts/facts-table.tsx'
import { isolated, literalFacts, subjectLine } from './parts/literal.ts'
import { OrderTable } from './parts/order-table.tsx'
import { Perforation } from './parts/perforation.tsx'
import { blocks, heading, indented, linkLines } from './parts/plain-text.ts'
import { Sheet } from './parts/sheet.tsx'
import { TallyMarks, tallyText } from './parts/tally-marks.tsx'
import { type Mail, wordsFor } from './parts/words.ts'
import { Para, Part, Small, Subtitle, Title, Typed } from './parts/writing.tsx'

export type GuardianNotice = {
  locale: Locale
  sellerFullName: string
  sellerFirstName: string
  customerName: string
  relationship: Relationship
  lines: { name: string; quantity: number }[]
  itemCount: number
  /** The tally with this order in it. */
  tallyNow: number
  /** Items that earn one prize; 0 where the drive has no such prizes. */
  prizeEvery: number
  itemsToNextPrize: number
  /** Opens the order on the family desk. */
  orderUrl: string
  /** Opens it where it can be flagged; following it changes nothing. */
  unknownPersonUrl: string
  organizationName: string
  timeZone: string
  placedAt: number
}

/** What the notice says, worked out once for both of its forms. */
function sayings(mail: GuardianNotice) {
  const { t, locale } = wordsFor(mail.locale)
  const who = { customer: mail.customerName, count: mail.itemCount, seller: mail.sellerFirstName }
  return {
    t,
    locale,
    subject: subjectLine(t('guardian.subject', who)),
    title: t('guardian.title', who),
    preview: t('guardian.preview', { tally: mail.tallyNow }),
    facts: [
      { name: t('guardian.customer'), value: mail.customerName },
      { name: t('guardian.knows', who), value: t(`guardian.relationship.${mail.relationship}`) },
      { name: t('guardian.placed'), value: formatInstant(mail.placedAt, mail.timeZone, locale) },
      { name: t('guardian.credited'), value: mail.sellerFullName },
    ],
    tally: [
      t('guardian.tally', { tally: mail.tallyNow }),
      ...(mail.prizeEvery > 0 ? [t('guardian.next', { count: mail.itemsToNextPrize })] : []),
    ].join(' '),
    unknownTitle: t('guardian.unknownTitle', who),
    unknownNote: t('guardian.unknownNote'),
    footer: [t('common.sentFor', { organization: mail.organizationName }), t('guardian.why', who)],
  }
}

/** Tells a guardian who ordered what, and how to say that they do not know the person. */
export async function renderGuardianNotice(props: GuardianNotice): Promise<Mail> {
  const mail = literalFacts(props)
  const said = sayings(mail)
  const { t } = said
  const goal = mail.prizeEvery > 0 ? mail.tallyNow + mail.itemsToNextPrize : mail.tallyNow
  const html = await render(
    <Sheet {...said} ply="pink" band={t('band.family')} bandAside={mail.sellerFullName}>
      <Part>
        <Title>{said.title}</Title>
        <FactsTable rows={said.facts.map(fact => ({ ...fact, value: <Typed>{fact.value}</Typed> }))} />
        <Subtitle>{t('guardian.items')}</Subtitle>
        <OrderTable
          columns={[t('order.item'), t('order.quantity')]}
          rows={mail.lines.map(line => ({ name: line.name, amount: String(line.quantity) }))}
        />
        <Subtitle>{t('guardian.tallyTitle')}</Subtitle>
        <TallyMarks count={mail.tallyNow} goal={goal} />
        <Para>{said.tally}</Para>
        <Action href={mail.orderUrl}>{t('guardian.open')}</Action>
      </Part>
      <Perforation />
      <Part>
        <Para>
          <b>{said.unknownTitle}</b>
        </Para>
        <Small>{said.unknownNote}</Small>
        <Action quiet href={mail.unknownPersonUrl}>
          {t('guardian.unknown')}
        </Action>
      </Part>
    </Sheet>,
  )
  return { subject: said.subject, html, text: toText(mail, said) }
}

function toText(mail: GuardianNotice, said: ReturnType<typeof sayings>): string {
  const { t } = said
  return blocks(
    said.title,
    said.facts.map(fact => `${fact.name}: ${isolated(fact.value)}`),
    [
      ...heading(t('guardian.items')),
      ...indented(mail.lines.map(line => `${line.quantity} × ${isolated(line.name)}`)),
    ],
    [...heading(t('guardian.tallyTitle')), tallyText(mail.tallyNow), said.tally].filter(Boolean),
    linkLines(t('guardian.open'), mail.orderUrl),
    [said.unknownTitle, said.unknownNote, ...linkLines(t('guardian.unknown'), mail.unknownPersonUrl)],
    said.footer,
  )
}
