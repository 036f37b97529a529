import { sql } from 'drizzle-orm'
import { prepared } from '../db/prepared.ts'
import { order, orderCustomer, orderLine, orderRecipient } from '../db/schema/orders.ts'
import type { Tx } from '../db/transaction.ts'
import { hit } from '../faults.ts'

const place = sql.placeholder

const insertOrderRow = prepared(orm =>
  orm
    .insert(order)
    .values({
      publicId: place('publicId'),
      number: place('number'),
      driveId: place('driveId'),
      termsId: place('termsId'),
      linkId: place('linkId'),
      status: 'awaiting_payment',
      idempotencyKey: place('idempotencyKey'),
      requestHash: place('requestHash'),
      locale: place('locale'),
      currency: place('currency'),
      itemCount: place('itemCount'),
      itemsCents: place('itemsCents'),
      giftCents: place('giftCents'),
      taxCents: place('taxCents'),
      coverCents: place('coverCents'),
      totalCents: place('totalCents'),
      feeCents: place('feeCents'),
      placedAt: place('placedAt'),
    })
    .returning()
    .prepare(),
)
const insertCustomerRow = prepared(orm =>
  orm
    .insert(orderCustomer)
    .values({
      orderId: place('orderId'),
      name: place('name'),
      email: place('email'),
      relationship: place('relationship'),
    })
    .prepare(),
)
const insertRecipientRow = prepared(orm =>
  orm
    .insert(orderRecipient)
    .values({ orderId: place('orderId'), label: place('label'), handover: place('handover') })
    .returning({ id: orderRecipient.id })
    .prepare(),
)
const insertLineRow = prepared(orm =>
  orm
    .insert(orderLine)
    .values({
      orderId: place('orderId'),
      position: place('position'),
      recipientId: place('recipientId'),
      sellerId: place('sellerId'),
      itemId: place('itemId'),
      code: place('code'),
      name: place('name'),
      unitPriceCents: place('unitPriceCents'),
      quantity: place('quantity'),
      amountCents: place('amountCents'),
      taxCents: place('taxCents'),
      tallyMarks: place('tallyMarks'),
      contains: place('contains'),
      containsNone: place('containsNone'),
      mayContain: place('mayContain'),
      storage: place('storage'),
      bestQualityMin: place('bestQualityMin'),
      bestQualityMax: place('bestQualityMax'),
    })
    .prepare(),
)

type OrderValues = Omit<
  typeof order.$inferInsert,
  'id' | 'status' | 'refundedCents' | 'paidAt' | 'endedAt' | 'replacedById'
>
export type NewLine = Omit<
  typeof orderLine.$inferInsert,
  'id' | 'orderId' | 'position' | 'recipientId' | 'refundedQuantity' | 'refundedCents'
> & { recipientLabel: string | null }

export type NewOrder = {
  order: OrderValues
  customer: { name: string; email: string; relationship: string }
  lines: NewLine[]
}

/** Writes an order that waits for its payment, with a recipient for each label on its lines. */
export function insertOrder(tx: Tx, input: NewOrder) {
  const row = insertOrderRow(tx).get(input.order)
  hit('F02')
  insertCustomerRow(tx).run({ orderId: row.id, ...input.customer })
  const recipients = new Map<string | null, number>()
  const recipientFor = (label: string | null) => {
    let id = recipients.get(label)
    if (id === undefined) {
      id = insertRecipientRow(tx).get({ orderId: row.id, label, handover: 'seller_family' }).id
      recipients.set(label, id)
    }
    return id
  }
  input.lines.forEach(({ recipientLabel, ...line }, index) => {
    insertLineRow(tx).run({
      ...line,
      orderId: row.id,
      position: index + 1,
      recipientId: recipientFor(recipientLabel),
      containsNone: line.containsNone ? 1 : 0,
      bestQualityMin: line.bestQualityMin ?? null,
      bestQualityMax: line.bestQualityMax ?? null,
    })
  })
  return row
}
