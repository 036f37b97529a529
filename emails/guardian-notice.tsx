import { render } from '@react-email/render'
import { formatShortInstant } from '#shared/deadline/formatting.ts'
import type { Relationship } from '#shared/orders/contract.ts'
import type { Locale } from '#shared/wire.ts'
import { ActionLink, AmountLine, Para, Sheet, Small, TallyMarks } from './parts/look.tsx'
import { type Mail, mailTranslator, oneLine } from './parts/say.ts'

export type GuardianNotice = {
  locale: Locale
  sellerFullName: string
  sellerFirstName: string
  customerName: string
  relationship: Relationship
  lines: { name: string; quantity: number }[]
  itemCount: number
  tallyNow: number
  prizeEvery: number
  itemsToNextPrize: number
  orderUrl: string
  unknownPersonUrl: string
  organizationName: string
  timeZone: string
  placedAt: number
}

/** Tells a guardian who ordered what, and how to say that they do not know the person. */
export async function renderGuardianNotice(mail: GuardianNotice): Promise<Mail> {
  const t = mailTranslator(mail.locale)
  const title = t('guardian.title', {
    customer: mail.customerName,
    count: mail.itemCount,
    seller: mail.sellerFirstName,
  })
  const relationship = t(`guardian.relationship.${mail.relationship}`)
  const when = formatShortInstant(mail.placedAt, mail.timeZone, mail.locale)
  const tally = t('guardian.tally', { tally: mail.tallyNow })
  const next = t('guardian.next', { count: mail.itemsToNextPrize })
  const footer = t('common.footer', { organization: mail.organizationName })
  const html = await render(
    <Sheet
      locale={mail.locale}
      ply="pink"
      preview={t('guardian.preview', { tally: mail.tallyNow })}
      title={title}
      footer={footer}
    >
      <Small>
        {mail.sellerFullName} · {when}
      </Small>
      {mail.lines.map(line => (
        <AmountLine key={line.name} amount={String(line.quantity)}>
          {line.name}
        </AmountLine>
      ))}
      <Para>
        <br />
        {relationship}
      </Para>
      <Para>
        <b>{tally}</b>. {next}
        <br />
        <TallyMarks count={mail.tallyNow} />
      </Para>
      <ActionLink href={mail.orderUrl}>{t('guardian.open')}</ActionLink>
      <ActionLink quiet href={mail.unknownPersonUrl}>
        {t('guardian.unknown')}
      </ActionLink>
      <Small>{t('guardian.unknownNote')}</Small>
    </Sheet>,
  )
  const text = [
    title,
    `${mail.sellerFullName}, ${when}`,
    '',
    ...mail.lines.map(line => `${line.quantity} × ${line.name}`),
    '',
    relationship,
    `${tally}. ${next}`,
    '',
    `${t('guardian.open')}: ${mail.orderUrl}`,
    `${t('guardian.unknown')}: ${mail.unknownPersonUrl}`,
    t('guardian.unknownNote'),
    '',
    footer,
    '',
  ].join('\n')
  return {
    subject: oneLine(
      t('guardian.subject', {
        customer: mail.customerName,
        count: mail.itemCount,
        seller: mail.sellerFirstName,
      }),
    ),
    html,
    text,
  }
}
