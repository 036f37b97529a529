import { eq } from 'drizzle-orm'
import { AppError } from '#shared/errors.ts'
import { refusal } from '#shared/messages/refusals.ts'
import { logActivity } from '../activity/log-activity.ts'
import { user } from '../db/schema/identity.ts'
import { inTransaction, type Tx } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import type { Granted, Person } from '../http/route.ts'
import { newPublicId } from '../ids.ts'
import { queueLetter } from '../mail/queue-letter.ts'
import { findMember, listStaffRoles } from './queries.ts'
import { deleteFactor, endSessions, findFactor } from './second-factor.ts'

type Reset = { by: Person; userId: string; reason: string; requestId: string }

/**
 * Takes a lost factor off a member of a drive, after a call back: they sign in by password and set up anew.
 * A lead has no say over staff who also belong to the drive; only an admin does.
 *
 * @throws AppError not_found for somebody who is not of this drive; not_allowed for oneself.
 */
export function resetMemberFactor(deps: Deps, reset: Reset & { driveId: number; role: Granted['role'] }) {
  inTransaction(deps.db, tx => {
    if (!findMember(tx, reset)) throw new AppError('not_found')
    if (reset.role !== 'admin' && listStaffRoles(tx, reset.userId).length > 0)
      throw new AppError('not_allowed', { detail: refusal('onlyAnAdminMayDoThis') })
    takeOff(tx, { ...reset, at: deps.now() })
  })
}

/** The same for the operator's people. */
export function resetStaffFactor(deps: Deps, reset: Reset) {
  inTransaction(deps.db, tx => {
    if (listStaffRoles(tx, reset.userId).length === 0) throw new AppError('not_found')
    takeOff(tx, { ...reset, driveId: null, at: deps.now() })
  })
}

function takeOff(tx: Tx, reset: Reset & { driveId: number | null; at: number }) {
  if (reset.userId === reset.by.userId)
    throw new AppError('not_allowed', {
      detail: refusal('somebodyElseHasToDoThis'),
    })
  const factor = findFactor(tx, reset.userId)
  if (!factor) throw new AppError('conflict', { detail: refusal('thisPersonHasNoSecondFactor') })
  deleteFactor(tx, reset.userId, reset.at)
  endSessions(tx, reset.userId)
  logActivity(tx, {
    at: reset.at,
    driveId: reset.driveId,
    actor: reset.by.userId,
    action: 'second_factor_reset',
    subject: `user:${reset.userId}`,
    before: { secondFactor: factor.verified === true },
    after: { secondFactor: false },
    reason: reset.reason,
    requestId: reset.requestId,
  })
  const owner = tx
    .select({ name: user.name, email: user.email })
    .from(user)
    .where(eq(user.id, reset.userId))
    .get()!
  queueLetter(tx, {
    kind: 'second_factor_reset',
    subject: `second_factor_reset:${newPublicId()}`,
    to: owner,
    locale: 'en',
    facts: { by: reset.by.name, reason: reset.reason },
    at: reset.at,
  })
}
