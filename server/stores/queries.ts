import { and, desc, eq, lte, sql } from 'drizzle-orm'
import { prepared } from '../db/prepared.ts'
import { catalogVersion } from '../db/schema/catalogs.ts'
import { drive, driveTerms, organization } from '../db/schema/drives.ts'
import { seller, sellerGroup, sellerPerson, storeLink } from '../db/schema/sellers.ts'
import type { Tx } from '../db/transaction.ts'

const linkByToken = prepared(orm =>
  orm
    .select({
      linkId: storeLink.id,
      token: storeLink.token,
      linkState: storeLink.state,
      sellerId: seller.id,
      sellerKind: seller.kind,
      withdrawnAt: seller.withdrawnAt,
      firstName: sellerPerson.firstName,
      lastName: sellerPerson.lastName,
      nameShownSince: sellerPerson.nameShownSince,
      groupName: sellerGroup.name,
      organizationName: organization.name,
      driveId: drive.id,
      drivePublicId: drive.publicId,
      driveName: drive.name,
      purpose: drive.purpose,
      timeZone: drive.timeZone,
      currency: drive.currency,
      opensAt: drive.opensAt,
      closesAt: drive.closesAt,
      closedEarlyAt: drive.closedEarlyAt,
      launchedAt: drive.launchedAt,
      paymentsStoppedAt: drive.paymentsStoppedAt,
      contactName: drive.contactName,
      contactEmail: drive.contactEmail,
      catalogVersionId: drive.catalogVersionId,
      catalogId: catalogVersion.catalogId,
      termsId: driveTerms.id,
      shareBp: driveTerms.shareBp,
      feeRateBp: driveTerms.feeRateBp,
      feeFixedCents: driveTerms.feeFixedCents,
      organizationBearsCardFees: driveTerms.organizationBearsCardFees,
      tax: driveTerms.tax,
      deliveryFrom: driveTerms.deliveryFrom,
      deliveryTo: driveTerms.deliveryTo,
    })
    .from(storeLink)
    .innerJoin(seller, eq(seller.id, storeLink.sellerId))
    .leftJoin(sellerPerson, eq(sellerPerson.sellerId, seller.id))
    .leftJoin(sellerGroup, eq(sellerGroup.id, seller.groupId))
    .innerJoin(drive, eq(drive.id, storeLink.driveId))
    .innerJoin(organization, eq(organization.id, drive.organizationId))
    .innerJoin(catalogVersion, eq(catalogVersion.id, drive.catalogVersionId))
    .innerJoin(driveTerms, eq(driveTerms.driveId, drive.id))
    .where(eq(storeLink.token, sql.placeholder('token')))
    .orderBy(desc(driveTerms.version))
    .limit(1)
    .prepare(),
)

/** Everything a store shows beside its items. Null for a link that is unknown, replaced or of a withdrawn seller. */
export function findStore(tx: Tx, token: string) {
  const found = linkByToken(tx).get({ token })
  if (!found || found.linkState === 'replaced' || found.withdrawnAt !== null) return null
  return found
}
export type Store = NonNullable<ReturnType<typeof findStore>>

/** The link that a seller's family hands out now, live or paused. */
export function findCurrentLink(tx: Tx, sellerId: number) {
  return (
    tx
      .select({ linkId: storeLink.id, token: storeLink.token, state: storeLink.state })
      .from(storeLink)
      .where(and(eq(storeLink.sellerId, sellerId), sql`${storeLink.state} <> 'replaced'`))
      .get() ?? null
  )
}

/** Tax and fee terms by which an order placed at `at` is priced. */
export function findTerms(tx: Tx, driveId: number, at: number) {
  return (
    tx
      .select()
      .from(driveTerms)
      .where(and(eq(driveTerms.driveId, driveId), lte(driveTerms.createdAt, at)))
      .orderBy(desc(driveTerms.version))
      .limit(1)
      .get() ?? null
  )
}
