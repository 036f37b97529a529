import { closingInstant } from '#shared/deadline/store-status.ts'
import { localDay } from '#shared/deadline/wall-time.ts'
import type { OperatorView } from '#shared/operator/contract.ts'
import type { Stage } from '#shared/operator/stages.ts'
import type { Deps } from '../deps.ts'
import { listDrives, listFailedLetters, listPutAside, type Reach } from './queries.ts'

type DriveRow = ReturnType<typeof listDrives>[number]

/** Where a drive stands, told by its dates and the clock alone. */
export function stageOf(row: Pick<DriveRow, 'drive' | 'deliveryFrom' | 'deliveryTo'>, now: number): Stage {
  const { drive } = row
  const today = localDay(now, drive.timeZone)
  if (drive.launchedAt === null) return 'set_up'
  if (now < drive.opensAt) return 'not_open'
  if (now < closingInstant(drive)) return 'selling'
  if (today <= drive.turnInOn) return 'turn_in'
  return today <= row.deliveryTo ? 'awaiting_delivery' : 'delivered'
}

/** The operator's first room: drives by stage, and what needs somebody. */
export function toOperatorView(
  deps: Deps,
  of: { reach: Reach; userId: string; roles: string[]; seesTrouble: boolean },
): OperatorView {
  const { orm } = deps.db
  const now = deps.now()
  const iso = (instant: number) => new Date(instant).toISOString()
  return {
    roles: of.roles,
    drives: listDrives(orm, of.reach).map(row => ({
      driveId: row.drive.publicId,
      organization: row.organization,
      name: row.drive.name,
      stage: stageOf(row, now),
      rep: row.rep,
      mine: row.drive.repUserId === of.userId,
      closesAt: iso(closingInstant(row.drive)),
      timeZone: row.drive.timeZone,
      deliveryFrom: row.deliveryFrom,
      orders: row.orders,
      items: row.items,
      itemsCents: row.itemsCents,
      flags: row.flags,
    })),
    putAside: !of.seesTrouble
      ? []
      : listPutAside(orm, of.reach).map(row => ({
          id: row.aside.publicId,
          reason: row.aside.reason,
          amountCents: row.aside.amountCents,
          currency: row.aside.currency,
          at: iso(row.aside.createdAt),
          orderNumber: row.orderNumber,
          organization: row.organization,
          driveId: row.drivePublicId,
          orderId: row.orderPublicId,
        })),
    failedLetters: !of.seesTrouble
      ? []
      : listFailedLetters(orm, of.reach).map(letter => ({
          id: letter.id,
          kind: letter.kind,
          to: letter.recipientEmail,
          at: iso(letter.createdAt),
          attempts: letter.attempts,
          error: letter.lastError ?? '',
        })),
  }
}
