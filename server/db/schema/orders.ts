import { sql } from 'drizzle-orm'
import { check, index, integer, primaryKey, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { catalogItem } from './catalogs.ts'
import { drive, driveTerms } from './drives.ts'
import { user } from './identity.ts'
import { seller, storeLink } from './sellers.ts'

export const order = sqliteTable(
  'customer_order',
  {
    id: integer().primaryKey(),
    /** Opens the receipt; the customer's only key to the order. */
    publicId: text().notNull().unique(),
    number: text().notNull().unique(),
    driveId: integer()
      .notNull()
      .references(() => drive.id),
    termsId: integer()
      .notNull()
      .references(() => driveTerms.id),
    linkId: integer()
      .notNull()
      .references(() => storeLink.id),
    status: text().notNull(),
    idempotencyKey: text().notNull(),
    requestHash: text().notNull(),
    locale: text().notNull(),
    currency: text().notNull(),
    itemCount: integer().notNull(),
    itemsCents: integer().notNull(),
    giftCents: integer().notNull(),
    taxCents: integer().notNull(),
    coverCents: integer().notNull(),
    totalCents: integer().notNull(),
    /** The card fee on the total by the terms; what the service really took comes with its payout. */
    feeCents: integer().notNull(),
    refundedCents: integer().notNull().default(0),
    placedAt: integer().notNull(),
    paidAt: integer(),
    endedAt: integer(),
    /** The order from the same pad, placed after this one, that takes its place. */
    replacedById: integer(),
  },
  t => [
    uniqueIndex('customer_order_key').on(t.linkId, t.idempotencyKey),
    index('customer_order_drive_placed').on(t.driveId, t.placedAt),
    index('customer_order_drive_status').on(t.driveId, t.status, t.placedAt),
    index('customer_order_waiting').on(t.placedAt).where(sql`${t.status} = 'awaiting_payment'`),
    check(
      'customer_order_status',
      sql`${t.status} in ('awaiting_payment', 'paid', 'partly_refunded', 'refunded', 'canceled', 'expired')`,
    ),
    check(
      'customer_order_total',
      sql`${t.totalCents} = ${t.itemsCents} + ${t.giftCents} + ${t.taxCents} + ${t.coverCents}`,
    ),
    check(
      'customer_order_amounts',
      sql`${t.itemsCents} >= 0 and ${t.giftCents} >= 0 and ${t.taxCents} >= 0 and ${t.coverCents} >= 0 and ${t.feeCents} >= 0 and ${t.totalCents} > 0`,
    ),
    check('customer_order_refunds', sql`${t.refundedCents} between 0 and ${t.totalCents}`),
    check(
      'customer_order_paid',
      sql`(${t.status} in ('paid', 'partly_refunded', 'refunded')) = (${t.paidAt} is not null)`,
    ),
    check('customer_order_locale', sql`${t.locale} in ('en', 'es')`),
  ],
)

/** Who ordered; apart from the money, so that it can be erased alone. */
export const orderCustomer = sqliteTable('order_customer', {
  orderId: integer()
    .primaryKey()
    .references(() => order.id),
  name: text().notNull(),
  email: text().notNull(),
  relationship: text().notNull(),
})

/** For whom something on the order is meant, and how it reaches them. */
export const orderRecipient = sqliteTable(
  'order_recipient',
  {
    id: integer().primaryKey(),
    orderId: integer()
      .notNull()
      .references(() => order.id),
    /** Null: the customer. */
    label: text(),
    handover: text().notNull(),
  },
  t => [
    index('order_recipient_order').on(t.orderId),
    check('order_recipient_handover', sql`${t.handover} in ('seller_family', 'family_keeps', 'give_away')`),
  ],
)

/** A line with everything it was sold with: the receipt never changes afterwards. */
export const orderLine = sqliteTable(
  'order_line',
  {
    id: integer().primaryKey(),
    orderId: integer()
      .notNull()
      .references(() => order.id),
    position: integer().notNull(),
    recipientId: integer()
      .notNull()
      .references(() => orderRecipient.id),
    sellerId: integer()
      .notNull()
      .references(() => seller.id),
    itemId: integer()
      .notNull()
      .references(() => catalogItem.id),
    code: text().notNull(),
    name: text().notNull(),
    unitPriceCents: integer().notNull(),
    quantity: integer().notNull(),
    amountCents: integer().notNull(),
    taxCents: integer().notNull(),
    tallyMarks: integer().notNull(),
    contains: text().notNull(),
    containsNone: integer({ mode: 'boolean' }).notNull(),
    mayContain: text().notNull(),
    storage: text().notNull(),
    bestQualityMin: integer(),
    bestQualityMax: integer(),
    refundedQuantity: integer().notNull().default(0),
    refundedCents: integer().notNull().default(0),
  },
  t => [
    uniqueIndex('order_line_position').on(t.orderId, t.position),
    index('order_line_seller').on(t.sellerId, t.orderId),
    check('order_line_quantity', sql`${t.quantity} between 1 and 99`),
    check('order_line_amount', sql`${t.amountCents} = ${t.quantity} * ${t.unitPriceCents}`),
    check('order_line_refunded_quantity', sql`${t.refundedQuantity} between 0 and ${t.quantity}`),
    check('order_line_refunded', sql`${t.refundedCents} between 0 and ${t.amountCents} + ${t.taxCents}`),
  ],
)

/** What the sellers of a drive sold, kept in the same transaction as the orders that make it up. */
export const sellerTally = sqliteTable(
  'seller_tally',
  {
    driveId: integer()
      .notNull()
      .references(() => drive.id),
    sellerId: integer()
      .notNull()
      .references(() => seller.id),
    code: text().notNull(),
    channel: text().notNull(),
    state: text().notNull(),
    quantity: integer().notNull(),
    marks: integer().notNull(),
    amountCents: integer().notNull(),
  },
  t => [
    primaryKey({ columns: [t.driveId, t.sellerId, t.code, t.channel, t.state] }),
    index('seller_tally_seller').on(t.sellerId, t.state),
    check('seller_tally_channel', sql`${t.channel} in ('online', 'paper')`),
    check('seller_tally_state', sql`${t.state} in ('credited', 'provisional')`),
    check(
      'seller_tally_never_negative',
      sql`${t.quantity} >= 0 and ${t.amountCents} >= 0 and ${t.marks} >= 0`,
    ),
  ],
)

/** Paid orders per local day of the drive, by the day they were placed. */
export const driveDay = sqliteTable(
  'drive_day',
  {
    driveId: integer()
      .notNull()
      .references(() => drive.id),
    day: text().notNull(),
    orders: integer().notNull(),
    items: integer().notNull(),
    itemsCents: integer().notNull(),
    giftCents: integer().notNull(),
    refundedCents: integer().notNull(),
  },
  t => [primaryKey({ columns: [t.driveId, t.day] })],
)

/** A family does not know who ordered. The organizer decides; the goods are held until then. */
export const orderFlag = sqliteTable(
  'order_flag',
  {
    id: integer().primaryKey(),
    publicId: text().notNull().unique(),
    orderId: integer()
      .notNull()
      .references(() => order.id),
    sellerId: integer()
      .notNull()
      .references(() => seller.id),
    raisedBy: text()
      .notNull()
      .references(() => user.id),
    note: text().notNull(),
    raisedAt: integer().notNull(),
    resolvedAt: integer(),
    resolvedBy: text().references(() => user.id),
    resolution: text(),
  },
  t => [
    uniqueIndex('order_flag_one_open').on(t.orderId, t.sellerId).where(sql`${t.resolvedAt} is null`),
    index('order_flag_open').on(t.raisedAt).where(sql`${t.resolvedAt} is null`),
    check(
      'order_flag_resolution',
      sql`${t.resolution} is null or ${t.resolution} in ('known', 'moved', 'refunded')`,
    ),
    check('order_flag_resolved', sql`(${t.resolvedAt} is null) = (${t.resolution} is null)`),
  ],
)
