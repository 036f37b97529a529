import { storeStatus } from '#shared/deadline/store-status.ts'
import { DEFAULT_ORDER_LIMITS } from '#shared/pricing/limits.ts'
import type { StoreView } from '#shared/stores/contract.ts'
import type { Locale } from '#shared/wire.ts'
import { type KeptCatalog, keptCatalog } from '../catalogs/kept-catalog.ts'
import type { Db } from '../db/open.ts'
import { findStore, type Store } from './queries.ts'

/** The name a seller has in public: first name and last initial, and only once the family agreed. */
export function publicName(of: {
  sellerKind: string
  firstName: string | null
  lastName: string | null
  nameShownSince: number | null
}): string | null {
  if (of.sellerKind !== 'student' || of.firstName === null || of.nameShownSince === null) return null
  const initial = [...(of.lastName ?? '')][0]
  return initial ? `${of.firstName} ${initial}.` : of.firstName
}

/** Who a customer is told gets the credit: the seller by public name, else the group, else the organization. */
export function creditName(store: Store): string {
  return publicName(store) ?? store.groupName ?? store.organizationName
}

export function statusOf(store: Store, now: number) {
  return storeStatus(
    {
      opensAt: store.opensAt,
      closesAt: store.closesAt,
      closedEarlyAt: store.closedEarlyAt,
      linkPaused: store.linkState === 'paused',
      launched: store.launchedAt !== null,
    },
    now,
  )
}

function head(store: Store, now: number): Omit<StoreView, 'categories' | 'items'> {
  const name = publicName(store)
  return {
    seller: name === null ? null : { displayName: name },
    group: store.groupName === null ? null : { name: store.groupName },
    organization: { name: store.organizationName },
    drive: {
      status: statusOf(store, now),
      opensAt: new Date(store.opensAt).toISOString(),
      closesAt: new Date(store.closedEarlyAt ?? store.closesAt).toISOString(),
      timeZone: store.timeZone,
      deliveryFrom: store.deliveryFrom,
      deliveryTo: store.deliveryTo,
      currency: store.currency,
      purpose: store.purpose,
      shareBp: store.shareBp,
      organizationBearsCardFees: store.organizationBearsCardFees,
      cardFee: { rateBp: store.feeRateBp, fixedCents: store.feeFixedCents },
      tax: JSON.parse(store.tax),
      contact: { name: store.contactName, email: store.contactEmail },
      limits: {
        maxLineQuantity: DEFAULT_ORDER_LIMITS.maxLineQuantity,
        maxLines: DEFAULT_ORDER_LIMITS.maxLines,
        maxItems: DEFAULT_ORDER_LIMITS.maxItems,
        maxOrderCents: DEFAULT_ORDER_LIMITS.maxOrderCents,
        minGiftCents: DEFAULT_ORDER_LIMITS.minGiftCents,
        maxGiftCents: DEFAULT_ORDER_LIMITS.maxGiftCents,
      },
    },
    serverNow: new Date(now).toISOString(),
  }
}

function catalogOf(db: Db, store: Store, locale: Locale, now: number): KeptCatalog {
  return keptCatalog(db, { versionId: store.catalogVersionId, catalogId: store.catalogId, locale }, now)
}

/** What a store link shows, or null when there is nothing at it. */
export function findStoreView(
  db: Db,
  options: { token: string; locale: Locale; now: number },
): StoreView | null {
  const store = findStore(db.orm, options.token)
  if (!store) return null
  const { categories, items } = catalogOf(db, store, options.locale, options.now)
  return { ...head(store, options.now), categories, items }
}

/** The same, serialised around the kept catalog: the read that every visitor of every store makes. */
export function findStoreJson(
  db: Db,
  options: { token: string; locale: Locale; now: number },
): string | null {
  const store = findStore(db.orm, options.token)
  if (!store) return null
  const top = JSON.stringify(head(store, options.now))
  return `${top.slice(0, -1)},${catalogOf(db, store, options.locale, options.now).json}}`
}
