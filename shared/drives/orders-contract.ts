import { z } from 'zod'
import { refusal } from '../messages/refusals.ts'
import { orderStatus, receiptLine, relationship } from '../orders/contract.ts'
import { cents, instant, publicId } from '../wire.ts'

export const orderSorts = ['placed', 'total', 'customer', 'seller', 'number'] as const

/** Which orders of a drive, in which order; the same in the address of the page and of its export. */
export const ordersQuery = z.strictObject({
  search: z.string().max(100).optional(),
  status: orderStatus.optional(),
  group: z.string().max(100).optional(),
  seller: z
    .string()
    .regex(/^\d{3}$/)
    .optional(),
  flagged: z.enum(['yes']).optional(),
  /** Only these, as ticked on the screen. */
  ids: z
    .string()
    .regex(/^[\w-]{22}(,[\w-]{22}){0,199}$/)
    .optional(),
  sort: z.enum(orderSorts).optional(),
  direction: z.enum(['up', 'down']).optional(),
  page: z
    .string()
    .regex(/^\d{1,5}$/)
    .optional(),
})
export type OrdersQuery = z.infer<typeof ordersQuery>

export const orderRow = z.object({
  id: publicId,
  number: z.string(),
  status: orderStatus,
  placedAt: instant,
  customerName: z.string(),
  relationship,
  seller: z.string(),
  group: z.string().nullable(),
  itemCount: z.int(),
  totalCents: cents,
  refundedCents: cents,
  flagged: z.boolean(),
})
export type OrderRowView = z.infer<typeof orderRow>

export const ordersReply = z.object({
  rows: z.array(orderRow),
  total: z.int(),
  page: z.int(),
  pages: z.int(),
  timeZone: z.string(),
  groups: z.array(z.string()),
})
export type OrdersView = z.infer<typeof ordersReply>

/** An order as the organizer sees it, with its whole history. */
export const orderPageReply = z.object({
  id: publicId,
  number: z.string(),
  status: orderStatus,
  placedAt: instant,
  paidAt: instant.nullable(),
  timeZone: z.string(),
  customer: z.object({ name: z.string(), email: z.string(), relationship }),
  sellers: z.array(z.object({ number: z.int().nullable(), name: z.string(), group: z.string().nullable() })),
  lines: z.array(receiptLine.extend({ lineId: z.int() })),
  itemsCents: cents,
  giftCents: cents,
  taxCents: cents,
  coverCents: cents,
  totalCents: cents,
  refundedCents: cents,
  /** What giving back everything that is left would return now; null where nothing can be given back. */
  refundableCents: cents.nullable(),
  refunds: z.array(
    z.object({
      amountCents: cents,
      state: z.string(),
      reason: z.string(),
      at: instant,
      lines: z.array(z.string()),
    }),
  ),
  flags: z.array(
    z.object({
      id: publicId,
      seller: z.string(),
      note: z.string(),
      at: instant,
      resolution: z.string().nullable(),
    }),
  ),
  letters: z.array(z.object({ kind: z.string(), to: z.string(), state: z.string(), at: instant })),
  history: z.array(
    z.object({
      at: instant,
      who: z.string(),
      action: z.string(),
      reason: z.string().nullable(),
      detail: z.string().nullable(),
    }),
  ),
  mayRefund: z.boolean(),
  mayMove: z.boolean(),
})
export type OrderPageView = z.infer<typeof orderPageReply>

const reason = z.string().trim().min(3, refusal('sayWhyInAFewWords')).max(300)

export const refundBody = z.strictObject({
  /** Everything that is left, or so many of certain lines. */
  what: z.union([
    z.literal('everything'),
    z
      .array(z.strictObject({ lineId: z.int().min(1), quantity: z.int().min(1).max(99) }))
      .min(1, refusal('chooseWhatToGiveBack'))
      .max(60),
  ]),
  reason,
})
export const refundReply = z.object({
  amountCents: cents,
  state: z.enum(['requested', 'succeeded', 'failed']),
})

export const moveBody = z.strictObject({
  sellerNumber: z
    .int()
    .min(100, refusal('aSellerNumberHasThreeDigits'))
    .max(999, refusal('aSellerNumberHasThreeDigits')),
  reason,
})

export const closeAtBody = z.strictObject({
  date: z.string().regex(/^\d{4}-\d{2}-\d{2}$/, refusal('chooseADay')),
  time: z.string().regex(/^\d{2}:\d{2}$/, refusal('chooseATime')),
  reason,
})
export const closeAtReply = z.object({ closesAt: instant, before: instant })
