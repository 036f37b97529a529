import type { ReactNode } from 'react'
import { Action, MailLink, PlainLink } from './parts/action.tsx'
import { FactsTable } from './parts/facts-table.tsx'
import { FrostHeading, FrostLine, FrostNote } from './parts/frost-note.tsx'
import { OrderTable } from './parts/order-table.tsx'
import { Perforation } from './parts/perforation.tsx'
import { Sheet } from './parts/sheet.tsx'
import { BoxedLetters, Para, Part, Small, Stamp, Subtitle, Title, Typed } from './parts/writing.tsx'
import type { ReceiptMail } from './receipt.tsx'
import type { ReceiptFacts } from './receipt-facts.ts'

type ReceiptProps = { mail: ReceiptMail; facts: ReceiptFacts }

/** The customer's ply of the order. */
export function ReceiptInFull({ mail, facts }: ReceiptProps) {
  const { t } = facts.words
  return (
    <ReceiptFrame
      mail={mail}
      facts={facts}
      rows={mail.lines.map(line => ({
        code: line.itemCode,
        name: line.name,
        note: (
          <>
            {t('order.each', { quantity: line.quantity, price: facts.amount(line.unitPriceCents) })}
            {line.recipientLabel !== null && (
              <>
                {' · '}
                <bdi>{t('order.for', { label: line.recipientLabel })}</bdi>
              </>
            )}
          </>
        ),
        amount: facts.amount(line.amountCents),
      }))}
    >
      <AllergenLines facts={facts} />
      <StorageLines facts={facts} />
    </ReceiptFrame>
  )
}

/** The same for an order too long for a mail: without what repeats for every item. */
export function ReceiptInShort({ mail, facts }: ReceiptProps) {
  const { t } = facts.words
  const row = { name: t('receipt.inShort', { count: facts.count }), amount: facts.amount(mail.itemsCents) }
  const storage = facts.food.storage.map(({ about, sentence }) => ({
    about:
      about.length > MOST_NAMES
        ? [...about.slice(0, MOST_NAMES), t('receipt.andMore', { count: about.length - MOST_NAMES })]
        : about,
    sentence,
  }))
  return (
    <ReceiptFrame mail={mail} facts={facts} rows={[row]}>
      <FrostHeading>{t('receipt.allergens')}</FrostHeading>
      <FrostLine>{t('receipt.allergensInShort')}</FrostLine>
      {facts.food.together !== null && (
        <FrostLine lead={`${t('receipt.together')}.`}>{facts.food.together}</FrostLine>
      )}
      <StorageLines facts={{ ...facts, food: { ...facts.food, storage, bestQuality: [] } }} />
    </ReceiptFrame>
  )
}

/** Names in front of a statement, in the short form. */
const MOST_NAMES = 3

function ReceiptFrame(
  props: ReceiptProps & {
    rows: { code?: string; name: string; note?: ReactNode; amount: string }[]
    children: ReactNode
  },
) {
  const { mail, facts } = props
  const { t, locale } = facts.words
  return (
    <Sheet
      locale={locale}
      ply="goldenrod"
      subject={facts.subject}
      preview={facts.preview}
      band={t('band.receipt')}
      bandAside={mail.organizationName}
      footer={facts.footer}
    >
      <Part>
        <Title>{facts.title}</Title>
        <Para>{facts.intro}</Para>
        <FactsTable
          rows={[
            { name: t('receipt.number'), value: <BoxedLetters>{mail.orderNumber}</BoxedLetters> },
            {
              name: t('receipt.paid'),
              value: (
                <>
                  {facts.paidOn} <Stamp>{t('receipt.stamp')}</Stamp>
                </>
              ),
            },
            { name: t('receipt.credit'), value: facts.credit },
            ...(facts.hasFood
              ? [
                  { name: t('receipt.helpsName'), value: facts.helps },
                  { name: t('receipt.arrives'), value: facts.days, note: facts.handover },
                ]
              : []),
            {
              name: t('receipt.questions'),
              value: <Typed>{mail.contact.name}</Typed>,
              note: <MailLink email={mail.contact.email} />,
            },
          ]}
        />
        <Subtitle>{facts.hasFood ? t('receipt.items') : t('receipt.giftTitle')}</Subtitle>
        <OrderTable
          columns={[t('order.item'), t('order.amount', { currency: mail.currency.toUpperCase() })]}
          rows={props.rows.length > 0 && facts.hasFood ? props.rows : []}
          sums={facts.sums.map(sum => ({ name: sum.name, amount: facts.amount(sum.cents) }))}
          total={{ name: t('order.totalPaid'), amount: facts.total }}
        />
      </Part>
      <Perforation />
      <Part>
        <Action href={mail.receiptUrl}>{t('receipt.open')}</Action>
        <Small>
          {t('receipt.private')} <PlainLink href={mail.receiptUrl} />
        </Small>
        {facts.hasFood && <FrostNote title={t('receipt.frost')}>{props.children}</FrostNote>}
      </Part>
    </Sheet>
  )
}

function AllergenLines({ facts }: { facts: ReceiptFacts }) {
  const { t } = facts.words
  return (
    <>
      <FrostHeading>{t('receipt.allergens')}</FrostHeading>
      {facts.food.allergens.map((item, place) => (
        <FrostLine key={place} lead={<bdi>{`${item.name}.`}</bdi>}>
          {item.sentence}
        </FrostLine>
      ))}
      {facts.food.together !== null && (
        <FrostLine lead={`${t('receipt.together')}.`}>{facts.food.together}</FrostLine>
      )}
    </>
  )
}

function StorageLines({ facts }: { facts: Pick<ReceiptFacts, 'words' | 'food' | 'bestQualityFrom'> }) {
  const { t } = facts.words
  const { storage, bestQuality } = facts.food
  return (
    <>
      <FrostHeading>{t('receipt.storage')}</FrostHeading>
      {storage.map(({ about, sentence }) => (
        <FrostLine key={sentence} lead={about.length > 0 ? <bdi>{`${about.join(', ')}:`}</bdi> : undefined}>
          {sentence}
        </FrostLine>
      ))}
      {bestQuality.length > 0 && (
        <>
          <FrostHeading>{t('receipt.bestQuality')}</FrostHeading>
          <FrostLine>{facts.bestQualityFrom}</FrostLine>
          {bestQuality.map(window => (
            <FrostLine key={window.months} lead={`${window.months}:`}>
              {t('receipt.bestQualityUntil', { names: window.names.join(', '), days: window.days })}
            </FrostLine>
          ))}
        </>
      )}
      <FrostHeading>{t('receipt.readLabel')}</FrostHeading>
    </>
  )
}
