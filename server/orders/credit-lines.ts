import { sql } from 'drizzle-orm'
import { prepared } from '../db/prepared.ts'
import { driveDay, sellerTally } from '../db/schema/orders.ts'
import type { Tx } from '../db/transaction.ts'
import type { OrderLineRow, OrderRow } from './queries.ts'

const place = sql.placeholder

const addToTally = prepared(orm =>
  orm
    .insert(sellerTally)
    .values({
      driveId: place('driveId'),
      sellerId: place('sellerId'),
      code: place('code'),
      channel: 'online',
      state: 'credited',
      quantity: place('quantity'),
      marks: place('marks'),
      amountCents: place('amountCents'),
    })
    .onConflictDoUpdate({
      target: [
        sellerTally.driveId,
        sellerTally.sellerId,
        sellerTally.code,
        sellerTally.channel,
        sellerTally.state,
      ],
      set: {
        quantity: sql`${sellerTally.quantity} + excluded.quantity`,
        marks: sql`${sellerTally.marks} + excluded.marks`,
        amountCents: sql`${sellerTally.amountCents} + excluded.amount_cents`,
      },
    })
    .prepare(),
)

const addToDay = prepared(orm =>
  orm
    .insert(driveDay)
    .values({
      driveId: place('driveId'),
      day: place('day'),
      orders: 1,
      items: place('items'),
      itemsCents: place('itemsCents'),
      giftCents: place('giftCents'),
      refundedCents: 0,
    })
    .onConflictDoUpdate({
      target: [driveDay.driveId, driveDay.day],
      set: {
        orders: sql`${driveDay.orders} + 1`,
        items: sql`${driveDay.items} + excluded.items`,
        itemsCents: sql`${driveDay.itemsCents} + excluded.items_cents`,
        giftCents: sql`${driveDay.giftCents} + excluded.gift_cents`,
      },
    })
    .prepare(),
)

/** Credits every line of a paid order to its seller, and the order to its local day. */
export function creditLines(tx: Tx, paid: { order: OrderRow; lines: OrderLineRow[]; day: string }) {
  for (const line of paid.lines)
    addToTally(tx).run({
      driveId: paid.order.driveId,
      sellerId: line.sellerId,
      code: line.code,
      quantity: line.quantity,
      marks: line.quantity * line.tallyMarks,
      amountCents: line.amountCents,
    })
  addToDay(tx).run({
    driveId: paid.order.driveId,
    day: paid.day,
    items: paid.order.itemCount,
    itemsCents: paid.order.itemsCents,
    giftCents: paid.order.giftCents,
  })
}
