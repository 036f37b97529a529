import { z } from 'zod'
import { cents, day, instant, locale } from '../wire.ts'

/** What a link shows. Derived from the clock and the link's state, never stored. */
export const storeStatusSchema = z.enum(['not_open', 'open', 'paused', 'closed'])

/** Sales tax of a drive; rates in parts per million by tax category. */
export const taxTerms = z.discriminatedUnion('mode', [
  z.object({ mode: z.literal('none') }),
  z.object({
    mode: z.literal('added'),
    basis: z.enum(['order', 'line']),
    ratesPpm: z.record(z.string(), z.int().min(0)),
  }),
  z.object({ mode: z.literal('included'), ratesPpm: z.record(z.string(), z.int().min(0)) }),
])

/** A picture of an item: the address without size and ending, and the sizes that exist. */
export const picture = z.object({ small: z.string(), large: z.string(), width: z.int(), height: z.int() })

export const dietaryClaim = z.object({ kind: z.string(), certifier: z.string() })

export const storeItem = z.object({
  code: z.string().regex(/^\d{4}$/),
  name: z.string(),
  category: z.string(),
  priceCents: cents,
  netWeightG: z.int().min(1),
  printedWeight: z.string(),
  pieces: z.string(),
  serves: z.string(),
  description: z.string(),
  preparation: z.string(),
  taxCategory: z.string(),
  allergens: z.object({
    contains: z.array(z.string()),
    containsNone: z.boolean(),
    mayContain: z.array(z.string()),
  }),
  storage: z.string(),
  bestQualityMonths: z.tuple([z.int(), z.int()]).nullable(),
  dietary: z.array(dietaryClaim),
  picture: picture.nullable(),
  available: z.boolean(),
})
export type StoreItem = z.infer<typeof storeItem>

export const storeReply = z.object({
  /** Null where the link belongs to a group, or the family has not yet agreed to show the first name. */
  seller: z.object({ displayName: z.string() }).nullable(),
  group: z.object({ name: z.string() }).nullable(),
  organization: z.object({ name: z.string() }),
  drive: z.object({
    status: storeStatusSchema,
    /** The first instant at which an order is taken, and the first at which none is any more. */
    opensAt: instant,
    closesAt: instant,
    timeZone: z.string(),
    deliveryFrom: day,
    deliveryTo: day,
    currency: z.string(),
    purpose: z.string(),
    /** Share of the price that goes to the organization, in basis points. */
    shareBp: z.int(),
    organizationBearsCardFees: z.boolean(),
    cardFee: z.object({ rateBp: z.int(), fixedCents: z.int() }),
    tax: taxTerms,
    contact: z.object({ name: z.string(), email: z.string() }),
    limits: z.object({
      maxLineQuantity: z.int(),
      maxLines: z.int(),
      maxItems: z.int(),
      maxOrderCents: z.int(),
      minGiftCents: z.int(),
      maxGiftCents: z.int(),
    }),
  }),
  serverNow: instant,
  categories: z.array(z.object({ slug: z.string(), name: z.string() })),
  items: z.array(storeItem),
})
export type StoreView = z.infer<typeof storeReply>

export const storeQuery = z.strictObject({ locale: locale.optional() })
