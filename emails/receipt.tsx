import { render } from '@react-email/render'
import { allergenSentence } from '#shared/allergens/wording.ts'
import { formatDay, formatDays, formatShortInstant } from '#shared/deadline/formatting.ts'
import { type FoodKey, foodTranslator } from '#shared/messages/food.ts'
import { formatMoney } from '#shared/money.ts'
import { bestQualityUntil, type StorageClass, unionStorage } from '#shared/storage/storage.ts'
import type { Locale } from '#shared/wire.ts'
import {
  ActionLink,
  AmountLine,
  Fact,
  FrostLine,
  FrostNote,
  Para,
  Sheet,
  Small,
  Title2,
  Typed,
} from './parts/look.tsx'
import { type Mail, mailTranslator, oneLine } from './parts/say.ts'

export type ReceiptMail = {
  locale: Locale
  orderNumber: string
  customerName: string
  creditedTo: string
  organizationName: string
  /** Share of the price that the organization gets, in basis points. */
  organizationShareBp: number
  lines: {
    itemCode: string
    name: string
    quantity: number
    unitPriceCents: number
    amountCents: number
    recipientLabel: string | null
    allergens: { contains: string[]; containsNone: boolean; mayContain: string[] }
    storage: string
    bestQualityMonths: [number, number] | null
  }[]
  itemsCents: number
  giftCents: number
  taxCents: number
  coverCents: number
  totalCents: number
  currency: string
  /** Milliseconds since 1970, and the zone of the drive. */
  paidAt: number
  timeZone: string
  deliveryFrom: string
  deliveryTo: string
  receiptUrl: string
  contact: { name: string; email: string }
}

/** What the receipt says, worked out once for both of its forms. */
function facts(mail: ReceiptMail) {
  const t = mailTranslator(mail.locale)
  const food = foodTranslator(mail.locale)
  const money = (cents: number) => formatMoney(cents, mail)
  const count = mail.lines.reduce((sum, line) => sum + line.quantity, 0)
  const organization = mail.organizationName
  const days = formatDays(mail.deliveryFrom, mail.deliveryTo, mail.locale)
  const statements = new Map(
    mail.lines.map(line => [line.name, allergenSentence(line.allergens, food, mail.locale)]),
  )
  return {
    t,
    money,
    count,
    days,
    subject: oneLine(
      t('receipt.subject', { number: mail.orderNumber, credit: mail.creditedTo, organization }),
    ),
    title: t('receipt.title', { name: mail.customerName }),
    intro:
      count === 0
        ? t('receipt.introGift', { organization })
        : t('receipt.intro', { credit: mail.creditedTo, count }),
    preview:
      count === 0
        ? t('receipt.previewGift', { total: money(mail.totalCents), organization })
        : t('receipt.preview', { count, total: money(mail.totalCents), days }),
    paidAt: formatShortInstant(mail.paidAt, mail.timeZone, mail.locale),
    helps: t('receipt.helps', {
      percent: new Intl.NumberFormat(mail.locale === 'es' ? 'es-US' : 'en-US', {
        style: 'percent',
        maximumFractionDigits: 2,
      }).format(mail.organizationShareBp / 10_000),
      organization,
    }),
    allergens: [...statements].map(([name, sentence]) => ({ name, sentence })),
    storage: unionStorage(mail.lines.map(line => line.storage as StorageClass)).map(key =>
      food(key as FoodKey),
    ),
    best: [...new Map(mail.lines.map(line => [line.name, line.bestQualityMonths]))].flatMap(
      ([name, months]) =>
        months
          ? [
              t('receipt.bestUntil', {
                item: name,
                day: formatDay(bestQualityUntil(mail.deliveryFrom, months).to, mail.locale),
              }),
            ]
          : [],
    ),
    extras: [
      { name: t('receipt.gift', { organization }), cents: mail.giftCents },
      { name: t('receipt.tax'), cents: mail.taxCents },
      { name: t('receipt.cover'), cents: mail.coverCents },
    ].filter(extra => extra.cents > 0),
    questions: t('common.questions', mail.contact),
    footer: `${t('common.footer', { organization })} ${t('common.noCard')}`,
  }
}

