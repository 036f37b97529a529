import { and, eq } from 'drizzle-orm'
import type { DriveRole, StaffRole } from '#shared/people/contract.ts'
import { twoFactor, user } from '../db/schema/identity.ts'
import { driveMember } from '../db/schema/people.ts'
import type { Tx } from '../db/transaction.ts'
import { listStaffRoles } from './queries.ts'

/** Who sees addresses and may take a lost factor off somebody else. */
const inCharge: readonly (DriveRole | StaffRole)[] = ['lead', 'rep', 'admin']

/** The members of a drive by name, as the one who asks may see them. */
export function listTeam(
  tx: Tx,
  of: { driveId: number; asker: { userId: string; role: DriveRole | StaffRole } },
) {
  const isInCharge = inCharge.includes(of.asker.role)
  return tx
    .select({
      userId: user.id,
      name: user.name,
      email: user.email,
      role: driveMember.role,
      isEnabled: user.twoFactorEnabled,
      isProven: twoFactor.verified,
    })
    .from(driveMember)
    .innerJoin(user, eq(user.id, driveMember.userId))
    .leftJoin(twoFactor, and(eq(twoFactor.userId, user.id), eq(twoFactor.verified, true)))
    .where(eq(driveMember.driveId, of.driveId))
    .orderBy(user.name)
    .all()
    .map(({ isEnabled, isProven, ...row }) => {
      const secondFactor = isEnabled === true && isProven === true
      const isMe = row.userId === of.asker.userId
      const isOutOfReach = of.asker.role !== 'admin' && listStaffRoles(tx, row.userId).length > 0
      return {
        ...row,
        email: isInCharge ? row.email : null,
        secondFactor,
        isMe,
        mayReset: isInCharge && secondFactor && !isMe && !isOutOfReach,
      }
    })
}
