import { z } from 'zod'
import { orderStatus, relationship } from '../orders/contract.ts'
import { storeStatusSchema } from '../stores/contract.ts'
import { cents, day, instant } from '../wire.ts'

/** A credited order as the family sees it: the customer's name and the items, never the e-mail address. */
export const familyOrder = z.object({
  id: z.string(),
  orderNumber: z.string(),
  customerName: z.string(),
  relationship,
  placedAt: instant,
  status: orderStatus,
  /** The family flagged it and the organizer has not settled it yet. */
  flagged: z.boolean(),
  itemCount: z.int(),
  lines: z.array(z.object({ itemCode: z.string(), name: z.string(), quantity: z.int() })),
})

export const sellerReply = z.object({
  sellerId: z.string(),
  fullName: z.string(),
  displayName: z.string(),
  number: z.int(),
  group: z.string(),
  /** Whether a guardian agreed that the store shows `displayName`. */
  nameShown: z.boolean(),
  organization: z.string(),
  drive: z.object({
    name: z.string(),
    status: storeStatusSchema,
    opensAt: instant,
    closesAt: instant,
    timeZone: z.string(),
    deliveryFrom: day,
    deliveryTo: day,
  }),
  link: z.object({ url: z.string(), state: z.enum(['live', 'paused']) }).nullable(),
  tally: z.object({
    items: z.int(),
    amountCents: cents,
    prizeEvery: z.int(),
    prizesEarned: z.int(),
    itemsToNextPrize: z.int(),
  }),
  orders: z.array(familyOrder),
})
export type SellerView = z.infer<typeof sellerReply>
