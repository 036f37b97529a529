import { eq } from 'drizzle-orm'
import { addDays, daysBetween } from '#shared/calendar.ts'
import { closeInstant } from '#shared/deadline/wall-time.ts'
import { AppError } from '#shared/errors.ts'
import { refusal } from '#shared/messages/refusals.ts'
import { logActivity } from '../activity/log-activity.ts'
import { drive } from '../db/schema/drives.ts'
import { inTransaction } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { getDrive } from './queries.ts'

/** A store that is open for longer than this is a mistake in the date. */
const LONGEST_DAYS = 120

const reasons = {
  nonexistent: refusal('onThatDayTheClocksGo'),
  invalid_zone: refusal('thisFundraiserHasNoValidTime'),
  invalid_date: refusal('thereIsNoSuchDay'),
  invalid_time: refusal('thereIsNoSuchTime'),
}

/**
 * Moves the close to another wall time: earlier, later, or open again after it was closed. What counts for
 * orders already placed does not change; what customers see does, at once.
 *
 * @throws AppError invalid_input when the time is past, before the opening, absurd or does not exist.
 */
export function closeAt(
  deps: Deps,
  options: { driveId: number; date: string; time: string; actor: string; reason: string; requestId: string },
): { closesAt: number; before: number } {
  return inTransaction(deps.db, tx => {
    const now = deps.now()
    const { drive: row } = getDrive(tx, options.driveId)
    const resolved = closeInstant(options, row.timeZone)
    if (!resolved.ok)
      throw refused(resolved.reason === 'invalid_time' ? 'time' : 'date', reasons[resolved.reason])
    if (resolved.instant <= now) throw refused('date', refusal('thatMomentHasPassedUseClose'))
    if (resolved.instant <= row.opensAt) throw refused('date', refusal('thatIsBeforeTheFundraiserOpens'))
    if (daysBetween(row.opensOn, options.date) > LONGEST_DAYS)
      throw refused(
        'date',
        refusal('openForAtMost', { days: LONGEST_DAYS, until: addDays(row.opensOn, LONGEST_DAYS) }),
      )
    const before = Math.min(row.closesAt, row.closedEarlyAt ?? row.closesAt)
    tx.update(drive)
      .set({
        closesOn: options.date,
        closesTime: options.time,
        closesAt: resolved.instant,
        closedEarlyAt: null,
      })
      .where(eq(drive.id, options.driveId))
      .run()
    logActivity(tx, {
      at: now,
      driveId: options.driveId,
      actor: options.actor,
      action: resolved.instant > before ? 'extended' : 'close_moved',
      subject: `drive:${row.publicId}`,
      before: { closesAt: new Date(before).toISOString() },
      after: { closesAt: new Date(resolved.instant).toISOString() },
      reason: options.reason,
      requestId: options.requestId,
    })
    return { closesAt: resolved.instant, before }
  })
}

function refused(path: string, message: string): AppError {
  return new AppError('invalid_input', { detail: message, errors: [{ path, message }] })
}