/** The one mail a customer gets on paying. */
export async function renderReceipt(mail: ReceiptMail): Promise<Mail> {
  const said = facts(mail)
  const { t, money } = said
  const html = await render(
    <Sheet
      locale={mail.locale}
      ply="goldenrod"
      preview={said.preview}
      title={said.title}
      footer={said.footer}
    >
      <Para>{said.intro}</Para>
      <Fact name={t('receipt.number')}>{mail.orderNumber}</Fact>
      <Fact name={t('receipt.paid')}>{said.paidAt}</Fact>
      <Fact name={t('receipt.credit')}>
        <Typed>{mail.creditedTo}</Typed>
      </Fact>
      {said.count > 0 && <Fact name={t('receipt.arrives')}>{said.days}</Fact>}
      {said.count > 0 && (
        <Small>
          <br />
          {t('receipt.how')}
        </Small>
      )}
      <Title2>{t('receipt.items')}</Title2>
      {mail.lines.map((line, place) => (
        <AmountLine
          key={place}
          code={line.itemCode}
          amount={money(line.amountCents)}
          note={
            <>
              {line.quantity} × {money(line.unitPriceCents)}
              {line.recipientLabel !== null && (
                <>
                  {' · '}
                  <bdi>{t('receipt.for', { label: line.recipientLabel })}</bdi>
                </>
              )}
            </>
          }
        >
          {line.name}
        </AmountLine>
      ))}
      {said.extras.map(extra => (
        <AmountLine key={extra.name} amount={money(extra.cents)}>
          {extra.name}
        </AmountLine>
      ))}
      <AmountLine strong amount={money(mail.totalCents)}>
        {t('receipt.total')}
      </AmountLine>
      <Small>
        <br />
        {said.helps}
      </Small>
      <ActionLink href={mail.receiptUrl}>{t('receipt.open')}</ActionLink>
      <Small>
        {t('receipt.openText')} {mail.receiptUrl}
      </Small>
      {said.count > 0 && (
        <FrostNote title={t('receipt.frost')}>
          <FrostLine strong>{t('receipt.allergens')}</FrostLine>
          {said.allergens.map(item => (
            <FrostLine key={item.name}>
              <b>{item.name}.</b> {item.sentence}
            </FrostLine>
          ))}
          <FrostLine strong>{t('receipt.storage')}</FrostLine>
          {said.storage.map(sentence => (
            <FrostLine key={sentence}>{sentence}</FrostLine>
          ))}
          {said.best.length > 0 && (
            <>
              <FrostLine strong>{t('receipt.best')}</FrostLine>
              {said.best.map(sentence => (
                <FrostLine key={sentence}>{sentence}</FrostLine>
              ))}
              <FrostLine>{t('receipt.bestNote')}</FrostLine>
            </>
          )}
          <FrostLine strong>{t('receipt.readLabel')}</FrostLine>
        </FrostNote>
      )}
      <Para>{said.questions}</Para>
    </Sheet>,
  )
  return { subject: said.subject, html, text: toText(mail, said) }
}

function toText(mail: ReceiptMail, said: ReturnType<typeof facts>): string {
  const { t, money } = said
  const block = (title: string, rows: string[]) =>
    rows.length > 0 ? [title, ...rows.map(row => `  ${row}`), ''] : []
  return [
    said.title,
    '',
    said.intro,
    '',
    `${t('receipt.number')}: ${mail.orderNumber}`,
    `${t('receipt.paid')}: ${said.paidAt}`,
    `${t('receipt.credit')}: ${mail.creditedTo}`,
    ...(said.count > 0 ? [`${t('receipt.arrives')}: ${said.days}`, t('receipt.how')] : []),
    '',
    ...mail.lines.flatMap(line => [
      `${line.itemCode}  ${line.name}`,
      `      ${line.quantity} × ${money(line.unitPriceCents)} = ${money(line.amountCents)}${line.recipientLabel === null ? '' : ` (${t('receipt.for', { label: line.recipientLabel })})`}`,
    ]),
    ...said.extras.map(extra => `${extra.name}: ${money(extra.cents)}`),
    `${t('receipt.total')}: ${money(mail.totalCents)}`,
    said.helps,
    '',
    t('receipt.openText'),
    mail.receiptUrl,
    '',
    ...(said.count > 0
      ? [
          ...block(
            `${t('receipt.frost')}: ${t('receipt.allergens')}`,
            said.allergens.map(item => `${item.name}. ${item.sentence}`),
          ),
          ...block(t('receipt.storage'), said.storage),
          ...(said.best.length > 0 ? block(t('receipt.best'), [...said.best, t('receipt.bestNote')]) : []),
          t('receipt.readLabel'),
          '',
        ]
      : []),
    said.questions,
    '',
    said.footer,
    '',
  ].join('\n')
}
