import { isolated } from './parts/literal.ts'
import { blocks, heading, indented, linkLines } from './parts/plain-text.ts'
import type { ReceiptMail } from './receipt.tsx'
import type { ReceiptFacts } from './receipt-facts.ts'

/** The receipt for reading without HTML. Always whole, however long the order. */
export function receiptText(mail: ReceiptMail, facts: ReceiptFacts): string {
  const { t } = facts.words
  return blocks(
    facts.title,
    facts.intro,
    [
      `${t('receipt.number')}: ${mail.orderNumber}`,
      `${t('receipt.paid')}: ${facts.paidOn}`,
      `${t('receipt.credit')}: ${facts.credit}`,
      ...(facts.hasFood
        ? [
            `${t('receipt.helpsName')}: ${facts.helps}`,
            `${t('receipt.arrives')}: ${facts.days}`,
            ...indented([facts.handover]),
          ]
        : []),
      `${t('receipt.questions')}: ${isolated(mail.contact.name)}, ${mail.contact.email}`,
    ],
    heading(facts.hasFood ? t('receipt.items') : t('receipt.giftTitle')),
    mail.lines.flatMap(line => lineOf(line, facts)),
    [
      ...facts.sums.map(sum => `${sum.name}: ${facts.money(sum.cents)}`),
      `${t('order.totalPaid')}: ${facts.total}`,
    ],
    linkLines(t('receipt.private').replace(/:$/, ''), mail.receiptUrl),
    ...(facts.hasFood ? foodBlocks(facts) : []),
    facts.footer,
  )
}

function lineOf(line: ReceiptMail['lines'][number], { words: { t }, money }: ReceiptFacts): string[] {
  const each = t('order.each', { quantity: line.quantity, price: money(line.unitPriceCents) })
  const recipient = line.recipientLabel === null ? '' : `, ${t('order.for', { label: line.recipientLabel })}`
  return [
    `${line.itemCode}  ${isolated(line.name)}`,
    ...indented([`${each} = ${money(line.amountCents)}${recipient}`], 6),
  ]
}

function foodBlocks({ words: { t }, food, bestQualityFrom }: ReceiptFacts): string[][] {
  return [
    heading(t('receipt.frost')),
    [
      `${t('receipt.allergens')}:`,
      ...food.allergens.flatMap(item => indented([isolated(item.name), `  ${item.sentence}`])),
      ...(food.together === null ? [] : indented([t('receipt.together'), `  ${food.together}`])),
    ],
    [
      `${t('receipt.storage')}:`,
      ...food.storage.map(({ about, sentence }) =>
        about.length > 0 ? `- ${about.map(isolated).join(', ')}: ${sentence}` : `- ${sentence}`,
      ),
    ],
    food.bestQuality.length > 0
      ? [
          `${t('receipt.bestQuality')}:`,
          bestQualityFrom,
          ...food.bestQuality.map(
            ({ months, names, days }) =>
              `- ${months}: ${t('receipt.bestQualityUntil', { names: names.join(', '), days })}`,
          ),
        ]
      : [],
    [t('receipt.readLabel')],
  ]
}
