import { sql } from 'drizzle-orm'
import { check, index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { drive } from './drives.ts'

export const sellerGroup = sqliteTable(
  'seller_group',
  {
    id: integer().primaryKey(),
    publicId: text().notNull().unique(),
    driveId: integer()
      .notNull()
      .references(() => drive.id),
    name: text().notNull(),
    position: integer().notNull(),
  },
  t => [uniqueIndex('seller_group_name').on(t.driveId, t.name)],
)

/**
 * Whom an order line credits: a student, or a group or the whole organization for orders of people who know
 * no seller, so that every line has somebody to credit.
 */
export const seller = sqliteTable(
  'seller',
  {
    id: integer().primaryKey(),
    publicId: text().notNull().unique(),
    driveId: integer()
      .notNull()
      .references(() => drive.id),
    kind: text().notNull(),
    groupId: integer().references(() => sellerGroup.id),
    /** Three digits, unique in the drive; students only. */
    number: integer(),
    withdrawnAt: integer(),
    createdAt: integer().notNull(),
  },
  t => [
    uniqueIndex('seller_number').on(t.driveId, t.number),
    index('seller_group_members').on(t.groupId),
    check('seller_kind', sql`${t.kind} in ('student', 'group', 'organization')`),
    check('seller_number_of_students', sql`(${t.kind} = 'student') = (${t.number} is not null)`),
    check('seller_number_range', sql`${t.number} is null or ${t.number} between 100 and 999`),
    check('seller_group_where_due', sql`${t.kind} = 'organization' or ${t.groupId} is not null`),
  ],
)

/** A student's name, apart from everything that counts, so that it can be erased alone. */
export const sellerPerson = sqliteTable('seller_person', {
  sellerId: integer()
    .primaryKey()
    .references(() => seller.id),
  firstName: text().notNull(),
  lastName: text().notNull(),
  /** When a guardian agreed that the store may show first name and last initial. */
  nameShownSince: integer(),
})

/** A store link. Replacing one makes the old one dead and leaves what was ordered through it. */
export const storeLink = sqliteTable(
  'store_link',
  {
    id: integer().primaryKey(),
    token: text().notNull().unique(),
    driveId: integer()
      .notNull()
      .references(() => drive.id),
    sellerId: integer()
      .notNull()
      .references(() => seller.id),
    state: text().notNull(),
    createdAt: integer().notNull(),
    endedAt: integer(),
  },
  t => [
    index('store_link_seller').on(t.sellerId),
    uniqueIndex('store_link_one_alive').on(t.sellerId).where(sql`${t.state} <> 'replaced'`),
    check('store_link_state', sql`${t.state} in ('live', 'paused', 'replaced')`),
    check('store_link_token', sql`length(${t.token}) = 22`),
    check('store_link_ended', sql`(${t.state} = 'replaced') = (${t.endedAt} is not null)`),
  ],
)
