import { addBusinessDays, addDays, type Day, isWeekend } from '#shared/calendar.ts'
import { closeInstant, resolveWallTime } from '#shared/deadline/wall-time.ts'
import { drive, driveTerms, organization } from '../db/schema/drives.ts'
import { seller, sellerGroup, sellerPerson, storeLink } from '../db/schema/sellers.ts'
import type { Tx } from '../db/transaction.ts'
import { demoId } from './demo-ids.ts'
import type { DemoSeller } from './people.ts'

export type DemoDrive = {
  key: string
  organization: string
  name: string
  purpose: string
  timeZone: string
  opensOn: Day
  closesOn: Day
  contact: { name: string; email: string }
  groups: readonly string[]
  sellers: readonly DemoSeller[]
  goalCents: number
  shareBp: number
  /** Links with a fixed address, by a seller's number or a group's name. */
  links: Record<string, { token: string; state?: 'live' | 'paused' }>
}

/** Turn-in within three business days of the close, delivery four weeks after that, never on a weekend. */
export function usualDates(closesOn: Day) {
  const turnInOn = addBusinessDays(closesOn, 2)
  let deliveryFrom = addDays(turnInOn, 23)
  while (isWeekend(deliveryFrom)) deliveryFrom = addDays(deliveryFrom, 1)
  return { turnInOn, deliveryFrom, deliveryTo: deliveryFrom }
}

function instant(wall: { date: string; time: string }, zone: string, kind: 'opens' | 'closes'): number {
  const resolved = kind === 'opens' ? resolveWallTime(wall, zone) : closeInstant(wall, zone)
  if (!resolved.ok) throw new Error(`${wall.date} ${wall.time} in ${zone}: ${resolved.reason}`)
  return resolved.instant
}

/** Writes an organization, its drive with terms, groups, sellers and their links. */
export function seedDrive(
  tx: Tx,
  demo: DemoDrive,
  options: { catalogVersionId: number; repUserId: string; now: number },
) {
  const opens = { date: demo.opensOn, time: '08:00' }
  const closes = { date: demo.closesOn, time: '23:59' }
  const { turnInOn, deliveryFrom, deliveryTo } = usualDates(demo.closesOn)
  const opensAt = instant(opens, demo.timeZone, 'opens')
  const agreedAt = opensAt - 14 * 86_400_000
  const { id: organizationId } = tx
    .insert(organization)
    .values({ publicId: demoId(`organization ${demo.key}`), name: demo.organization, createdAt: agreedAt })
    .returning()
    .get()
  const row = tx
    .insert(drive)
    .values({
      publicId: demoId(`drive ${demo.key}`),
      organizationId,
      catalogVersionId: options.catalogVersionId,
      name: demo.name,
      purpose: demo.purpose,
      timeZone: demo.timeZone,
      opensOn: opens.date,
      opensTime: opens.time,
      closesOn: closes.date,
      closesTime: closes.time,
      opensAt,
      closesAt: instant(closes, demo.timeZone, 'closes'),
      turnInOn,
      launchedAt: Math.min(agreedAt + 7 * 86_400_000, options.now - 1),
      contactName: demo.contact.name,
      contactEmail: demo.contact.email,
      payeeWording: `payable to ${demo.organization}`,
      goalCents: demo.goalCents,
      repUserId: options.repUserId,
      createdAt: agreedAt,
    })
    .returning()
    .get()
  const terms = tx
    .insert(driveTerms)
    .values({
      driveId: row.id,
      version: 1,
      shareBp: demo.shareBp,
      feeRateBp: 290,
      feeFixedCents: 30,
      organizationBearsCardFees: true,
      tax: JSON.stringify({ mode: 'none' }),
      sellerOfRecord: 'operator',
      prizeEvery: 10,
      prizesBorneBy: 'operator',
      deliveryMinimumCents: 250_000,
      freightCents: 15_000,
      invoiceDueDays: 30,
      claimDays: 3,
      deliveryFrom,
      deliveryTo,
      createdAt: Math.min(agreedAt, options.now - 1),
    })
    .returning()
    .get()
  const groups = demo.groups.map((name, place) =>
    tx
      .insert(sellerGroup)
      .values({ publicId: demoId(`group ${demo.key} ${name}`), driveId: row.id, name, position: place })
      .returning()
      .get(),
  )
  const link = (sellerId: number, name: string) => {
    const fixed = demo.links[name]
    return tx
      .insert(storeLink)
      .values({
        token: fixed?.token ?? demoId(`link ${demo.key} ${name}`),
        driveId: row.id,
        sellerId,
        state: fixed?.state ?? 'live',
        createdAt: agreedAt,
      })
      .returning()
      .get()
  }
  const sellers = demo.sellers.map(({ number, firstName, lastName, group }) => {
    const made = tx
      .insert(seller)
      .values({
        publicId: demoId(`seller ${demo.key} ${number}`),
        driveId: row.id,
        kind: 'student',
        groupId: groups.find(row => row.name === group)!.id,
        number,
        createdAt: agreedAt,
      })
      .returning()
      .get()
    tx.insert(sellerPerson).values({ sellerId: made.id, firstName, lastName, nameShownSince: agreedAt }).run()
    return { ...made, firstName, lastName, link: link(made.id, String(number)) }
  })
  const houses = groups.map(group => {
    const made = tx
      .insert(seller)
      .values({
        publicId: demoId(`house ${demo.key} ${group.name}`),
        driveId: row.id,
        kind: 'group',
        groupId: group.id,
        createdAt: agreedAt,
      })
      .returning()
      .get()
    return { ...made, link: link(made.id, group.name) }
  })
  return { ...row, termsId: terms.id, terms, sellers, houses }
}

export type SeededDrive = ReturnType<typeof seedDrive>
