import { sql } from 'drizzle-orm'
import { check, index, integer, primaryKey, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'

/** A picture, stored as files named by the hash of its content. */
export const picture = sqliteTable('picture', {
  hash: text().primaryKey(),
  width: integer().notNull(),
  height: integer().notNull(),
  createdAt: integer().notNull(),
})

export const catalog = sqliteTable('catalog', {
  id: integer().primaryKey(),
  publicId: text().notNull().unique(),
  name: text().notNull(),
  createdAt: integer().notNull(),
})

/** An immutable commercial version: codes, names, prices, pictures. A launched drive points at one. */
export const catalogVersion = sqliteTable(
  'catalog_version',
  {
    id: integer().primaryKey(),
    catalogId: integer()
      .notNull()
      .references(() => catalog.id),
    version: integer().notNull(),
    publishedAt: integer().notNull(),
  },
  t => [uniqueIndex('catalog_version_number').on(t.catalogId, t.version)],
)

export const catalogCategory = sqliteTable(
  'catalog_category',
  {
    versionId: integer()
      .notNull()
      .references(() => catalogVersion.id),
    slug: text().notNull(),
    position: integer().notNull(),
    nameEn: text().notNull(),
    nameEs: text(),
  },
  t => [primaryKey({ columns: [t.versionId, t.slug] })],
)

export const catalogItem = sqliteTable(
  'catalog_item',
  {
    id: integer().primaryKey(),
    versionId: integer()
      .notNull()
      .references(() => catalogVersion.id),
    code: text().notNull(),
    slug: text().notNull(),
    category: text().notNull(),
    position: integer().notNull(),
    priceCents: integer().notNull(),
    netWeightG: integer().notNull(),
    printedWeight: text().notNull(),
    taxCategory: text().notNull(),
    dietary: text().notNull(),
    casePack: integer().notNull(),
    volumeMl: integer().notNull(),
    tallyMarks: integer().notNull().default(1),
    pictureHash: text().references(() => picture.hash),
    available: integer({ mode: 'boolean' }).notNull().default(true),
  },
  t => [
    uniqueIndex('catalog_item_code').on(t.versionId, t.code),
    check('catalog_item_code_form', sql`${t.code} glob '[0-9][0-9][0-9][0-9]'`),
    check('catalog_item_price', sql`${t.priceCents} > 0 and ${t.priceCents} < 100000000`),
    check('catalog_item_sizes', sql`${t.netWeightG} > 0 and ${t.casePack} > 0 and ${t.volumeMl} > 0`),
  ],
)

/** What an item is called and how it is made ready, per language; English is always there. */
export const catalogItemText = sqliteTable(
  'catalog_item_text',
  {
    itemId: integer()
      .notNull()
      .references(() => catalogItem.id),
    locale: text().notNull(),
    name: text().notNull(),
    pieces: text().notNull(),
    serves: text().notNull(),
    description: text().notNull(),
    preparation: text().notNull(),
  },
  t => [
    primaryKey({ columns: [t.itemId, t.locale] }),
    check('catalog_item_text_locale', sql`${t.locale} in ('en', 'es')`),
  ],
)

/** What is in an item and how it is kept; the newest revision that is in force counts, whatever was launched. */
export const safetyRevision = sqliteTable(
  'safety_revision',
  {
    id: integer().primaryKey(),
    catalogId: integer()
      .notNull()
      .references(() => catalog.id),
    code: text().notNull(),
    effectiveAt: integer().notNull(),
    contains: text().notNull(),
    containsNone: integer({ mode: 'boolean' }).notNull(),
    mayContain: text().notNull(),
    storage: text().notNull(),
    bestQualityMin: integer(),
    bestQualityMax: integer(),
  },
  t => [
    index('safety_revision_current').on(t.catalogId, t.code, t.effectiveAt),
    check(
      'safety_revision_complete',
      sql`json_valid(${t.contains}) and json_valid(${t.mayContain}) and (${t.contains} <> '[]' or ${t.containsNone} = 1)`,
    ),
    check(
      'safety_revision_storage',
      sql`${t.storage} in ('frozen_ready', 'frozen_raw_dough', 'frozen_to_cook', 'refrigerated_after_thaw', 'shelf_stable')`,
    ),
  ],
)
