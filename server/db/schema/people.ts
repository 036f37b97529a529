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

/** Somebody was asked to join. The token is kept only as its hash; accepting uses it up. */
export const invitation = sqliteTable(
  'invitation',
  {
    id: integer().primaryKey(),
    publicId: text().notNull().unique(),
    tokenHash: text().notNull().unique(),
    kind: text().notNull(),
    driveId: integer()
      .notNull()
      .references(() => drive.id),
    sellerId: integer().references(() => seller.id),
    role: text(),
    email: text().notNull(),
    invitedBy: text()
      .notNull()
      .references(() => user.id),
    createdAt: integer().notNull(),
    expiresAt: integer().notNull(),
    acceptedAt: integer(),
    acceptedBy: text().references(() => user.id),
    withdrawnAt: integer(),
  },
  t => [
    index('invitation_seller').on(t.sellerId),
    index('invitation_drive').on(t.driveId),
    check('invitation_kind', sql`${t.kind} in ('family', 'team')`),
    check('invitation_family_names_a_seller', sql`(${t.kind} = 'family') = (${t.sellerId} is not null)`),
    check(
      'invitation_team_names_a_role',
      sql`(${t.kind} = 'team') = (${t.role} is not null and ${t.role} in ('lead', 'treasurer', 'helper'))`,
    ),
  ],
)
