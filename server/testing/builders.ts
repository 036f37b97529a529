import { eq } from 'drizzle-orm'
import { closeInstant, resolveWallTime } from '#shared/deadline/wall-time.ts'
import type { PlaceOrderRequest } from '#shared/orders/contract.ts'
import type { DriveRole, StaffRole } from '#shared/people/contract.ts'
import {
  catalog,
  catalogCategory,
  catalogItem,
  catalogItemText,
  catalogVersion,
  safetyRevision,
} from '../db/schema/catalogs.ts'
import { drive, driveTerms, organization } from '../db/schema/drives.ts'
import { account, twoFactor, user } from '../db/schema/identity.ts'
import { driveMember, guardian, staffMember } from '../db/schema/people.ts'
import { seller, sellerGroup, sellerPerson, storeLink } from '../db/schema/sellers.ts'
import type { Deps } from '../deps.ts'
import { newPublicId } from '../ids.ts'
import { makeRecoveryCodes } from '../people/recovery-codes.ts'

const DAY_MS = 86_400_000
let serial = 0

export type ItemOptions = {
  code?: string
  name?: string
  nameEs?: string
  category?: string
  priceCents?: number
  contains?: string[]
  mayContain?: string[]
  storage?: string
  available?: boolean
  pictureHash?: string | null
}

