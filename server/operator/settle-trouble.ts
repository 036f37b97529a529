import { and, eq, isNull } from 'drizzle-orm'
import { AppError } from '#shared/errors.ts'
import { refusal } from '#shared/messages/refusals.ts'
import { logActivity } from '../activity/log-activity.ts'
import { outbox } from '../db/schema/mail.ts'
import { paymentPutAside } from '../db/schema/payments.ts'
import { inTransaction } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { findPutAside } from './queries.ts'

type By = { actor: string; requestId: string }

/** Notes what was done about a payment that was put aside; it leaves the list and stays in the log. */
export function settlePutAside(deps: Deps, of: By & { publicId: string; resolution: string }) {
  inTransaction(deps.db, tx => {
    const row = findPutAside(tx, of.publicId)
    if (!row) throw new AppError('not_found')
    const { changes } = tx
      .update(paymentPutAside)
      .set({ resolvedAt: deps.now(), resolution: of.resolution })
      .where(and(eq(paymentPutAside.id, row.id), isNull(paymentPutAside.resolvedAt)))
      .run()
    if (changes !== 1) throw new AppError('conflict', { detail: refusal('thisWasSettledAlreadyNothingWas') })
    logActivity(tx, {
      at: deps.now(),
      driveId: null,
      actor: of.actor,
      action: 'put_aside_settled',
      subject: `payment:${of.publicId}`,
      reason: of.resolution,
      requestId: of.requestId,
    })
  })
}

/** Sends a letter that was given up once more. */
export function retryLetter(deps: Deps, of: By & { letterId: number }) {
  inTransaction(deps.db, tx => {
    const { changes } = tx
      .update(outbox)
      .set({ state: 'waiting', attempts: 0, nextAttemptAt: deps.now(), leaseUntil: null })
      .where(and(eq(outbox.id, of.letterId), eq(outbox.state, 'failed')))
      .run()
    if (changes !== 1) throw new AppError('not_found')
    logActivity(tx, {
      at: deps.now(),
      driveId: null,
      actor: of.actor,
      action: 'letter_retried',
      subject: `letter:${of.letterId}`,
      requestId: of.requestId,
    })
  })
}
