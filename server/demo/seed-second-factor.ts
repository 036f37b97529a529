import { createHash } from 'node:crypto'
import { eq } from 'drizzle-orm'
import { twoFactor, user } from '../db/schema/identity.ts'
import type { Tx } from '../db/transaction.ts'
import type { SecondFactorDoors } from '../people/second-factor-doors.ts'
import { codeOf, stepAt } from '../people/totp.ts'
import { demoId } from './demo-ids.ts'
import { organizers, otherLeads, staff } from './people.ts'

/** The invented people whose desks stand behind a second factor, with what they are. */
const holders = [
  ...staff.map(({ name, email, role }) => ({ name, email, role: role as string })),
  ...organizers.filter(person => person.role !== 'helper'),
  { ...otherLeads.juniper, role: 'lead, Juniper Flats' },
  { ...otherLeads.windward, role: 'lead, Windward Point' },
]

/** The secret of one of them: made up, the same at every seeding, worth nothing elsewhere. */
function demoSecret(email: string): string {
  return createHash('sha256').update(`tallykin demonstration factor ${email}`).digest('hex').slice(0, 32)
}

export type SealedFactors = Map<string, { secret: string; backupCodes: string }>

/** Seals the invented secrets as the sign-in library keeps them; beforehand, since sealing cannot wait inside a transaction. */
export async function sealDemoFactors(doors: Pick<SecondFactorDoors, 'seal'>): Promise<SealedFactors> {
  const sealed: SealedFactors = new Map()
  for (const { email } of holders)
    sealed.set(email, {
      secret: await doors.seal(demoSecret(email)),
      backupCodes: await doors.seal(JSON.stringify([])),
    })
  return sealed
}

/** Gives staff, leads and treasurers of the demonstration their second factors. */
export function seedSecondFactors(
  tx: Tx,
  of: { users: ReadonlyMap<string, string>; sealed: SealedFactors; at: number },
) {
  for (const [email, { secret, backupCodes }] of of.sealed) {
    const userId = of.users.get(email)
    if (!userId) throw new Error(`${email} has no account`)
    tx.insert(twoFactor)
      .values({ id: demoId(`factor ${email}`), userId, secret, backupCodes, verified: true })
      .run()
    tx.update(user)
      .set({ twoFactorEnabled: true, updatedAt: new Date(of.at) })
      .where(eq(user.id, userId))
      .run()
  }
}

/**
 * The sign-in code of an invented account at an instant of the machine's clock (the one codes go by, also
 * where the demonstration's own clock is set); null for an account without a second factor.
 */
export function demoCodeFor(email: string, now = Date.now()): string | null {
  if (!holders.some(holder => holder.email === email)) return null
  return codeOf(demoSecret(email), stepAt(now))
}

/** The note for the mail catcher's page: the codes of all invented accounts right now. */
export function demoCodes(now = Date.now()) {
  return {
    title: 'Sign-in codes of the invented accounts',
    rows: [
      ...holders.map(({ name, role, email }) => ({
        label: `${name}, ${role}`,
        value: demoCodeFor(email, now)!,
      })),
      {
        label: 'Good to know',
        value:
          'They change every 30 seconds and each signs in once. Look for new mail to see the ones of now.',
      },
    ],
  }
}