/** Things with sensible defaults; each makes the parents it needs and values of its own. */
export function makeBuilders(deps: Deps) {
  const { orm } = deps.db
  const now = () => deps.now()

  function makeCatalog(options: { name?: string } = {}) {
    const made = orm
      .insert(catalog)
      .values({ publicId: newPublicId(), name: options.name ?? 'Winter Larder', createdAt: now() })
      .returning()
      .get()
    const version = orm
      .insert(catalogVersion)
      .values({ catalogId: made.id, version: 1, publishedAt: now() })
      .returning()
      .get()
    orm
      .insert(catalogCategory)
      .values({ versionId: version.id, slug: 'soups', position: 1, nameEn: 'Soups', nameEs: 'Sopas' })
      .run()
    return { catalogId: made.id, versionId: version.id }
  }

  function makeItem(of: { catalogId: number; versionId: number }, options: ItemOptions = {}) {
    serial += 1
    const code = options.code ?? String(1000 + serial * 7).slice(-4)
    const row = orm
      .insert(catalogItem)
      .values({
        versionId: of.versionId,
        code,
        slug: `item-${code}`,
        category: options.category ?? 'soups',
        position: serial,
        priceCents: options.priceCents ?? 1600,
        netWeightG: 680,
        printedWeight: '24 oz',
        taxCategory: 'food',
        dietary: '[]',
        casePack: 12,
        volumeMl: 900,
        pictureHash: options.pictureHash ?? null,
        available: options.available ?? true,
      })
      .returning()
      .get()
    orm
      .insert(catalogItemText)
      .values({
        itemId: row.id,
        locale: 'en',
        name: options.name ?? `Soup number ${code}`,
        pieces: '1 tub',
        serves: 'serves 4',
        description: 'A thick soup.',
        preparation: 'Heat until steaming.',
      })
      .run()
    orm
      .insert(safetyRevision)
      .values({
        catalogId: of.catalogId,
        code,
        effectiveAt: now() - DAY_MS,
        contains: JSON.stringify(options.contains ?? ['milk']),
        containsNone: options.contains?.length === 0,
        mayContain: JSON.stringify(options.mayContain ?? []),
        storage: options.storage ?? 'frozen_to_cook',
      })
      .run()
    return { ...row, name: options.name ?? `Soup number ${code}` }
  }

  type DriveOptions = {
    organizationName?: string
    timeZone?: string
    opensAt?: number
    closesAt?: number
    launched?: boolean
    tax?: unknown
    shareBp?: number
    prizeEvery?: number
    repUserId?: string
    items?: ItemOptions[]
  }

  function makeDrive(options: DriveOptions = {}) {
    const org = orm
      .insert(organization)
      .values({
        publicId: newPublicId(),
        name: options.organizationName ?? 'Saltmarsh High Robotics',
        createdAt: now(),
      })
      .returning()
      .get()
    const ofCatalog = makeCatalog()
    const items = (options.items ?? [{ code: '1204', name: 'Sweet corn chowder' }]).map(item =>
      makeItem(ofCatalog, item),
    )
    const made = orm
      .insert(drive)
      .values({
        publicId: newPublicId(),
        organizationId: org.id,
        catalogVersionId: ofCatalog.versionId,
        name: `${org.name} drive`,
        purpose: 'a regional trip',
        timeZone: options.timeZone ?? 'America/New_York',
        opensOn: '2026-11-10',
        opensTime: '08:00',
        closesOn: '2026-11-24',
        closesTime: '23:59',
        opensAt: options.opensAt ?? now() - 6 * DAY_MS,
        closesAt: options.closesAt ?? now() + 8 * DAY_MS,
        turnInOn: '2026-11-25',
        launchedAt: options.launched === false ? null : now() - 7 * DAY_MS,
        contactName: 'Ms. Abara',
        contactEmail: 'abara@saltmarsh.example.org',
        payeeWording: `payable to ${org.name}`,
        repUserId: options.repUserId ?? null,
        createdAt: now() - 30 * DAY_MS,
      })
      .returning()
      .get()
    orm
      .insert(driveTerms)
      .values({
        driveId: made.id,
        version: 1,
        shareBp: options.shareBp ?? 4000,
        feeRateBp: 290,
        feeFixedCents: 30,
        organizationBearsCardFees: true,
        tax: JSON.stringify(options.tax ?? { mode: 'none' }),
        sellerOfRecord: 'operator',
        prizeEvery: options.prizeEvery ?? 10,
        prizesBorneBy: 'operator',
        deliveryMinimumCents: 0,
        freightCents: 0,
        invoiceDueDays: 30,
        claimDays: 3,
        deliveryFrom: '2026-12-17',
        deliveryTo: '2026-12-18',
        createdAt: now() - 30 * DAY_MS,
      })
      .run()
    return { ...made, organizationName: org.name, ...ofCatalog, items }
  }
  type Drive = ReturnType<typeof makeDrive>

  function makeGroup(of: Drive, name = `Crew ${++serial}`) {
    return orm
      .insert(sellerGroup)
      .values({ publicId: newPublicId(), driveId: of.id, name, position: serial })
      .returning()
      .get()
  }

  type SellerOptions = {
    firstName?: string
    lastName?: string
    group?: { id: number }
    nameShown?: boolean
    number?: number
  }

  function makeSeller(of: Drive, options: SellerOptions = {}) {
    serial += 1
    const group = options.group ?? makeGroup(of)
    const row = orm
      .insert(seller)
      .values({
        publicId: newPublicId(),
        driveId: of.id,
        kind: 'student',
        groupId: group.id,
        number: options.number ?? 100 + (serial % 900),
        createdAt: now(),
      })
      .returning()
      .get()
    orm
      .insert(sellerPerson)
      .values({
        sellerId: row.id,
        firstName: options.firstName ?? 'Maya',
        lastName: options.lastName ?? 'Lindqvist',
        nameShownSince: options.nameShown === false ? null : now(),
      })
      .run()
    return row
  }

  /** Somebody to credit for a whole group or, without a group, for the organization. */
  function makeHouseSeller(of: Drive, group: { id: number } | null) {
    return orm
      .insert(seller)
      .values({
        publicId: newPublicId(),
        driveId: of.id,
        kind: group ? 'group' : 'organization',
        groupId: group?.id ?? null,
        createdAt: now(),
      })
      .returning()
      .get()
  }

  function makeLink(
    of: { id: number; driveId: number },
    options: { state?: 'live' | 'paused' | 'replaced' } = {},
  ) {
    const state = options.state ?? 'live'
    return orm
      .insert(storeLink)
      .values({
        token: newPublicId(),
        driveId: of.driveId,
        sellerId: of.id,
        state,
        createdAt: now(),
        endedAt: state === 'replaced' ? now() : null,
      })
      .returning()
      .get()
  }

  /** A store that takes orders: drive, seller and live link. */
  function makeStore(options: DriveOptions & { seller?: SellerOptions } = {}) {
    const ofDrive = makeDrive(options)
    const ofSeller = makeSeller(ofDrive, options.seller)
    const link = makeLink(ofSeller)
    return { drive: ofDrive, seller: ofSeller, link, token: link.token, items: ofDrive.items }
  }

  function makeUser(options: { name?: string; email?: string; password?: string } = {}) {
    serial += 1
    const id = newPublicId()
    const at = new Date(now())
    const email = options.email ?? `person${serial}@example.org`
    orm
      .insert(user)
      .values({
        id,
        name: options.name ?? 'Sam Person',
        email,
        emailVerified: true,
        createdAt: at,
        updatedAt: at,
      })
      .run()
    return { id, email, name: options.name ?? 'Sam Person' }
  }

  async function givePassword(userId: string, password: string) {
    const at = new Date(now())
    const hash = await deps.identity.hashPassword(password)
    orm.delete(account).where(eq(account.userId, userId)).run()
    orm
      .insert(account)
      .values({
        id: newPublicId(),
        userId,
        accountId: userId,
        providerId: 'credential',
        password: hash,
        createdAt: at,
        updatedAt: at,
      })
      .run()
  }

  /** An authenticator that is set up and proven. */
  async function giveSecondFactor(userId: string) {
    const secret = newPublicId() + newPublicId()
    const recoveryCodes = makeRecoveryCodes()
    const { seal } = deps.identity.secondFactor
    const sealed = { secret: await seal(secret), backupCodes: await seal(JSON.stringify(recoveryCodes)) }
    orm.delete(twoFactor).where(eq(twoFactor.userId, userId)).run()
    orm
      .insert(twoFactor)
      .values({ id: newPublicId(), userId, ...sealed, verified: true })
      .run()
    orm.update(user).set({ twoFactorEnabled: true }).where(eq(user.id, userId)).run()
    return { secret, recoveryCodes }
  }

  const makeStaff = (userId: string, role: StaffRole) =>
    orm.insert(staffMember).values({ userId, role, since: now() }).run()
  const makeMember = (of: { id: number }, userId: string, role: DriveRole) =>
    orm.insert(driveMember).values({ driveId: of.id, userId, role, since: now() }).run()
  const makeGuardian = (of: { id: number }, userId: string) =>
    orm.insert(guardian).values({ sellerId: of.id, userId, since: now() }).run()

  return {
    catalog: makeCatalog,
    item: makeItem,
    drive: makeDrive,
    group: makeGroup,
    seller: makeSeller,
    houseSeller: makeHouseSeller,
    link: makeLink,
    store: makeStore,
    user: makeUser,
    password: givePassword,
    secondFactor: giveSecondFactor,
    staff: makeStaff,
    member: makeMember,
    guardian: makeGuardian,
  }
}

/** An order as the store page sends it. */
export function anOrder(changes: Partial<PlaceOrderRequest> = {}): PlaceOrderRequest {
  return {
    lines: [{ itemCode: '1204', quantity: 2 }],
    giftCents: 0,
    coverFee: false,
    quotedTotalCents: 3200,
    customer: { name: 'Ruth Lindqvist', email: 'ruth@example.com', relationship: 'grandparent' },
    locale: 'en',
    ...changes,
  }
}

/** The instants of local wall times, as the drive's own record would hold them. */
export function wallTimes(of: { opens: [string, string]; closes: [string, string]; zone: string }) {
  const opens = resolveWallTime({ date: of.opens[0], time: of.opens[1] }, of.zone)
  const closes = closeInstant({ date: of.closes[0], time: of.closes[1] }, of.zone)
  if (!opens.ok || !closes.ok) throw new Error('these wall times do not exist')
  return { opensAt: opens.instant, closesAt: closes.instant }
}
