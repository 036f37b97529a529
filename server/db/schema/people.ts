import { sql } from 'drizzle-orm'
import { check, index, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import { drive } from './drives.ts'
import { user } from './identity.ts'
import { seller } from './sellers.ts'

/** What somebody may do: looked up on every request, so that taking it away counts at once. */
export const staffMember = sqliteTable(
  'staff_member',
  {
    userId: text()
      .notNull()
      .references(() => user.id),
    role: text().notNull(),
    since: integer().notNull(),
  },
  t => [
    primaryKey({ columns: [t.userId, t.role] }),
    check('staff_member_role', sql`${t.role} in ('admin', 'rep', 'clerk', 'warehouse')`),
  ],
)

export const driveMember = sqliteTable(
  'drive_member',
  {
    driveId: integer()
      .notNull()
      .references(() => drive.id),
    userId: text()
      .notNull()
      .references(() => user.id),
    role: text().notNull(),
    since: integer().notNull(),
  },
  t => [
    primaryKey({ columns: [t.driveId, t.userId] }),
    index('drive_member_user').on(t.userId),
    check('drive_member_role', sql`${t.role} in ('lead', 'treasurer', 'helper')`),
  ],
)

export const guardian = sqliteTable(
  'guardian',
  {
    sellerId: integer()
      .notNull()
      .references(() => seller.id),
    userId: text()
      .notNull()
      .references(() => user.id),
    since: integer().notNull(),
  },
  t => [primaryKey({ columns: [t.sellerId, t.userId] }), index('guardian_user').on(t.userId)],
)
