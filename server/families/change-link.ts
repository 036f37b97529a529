import { and, eq, ne } from 'drizzle-orm'
import { AppError } from '#shared/errors.ts'
import { refusal } from '#shared/messages/refusals.ts'
import { logActivity } from '../activity/log-activity.ts'
import { storeLink } from '../db/schema/sellers.ts'
import { inTransaction } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { newPublicId } from '../ids.ts'

type LinkChange = { sellerId: number; driveId: number; actor: string; requestId: string }

/**
 * Pauses, resumes or replaces a seller's link. A replaced one is dead at once and its address never comes back;
 * what was ordered through it stays ordered, is credited, and may still be paid.
 *
 * @throws AppError conflict when there is nothing to change.
 */
export function changeLink(deps: Deps, change: LinkChange & { to: 'paused' | 'live' | 'replaced' }): void {
  inTransaction(deps.db, tx => {
    const now = deps.now()
    const current = tx
      .select()
      .from(storeLink)
      .where(and(eq(storeLink.sellerId, change.sellerId), ne(storeLink.state, 'replaced')))
      .get()
    if (!current || current.state === change.to)
      throw new AppError('conflict', { detail: refusal('theLinkIsSoAlreadyNothing') })
    tx.update(storeLink)
      .set({ state: change.to, endedAt: change.to === 'replaced' ? now : null })
      .where(eq(storeLink.id, current.id))
      .run()
    if (change.to === 'replaced')
      tx.insert(storeLink)
        .values({
          token: newPublicId(),
          driveId: change.driveId,
          sellerId: change.sellerId,
          // A link that was paused is replaced by one that is live: the family asked for a good one.
          state: 'live',
          createdAt: now,
        })
        .run()
    logActivity(tx, {
      at: now,
      driveId: change.driveId,
      actor: change.actor,
      action: `link_${change.to}`,
      subject: `seller:${change.sellerId}`,
      before: { link: current.id, state: current.state },
      after: { state: change.to },
      requestId: change.requestId,
    })
  })
}
