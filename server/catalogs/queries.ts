import { and, eq, lte, sql } from 'drizzle-orm'
import type { Locale } from '#shared/wire.ts'
import { prepared } from '../db/prepared.ts'
import { catalogCategory, catalogItem, catalogItemText, safetyRevision } from '../db/schema/catalogs.ts'
import type { Tx } from '../db/transaction.ts'

const itemsOfVersion = prepared(orm =>
  orm
    .select({ item: catalogItem, text: catalogItemText })
    .from(catalogItem)
    .innerJoin(
      catalogItemText,
      and(eq(catalogItemText.itemId, catalogItem.id), eq(catalogItemText.locale, sql.placeholder('locale'))),
    )
    .where(eq(catalogItem.versionId, sql.placeholder('versionId')))
    .orderBy(catalogItem.position)
    .prepare(),
)

const revisionsInForce = prepared(orm =>
  orm
    .select()
    .from(safetyRevision)
    .where(
      and(
        eq(safetyRevision.catalogId, sql.placeholder('catalogId')),
        lte(safetyRevision.effectiveAt, sql.placeholder('at')),
      ),
    )
    .orderBy(safetyRevision.effectiveAt, safetyRevision.id)
    .prepare(),
)

const newestRevision = prepared(orm =>
  orm
    .select({ id: sql<number>`coalesce(max(${safetyRevision.id}), 0)` })
    .from(safetyRevision)
    .where(
      and(
        eq(safetyRevision.catalogId, sql.placeholder('catalogId')),
        lte(safetyRevision.effectiveAt, sql.placeholder('at')),
      ),
    )
    .prepare(),
)

export type SafetyStatement = {
  contains: string[]
  containsNone: boolean
  mayContain: string[]
  storage: string
  bestQualityMonths: [number, number] | null
}

/** The items of a frozen version with the safety statement in force now; items without one are left out. */
export function listItems(tx: Tx, of: { versionId: number; catalogId: number; locale: Locale; at: number }) {
  const english = itemsOfVersion(tx).all({ versionId: of.versionId, locale: 'en' })
  const own = new Map(
    of.locale === 'en'
      ? []
      : itemsOfVersion(tx)
          .all({ versionId: of.versionId, locale: of.locale })
          .map(row => [row.item.id, row.text] as const),
  )
  const safety = listSafety(tx, of)
  return english.flatMap(row => {
    const statement = safety.get(row.item.code)
    return statement ? [{ ...row.item, text: own.get(row.item.id) ?? row.text, safety: statement }] : []
  })
}
export type CatalogItem = ReturnType<typeof listItems>[number]

function listSafety(tx: Tx, of: { catalogId: number; at: number }): Map<string, SafetyStatement> {
  const current = new Map<string, SafetyStatement>()
  for (const row of revisionsInForce(tx).all({ catalogId: of.catalogId, at: of.at }))
    current.set(row.code, {
      contains: JSON.parse(row.contains),
      containsNone: row.containsNone,
      mayContain: JSON.parse(row.mayContain),
      storage: row.storage,
      bestQualityMonths:
        row.bestQualityMin !== null && row.bestQualityMax !== null
          ? [row.bestQualityMin, row.bestQualityMax]
          : null,
    })
  return current
}

/** Changes whenever another safety revision comes into force: the mark by which a kept catalog is stale. */
export function safetyMark(tx: Tx, of: { catalogId: number; at: number }): number {
  return newestRevision(tx).get(of)?.id ?? 0
}

export function listCategories(tx: Tx, versionId: number, locale: Locale) {
  return tx
    .select()
    .from(catalogCategory)
    .where(eq(catalogCategory.versionId, versionId))
    .orderBy(catalogCategory.position)
    .all()
    .map(row => ({ slug: row.slug, name: (locale === 'es' ? row.nameEs : null) ?? row.nameEn }))
}
