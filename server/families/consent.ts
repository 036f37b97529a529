import { eq } from 'drizzle-orm'
import { logActivity } from '../activity/log-activity.ts'
import { sellerPerson } from '../db/schema/sellers.ts'
import { inTransaction } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'

/** A guardian agrees, or no longer agrees, that the store shows first name and last initial. Counts at once. */
export function setNameShown(
  deps: Deps,
  of: { sellerId: number; driveId: number; show: boolean; actor: string; requestId: string },
): void {
  inTransaction(deps.db, tx => {
    const now = deps.now()
    tx.update(sellerPerson)
      .set({ nameShownSince: of.show ? now : null })
      .where(eq(sellerPerson.sellerId, of.sellerId))
      .run()
    logActivity(tx, {
      at: now,
      driveId: of.driveId,
      actor: of.actor,
      action: of.show ? 'name_shown' : 'name_hidden',
      subject: `seller:${of.sellerId}`,
      requestId: of.requestId,
    })
  })
}
