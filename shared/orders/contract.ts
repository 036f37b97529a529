import { z } from 'zod'
import { refusal } from '../messages/refusals.ts'
import { cleanText, isEmailAddress } from '../text.ts'
import { cents, day, instant, locale, publicId } from '../wire.ts'
import { relationshipNames } from './relationships.ts'

/** Text a person typed: normalised, trimmed, without control or direction-changing characters. */
function typed(max: number, min = 1) {
  return z.string().transform((raw, context) => {
    const cleaned = cleanText(raw, { max })
    if (!cleaned.ok) {
      context.addIssue({ code: 'custom', message: refusal(`text.${cleaned.problem}`, { max }) })
      return z.NEVER
    }
    if (cleaned.text.length < min) {
      context.addIssue({ code: 'custom', message: refusal('pleaseFillThisIn') })
      return z.NEVER
    }
    return cleaned.text
  })
}

export const relationship = z.enum(relationshipNames)
export type Relationship = z.infer<typeof relationship>

export const placeOrderBody = z.strictObject({
  lines: z
    .array(
      z.strictObject({
        itemCode: z.string().regex(/^\d{4}$/, refusal('anItemCodeHasFourDigits')),
        quantity: z.int(refusal('aQuantityIsAWholeNumber')).min(1).max(99),
        recipientLabel: typed(60).optional(),
      }),
    )
    .max(60, refusal('anOrderHasAtMost60')),
  giftCents: z.int().min(0).max(100_000),
  coverFee: z.boolean(),
  quotedTotalCents: z.int().min(0).max(1_000_000_000),
  customer: z.strictObject({
    name: typed(100),
    email: z.string().max(254).refine(isEmailAddress, refusal('pleaseCheckThisEmailAddress')),
    relationship,
  }),
  locale,
  /** The receipt id of an order placed from the same pad that was not paid and that this one takes the place of. */
  replaces: publicId.optional(),
})
export type PlaceOrderInput = z.infer<typeof placeOrderBody>
/** What the browser sends, before cleaning. */
export type PlaceOrderRequest = z.input<typeof placeOrderBody>

export const idempotencyKey = z.string().regex(/^[\x21-\x7e]{1,200}$/, refusal('sendAnIdempotencykeyOf8To'))

export const placeOrderReply = z.object({
  orderNumber: z.string(),
  totalCents: cents,
  payUrl: z.string(),
  receiptUrl: z.string(),
})
export type PlacedOrder = z.infer<typeof placeOrderReply>

export const orderStatus = z.enum([
  'awaiting_payment',
  'paid',
  'partly_refunded',
  'refunded',
  'canceled',
  'expired',
])
export type OrderStatus = z.infer<typeof orderStatus>

export const receiptLine = z.object({
  itemCode: z.string(),
  name: z.string(),
  quantity: z.int(),
  unitPriceCents: cents,
  amountCents: cents,
  refundedQuantity: z.int(),
  recipientLabel: z.string().nullable(),
  creditedTo: z.string(),
  allergens: z.object({
    contains: z.array(z.string()),
    containsNone: z.boolean(),
    mayContain: z.array(z.string()),
  }),
  storage: z.string(),
  bestQualityMonths: z.tuple([z.int(), z.int()]).nullable(),
})
export type ReceiptLine = z.infer<typeof receiptLine>

export const receiptReply = z.object({
  orderNumber: z.string(),
  status: orderStatus,
  placedAt: instant,
  paidAt: instant.nullable(),
  /** Only while the order waits for its payment: where to go on paying, and until when. */
  payUrl: z.string().nullable(),
  payableUntil: instant.nullable(),
  customerName: z.string(),
  locale,
  lines: z.array(receiptLine),
  itemsCents: cents,
  giftCents: cents,
  taxCents: cents,
  coverCents: cents,
  totalCents: cents,
  refundedCents: cents,
  currency: z.string(),
  creditedTo: z.string(),
  /** Who hands the order over: the seller's family, or the school for a group's link. */
  handover: z.enum(['seller_family', 'school']),
  organization: z.object({ name: z.string() }),
  drive: z.object({ timeZone: z.string(), deliveryFrom: day, deliveryTo: day, closesAt: instant }),
  contact: z.object({ name: z.string(), email: z.string() }),
  /** Storage and allergen statements in words, in the order's language. */
  statements: z.object({
    allergens: z.array(z.object({ name: z.string(), text: z.string() })),
    storage: z.array(z.string()),
  }),
  /** The store the order came from, while that link lives. */
  storeUrl: z.string().nullable(),
})
export type ReceiptView = z.infer<typeof receiptReply>
