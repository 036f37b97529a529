import { sql } from 'drizzle-orm'
import { check, index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { catalogVersion } from './catalogs.ts'
import { user } from './identity.ts'

/** The school group that raises the money. */
export const organization = sqliteTable('organization', {
  id: integer().primaryKey(),
  publicId: text().notNull().unique(),
  name: text().notNull(),
  createdAt: integer().notNull(),
})

export const drive = sqliteTable(
  'drive',
  {
    id: integer().primaryKey(),
    publicId: text().notNull().unique(),
    organizationId: integer()
      .notNull()
      .references(() => organization.id),
    catalogVersionId: integer()
      .notNull()
      .references(() => catalogVersion.id),
    name: text().notNull(),
    purpose: text().notNull(),
    timeZone: text().notNull(),
    currency: text().notNull().default('usd'),
    /** Wall times as agreed, in the drive's own zone, and the instants derived from them. */
    opensOn: text().notNull(),
    opensTime: text().notNull(),
    closesOn: text().notNull(),
    closesTime: text().notNull(),
    opensAt: integer().notNull(),
    closesAt: integer().notNull(),
    closedEarlyAt: integer(),
    turnInOn: text().notNull(),
    launchedAt: integer(),
    /** Set when an invariant failed: no payment is taken until staff has looked. */
    paymentsStoppedAt: integer(),
    paymentsStoppedWhy: text(),
    contactName: text().notNull(),
    contactEmail: text().notNull(),
    payeeWording: text().notNull(),
    goalCents: integer(),
    repUserId: text().references(() => user.id),
    createdAt: integer().notNull(),
  },
  t => [
    index('drive_organization').on(t.organizationId),
    index('drive_rep').on(t.repUserId),
    index('drive_closes').on(t.closesAt),
    check('drive_opens_before_it_closes', sql`${t.opensAt} < ${t.closesAt}`),
    check('drive_currency', sql`${t.currency} = 'usd'`),
  ],
)

/** The terms agreed before the first sale; never changed, only followed by a next version. */
export const driveTerms = sqliteTable(
  'drive_terms',
  {
    id: integer().primaryKey(),
    driveId: integer()
      .notNull()
      .references(() => drive.id),
    version: integer().notNull(),
    shareBp: integer().notNull(),
    feeRateBp: integer().notNull(),
    feeFixedCents: integer().notNull(),
    organizationBearsCardFees: integer({ mode: 'boolean' }).notNull(),
    /** Tax terms as JSON, read through their zod schema. */
    tax: text().notNull(),
    sellerOfRecord: text().notNull(),
    prizeEvery: integer().notNull(),
    prizesBorneBy: text().notNull(),
    deliveryMinimumCents: integer().notNull(),
    freightCents: integer().notNull(),
    invoiceDueDays: integer().notNull(),
    claimDays: integer().notNull(),
    /** The delivery window promised to customers, both days included. */
    deliveryFrom: text().notNull(),
    deliveryTo: text().notNull(),
    createdAt: integer().notNull(),
  },
  t => [
    uniqueIndex('drive_terms_version').on(t.driveId, t.version),
    check('drive_terms_share', sql`${t.shareBp} between 0 and 10000`),
    check('drive_terms_window', sql`${t.deliveryFrom} <= ${t.deliveryTo}`),
    check('drive_terms_seller_of_record', sql`${t.sellerOfRecord} in ('organization', 'operator')`),
    check(
      'drive_terms_prizes',
      sql`${t.prizeEvery} > 0 and ${t.prizesBorneBy} in ('organization', 'operator')`,
    ),
  ],
)
