import { z } from 'zod'
import { refusal } from '../messages/refusals.ts'
import { storeStatusSchema } from '../stores/contract.ts'
import { cents, day, instant } from '../wire.ts'

export const driveReply = z.object({
  driveId: z.string(),
  name: z.string(),
  organization: z.string(),
  status: storeStatusSchema,
  opensAt: instant,
  closesAt: instant,
  /** When somebody closed the store before its time. */
  closedEarlyAt: instant.nullable(),
  timeZone: z.string(),
  turnInOn: day,
  deliveryFrom: day,
  deliveryTo: day,
  role: z.string(),
  totals: z.object({
    orders: z.int(),
    items: z.int(),
    itemsCents: cents,
    giftCents: cents,
    refundedCents: cents,
    awaitingPayment: z.int(),
    sellers: z.int(),
    sellersWithOrders: z.int(),
  }),
  /** What the drive would come to at the pace of its last three full days, in items and cents; null too early. */
  pace: z.object({ items: z.int(), itemsCents: z.int() }).nullable(),
  goalCents: cents.nullable(),
  days: z.array(z.object({ day, items: z.int(), itemsCents: z.int() })),
  /** What waits for somebody. */
  needs: z.object({ flags: z.int(), failedLetters: z.int(), openRefunds: z.int() }),
  groups: z.array(z.object({ name: z.string(), sellers: z.int(), items: z.int(), itemsCents: cents })),
  sellers: z.array(
    z.object({ number: z.int(), name: z.string(), group: z.string(), items: z.int(), itemsCents: cents }),
  ),
})
export type DriveView = z.infer<typeof driveReply>

/** Closing early takes a reason, which the activity log keeps. */
export const closeEarlyBody = z.strictObject({
  reason: z.string().trim().min(3, refusal('sayWhyInAFewWords')).max(300),
})
export const closeEarlyReply = z.object({ closedAt: instant, awaitingPayment: z.int() })
