import { and, eq, isNull } from 'drizzle-orm'
import { AppError } from '#shared/errors.ts'
import { refusal } from '#shared/messages/refusals.ts'
import { logActivity } from '../activity/log-activity.ts'
import { drive } from '../db/schema/drives.ts'
import { inTransaction } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { hit } from '../faults.ts'
import { countWaiting, getDrive } from './queries.ts'

/**
 * Closes the stores of a drive now. From this instant nothing can be placed; who has placed an order may
 * still pay it until their payment page ends.
 *
 * @throws AppError conflict when it is closed already or has not opened.
 */
export function closeEarly(
  deps: Deps,
  options: { driveId: number; actor: string; reason: string; requestId: string },
): { closedAt: number; awaitingPayment: number } {
  const answer = inTransaction(deps.db, tx => {
    const now = deps.now()
    const { drive: row } = getDrive(tx, options.driveId)
    if (row.launchedAt === null || now < row.opensAt)
      throw new AppError('conflict', { detail: refusal('thisFundraiserHasNotOpenedYet') })
    if (row.closedEarlyAt !== null || now >= row.closesAt)
      throw new AppError('conflict', { detail: refusal('thisFundraiserIsClosedAlreadyNothing') })
    tx.update(drive)
      .set({ closedEarlyAt: now })
      .where(and(eq(drive.id, options.driveId), isNull(drive.closedEarlyAt)))
      .run()
    logActivity(tx, {
      at: now,
      driveId: options.driveId,
      actor: options.actor,
      action: 'closed_early',
      subject: `drive:${row.publicId}`,
      before: { closesAt: new Date(row.closesAt).toISOString() },
      after: { closedAt: new Date(now).toISOString() },
      reason: options.reason,
      requestId: options.requestId,
    })
    return { closedAt: now, awaitingPayment: countWaiting(tx, options.driveId) }
  })
  hit('F25')
  return answer
}
