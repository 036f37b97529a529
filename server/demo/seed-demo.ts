import { existsSync, mkdirSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { eq } from 'drizzle-orm'
import { pino } from 'pino'
import { addDays, isWeekend } from '#shared/calendar.ts'
import { localDay } from '#shared/deadline/wall-time.ts'
import { makeClock } from '../clock.ts'
import { loadConfig } from '../config.ts'
import { migrate } from '../db/migrate.ts'
import { openDb } from '../db/open.ts'
import { drive } from '../db/schema/drives.ts'
import { account, user } from '../db/schema/identity.ts'
import { outbox } from '../db/schema/mail.ts'
import { driveMember, guardian, staffMember } from '../db/schema/people.ts'
import { inTransaction, type Tx } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { makeDeps } from '../make-deps.ts'
import { migrationsDir } from '../paths.ts'
import { bookPayments } from './book-payments.ts'
import { demoId, demoLinks } from './demo-ids.ts'
import {
  crews,
  guardians,
  juniperClasses,
  juniperSellers,
  organizers,
  otherLeads,
  PASSWORD,
  saltmarshSellers,
  staff,
  windwardSellers,
  windwardSquads,
} from './people.ts'
import { copyPictures, seedCatalog } from './seed-catalog.ts'
import { type DemoDrive, seedDrive } from './seed-drive.ts'
import { seedOrders } from './seed-orders.ts'
import { type SealedFactors, sealDemoFactors, seedSecondFactors } from './seed-second-factor.ts'

export { describeDemo } from './describe-demo.ts'
export { demoCodeFor, demoCodes } from './seed-second-factor.ts'

const DAY_MS = 86_400_000

/**
 * Fills an empty data folder with the demonstration and writes the same payments into the stand-in's book; a
 * folder that has them is left as it is. All or nothing: killed in the middle, the next start begins anew.
 */
export async function seedDemo(env: Record<string, string | undefined>) {
  const config = loadConfig(env)
  mkdirSync(config.dataDir, { recursive: true })
  const db = openDb(join(config.dataDir, 'tallykin.sqlite'))
  try {
    migrate(db, migrationsDir)
    const deps = makeDeps({ config, db, log: pino({ level: 'silent' }), now: makeClock(config.startsAt) })
    if (!db.orm.select({ id: drive.id }).from(drive).limit(1).get()) {
      const pictures = copyPictures(config.dataDir)
      const passwordHash = await deps.identity.hashPassword(PASSWORD)
      const factors = await sealDemoFactors(deps.identity.secondFactor)
      inTransaction(db, tx => fill(deps, tx, { pictures, passwordHash, factors }))
    }
    const booked = join(config.dataDir, '.payments-booked')
    if (!existsSync(booked)) {
      await bookPayments(deps)
      writeFileSync(booked, '')
    }
    deps.mailer.close()
  } finally {
    db.raw.pragma('wal_checkpoint(TRUNCATE)')
    db.raw.close()
  }
}

function fill(
  deps: Deps,
  tx: Tx,
  made: { pictures: Map<string, string>; passwordHash: string; factors: SealedFactors },
) {
  const now = deps.now()
  const users = seedUsers(tx, made.passwordHash, now)
  seedSecondFactors(tx, { users, sealed: made.factors, at: now })
  const { catalogId, versionId } = seedCatalog(tx, { pictures: made.pictures, at: now - 120 * DAY_MS })
  const repUserId = users.get(staff[1].email)!
  const [saltmarsh, juniper, windward] = demoDrives(now).map(demo =>
    seedDrive(tx, demo, { catalogVersionId: versionId, repUserId, now }),
  )
  if (!saltmarsh || !juniper || !windward) throw new Error('the demonstration has three drives')

  for (const person of staff)
    tx.insert(staffMember)
      .values({ userId: users.get(person.email)!, role: person.role, since: now })
      .run()
  for (const person of organizers)
    tx.insert(driveMember)
      .values({ driveId: saltmarsh.id, userId: users.get(person.email)!, role: person.role, since: now })
      .run()
  for (const [of, lead] of [
    [juniper, otherLeads.juniper],
    [windward, otherLeads.windward],
  ] as const)
    tx.insert(driveMember)
      .values({ driveId: of.id, userId: users.get(lead.email)!, role: 'lead', since: now })
      .run()
  // Guardians after the orders: nobody is told today of what was sold last week.
  seedOrders(deps, tx, saltmarsh, { catalogId, until: now, perSeller: 2, seed: 11 })
  seedOrders(deps, tx, juniper, { catalogId, until: Math.min(now, juniper.closesAt), perSeller: 2, seed: 23 })
  for (const person of guardians)
    for (const [first, last] of person.sellers) {
      const child = saltmarsh.sellers.find(row => row.firstName === first && row.lastName === last)
      if (!child) throw new Error(`${first} ${last} is not on the roster`)
      tx.insert(guardian)
        .values({ sellerId: child.id, userId: users.get(person.email)!, since: now })
        .run()
    }
  // The letters of the past went out in the past; the mail catcher starts empty.
  tx.update(outbox)
    .set({ state: 'sent', sentAt: now, response: '250 sent before the demonstration began' })
    .where(eq(outbox.state, 'waiting'))
    .run()
}

function seedUsers(tx: Tx, passwordHash: string, now: number): Map<string, string> {
  const at = new Date(now)
  const people = [...staff, ...organizers, ...Object.values(otherLeads), ...guardians]
  return new Map(
    people.map(({ name, email }) => {
      const id = demoId(`user ${email}`)
      tx.insert(user).values({ id, name, email, emailVerified: true, createdAt: at, updatedAt: at }).run()
      tx.insert(account)
        .values({
          id: `account ${id}`,
          userId: id,
          accountId: id,
          providerId: 'credential',
          password: passwordHash,
          createdAt: at,
          updatedAt: at,
        })
        .run()
      return [email, id]
    }),
  )
}

/** The three drives, with dates counted from the day of seeding in each one's own zone. */
function demoDrives(now: number): DemoDrive[] {
  const today = (zone: string) => localDay(now, zone)
  const weekdayOn = (day: string) => {
    let at = day
    while (isWeekend(at)) at = addDays(at, 1)
    return at
  }
  const eastern = today('America/New_York')
  const arizona = today('America/Phoenix')
  const hawaii = today('Pacific/Honolulu')
  const number = (first: string, last: string) =>
    String(saltmarshSellers.find(seller => seller.firstName === first && seller.lastName === last)!.number)
  return [
    {
      key: 'saltmarsh',
      organization: 'Saltmarsh High Robotics',
      name: 'Winter Larder, Saltmarsh',
      purpose: 'a regional trip',
      timeZone: 'America/New_York',
      opensOn: addDays(eastern, -6),
      closesOn: addDays(eastern, 8),
      contact: { name: organizers[0].name, email: organizers[0].email },
      groups: crews,
      sellers: saltmarshSellers,
      goalCents: 1_200_000,
      shareBp: 4_000,
      links: {
        [number('Maya', 'Lindqvist')]: { token: demoLinks.maya },
        [number('Anh', 'Nguyễn')]: { token: demoLinks.anh },
        [number('Zoë', "O'Brien")]: { token: demoLinks.zoe },
        [number('Theo', 'Vance')]: { token: demoLinks.paused, state: 'paused' },
        Chassis: { token: demoLinks.group },
      },
    },
    {
      key: 'juniper',
      organization: 'Juniper Flats Elementary Garden Club',
      name: 'Winter Larder, Juniper Flats',
      purpose: 'a greenhouse',
      timeZone: 'America/Phoenix',
      opensOn: addDays(arizona, -30),
      closesOn: addDays(arizona, -16),
      contact: otherLeads.juniper,
      groups: juniperClasses,
      sellers: juniperSellers,
      goalCents: 900_000,
      shareBp: 4_000,
      links: { '101': { token: demoLinks.closed } },
    },
    {
      key: 'windward',
      organization: 'Windward Point Swim Team',
      name: 'Winter Larder, Windward Point',
      purpose: 'lane ropes and a team tent',
      timeZone: 'Pacific/Honolulu',
      opensOn: weekdayOn(addDays(hawaii, 10)),
      closesOn: addDays(hawaii, 26),
      contact: otherLeads.windward,
      groups: windwardSquads,
      sellers: windwardSellers,
      goalCents: 400_000,
      shareBp: 3_800,
      links: { '101': { token: demoLinks.notOpen } },
    },
  ]
}
