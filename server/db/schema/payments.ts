import { sql } from 'drizzle-orm'
import { check, index, integer, primaryKey, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { user } from './identity.ts'
import { order, orderLine } from './orders.ts'

/** The payment service's page for an order. */
export const paymentSession = sqliteTable(
  'payment_session',
  {
    id: integer().primaryKey(),
    orderId: integer()
      .notNull()
      .unique()
      .references(() => order.id),
    sessionId: text().notNull().unique(),
    url: text().notNull(),
    expiresAt: integer().notNull(),
    paymentIntentId: text(),
    createdAt: integer().notNull(),
  },
  t => [index('payment_session_intent').on(t.paymentIntentId)],
)

/** Every event the payment service announced, once, as far as it matters to us. */
export const paymentEvent = sqliteTable(
  'payment_event',
  {
    eventId: text().primaryKey(),
    type: text().notNull(),
    /** The facts the event carried, without personal data. */
    facts: text().notNull(),
    receivedAt: integer().notNull(),
    processedAt: integer(),
    outcome: text(),
    attempts: integer().notNull().default(0),
  },
  t => [index('payment_event_open').on(t.receivedAt).where(sql`${t.processedAt} is null`)],
)

/** A payment that cannot be credited as it is: staff decides. */
export const paymentPutAside = sqliteTable(
  'payment_put_aside',
  {
    id: integer().primaryKey(),
    publicId: text().notNull().unique(),
    sessionId: text().notNull(),
    orderId: integer().references(() => order.id),
    reason: text().notNull(),
    amountCents: integer().notNull(),
    currency: text().notNull(),
    createdAt: integer().notNull(),
    resolvedAt: integer(),
    resolution: text(),
  },
  t => [
    uniqueIndex('payment_put_aside_once').on(t.sessionId, t.reason),
    index('payment_put_aside_open').on(t.createdAt).where(sql`${t.resolvedAt} is null`),
  ],
)

export const refund = sqliteTable(
  'refund',
  {
    id: integer().primaryKey(),
    publicId: text().notNull().unique(),
    orderId: integer()
      .notNull()
      .references(() => order.id),
    state: text().notNull(),
    amountCents: integer().notNull(),
    giftCents: integer().notNull(),
    coverCents: integer().notNull(),
    reason: text().notNull(),
    requestedBy: text().references(() => user.id),
    requestedAt: integer().notNull(),
    providerRefundId: text().unique(),
    finishedAt: integer(),
  },
  t => [
    index('refund_order').on(t.orderId),
    index('refund_open').on(t.requestedAt).where(sql`${t.state} = 'requested'`),
    check('refund_state', sql`${t.state} in ('requested', 'succeeded', 'failed')`),
    check('refund_amount', sql`${t.amountCents} > 0 and ${t.giftCents} >= 0 and ${t.coverCents} >= 0`),
  ],
)

export const refundLine = sqliteTable(
  'refund_line',
  {
    refundId: integer()
      .notNull()
      .references(() => refund.id),
    orderLineId: integer()
      .notNull()
      .references(() => orderLine.id),
    quantity: integer().notNull(),
    amountCents: integer().notNull(),
    taxCents: integer().notNull(),
  },
  t => [
    primaryKey({ columns: [t.refundId, t.orderLineId] }),
    check('refund_line_quantity', sql`${t.quantity} > 0 and ${t.amountCents} >= 0 and ${t.taxCents} >= 0`),
  ],
)
