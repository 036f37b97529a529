import { createHash } from 'node:crypto'
import { copyFileSync, existsSync, mkdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import {
  catalog,
  catalogCategory,
  catalogItem,
  catalogItemText,
  catalogVersion,
  picture,
  safetyRevision,
} from '../db/schema/catalogs.ts'
import type { Tx } from '../db/transaction.ts'
import { distDir } from '../paths.ts'
import { categories, winterLarder } from './catalog.ts'
import { demoId } from './demo-ids.ts'

/** Puts the drawn pictures, made at build time, where uploaded ones would be; code → content hash. */
export function copyPictures(dataDir: string): Map<string, string> {
  const hashes = new Map<string, string>()
  const to = join(dataDir, 'pictures')
  mkdirSync(to, { recursive: true })
  for (const { code } of winterLarder) {
    const from = (width: number) => join(distDir, 'pictures', `${code}-${width}.webp`)
    if (!existsSync(from(960))) continue
    const hash = createHash('sha256')
      .update(readFileSync(from(960)))
      .digest('hex')
    for (const width of [480, 960]) copyFileSync(from(width), join(to, `${hash}-${width}.webp`))
    hashes.set(code, hash)
  }
  return hashes
}

/** Writes the Winter Larder, published long enough ago for every drive of the demonstration. */
export function seedCatalog(tx: Tx, options: { pictures: Map<string, string>; at: number }) {
  const { at } = options
  const { id: catalogId } = tx
    .insert(catalog)
    .values({ publicId: demoId('catalog'), name: 'Winter Larder', createdAt: at })
    .returning()
    .get()
  const { id: versionId } = tx
    .insert(catalogVersion)
    .values({ catalogId, version: 1, publishedAt: at })
    .returning()
    .get()
  for (const hash of new Set(options.pictures.values()))
    tx.insert(picture).values({ hash, width: 960, height: 800, createdAt: at }).run()
  categories.forEach((category, place) => {
    tx.insert(catalogCategory)
      .values({ versionId, slug: category.slug, position: place, nameEn: category.en, nameEs: category.es })
      .run()
  })
  winterLarder.forEach((item, place) => {
    const { id: itemId } = tx
      .insert(catalogItem)
      .values({
        versionId,
        code: item.code,
        slug: item.slug,
        category: item.category,
        position: place,
        priceCents: item.priceCents,
        netWeightG: item.netWeightG,
        printedWeight: item.printedWeight,
        taxCategory: item.taxCategory,
        dietary: JSON.stringify(item.dietary),
        casePack: item.casePack,
        volumeMl: item.volumeMl,
        pictureHash: options.pictures.get(item.code) ?? null,
      })
      .returning()
      .get()
    for (const locale of ['en', 'es'] as const) {
      tx.insert(catalogItemText)
        .values({
          itemId,
          locale,
          name: locale === 'en' ? item.name : item.nameEs,
          pieces: item.pieces[locale],
          serves: item.serves[locale],
          description: item.description[locale],
          preparation: item.preparation[locale],
        })
        .run()
    }
    tx.insert(safetyRevision)
      .values({
        catalogId,
        code: item.code,
        effectiveAt: at,
        contains: JSON.stringify(item.contains),
        containsNone: item.containsNone,
        mayContain: JSON.stringify(item.mayContain),
        storage: item.storage,
        bestQualityMin: item.bestQualityMonths?.[0] ?? null,
        bestQualityMax: item.bestQualityMonths?.[1] ?? null,
      })
      .run()
  })
  return { catalogId, versionId }
}
