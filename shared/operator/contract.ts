import { z } from 'zod'
import { refusal } from '../messages/refusals.ts'
import { cents, day, instant, publicId } from '../wire.ts'
import { stages } from './stages.ts'

export const operatorDrive = z.object({
  driveId: publicId,
  organization: z.string(),
  name: z.string(),
  stage: z.enum(stages),
  rep: z.string().nullable(),
  mine: z.boolean(),
  closesAt: instant,
  timeZone: z.string(),
  deliveryFrom: day,
  orders: z.int(),
  items: z.int(),
  itemsCents: cents,
  flags: z.int(),
})
export type OperatorDrive = z.infer<typeof operatorDrive>

export const operatorReply = z.object({
  roles: z.array(z.string()),
  drives: z.array(operatorDrive),
  putAside: z.array(
    z.object({
      id: publicId,
      reason: z.string(),
      amountCents: cents,
      currency: z.string(),
      at: instant,
      orderNumber: z.string().nullable(),
      organization: z.string().nullable(),
      driveId: publicId.nullable(),
      orderId: publicId.nullable(),
    }),
  ),
  failedLetters: z.array(
    z.object({
      id: z.int(),
      kind: z.string(),
      to: z.string(),
      at: instant,
      attempts: z.int(),
      error: z.string(),
    }),
  ),
})
export type OperatorView = z.infer<typeof operatorReply>

export const searchQuery = z.strictObject({
  q: z.string().trim().min(2, refusal('writeAtLeastTwoLetters')).max(100),
})
export const searchReply = z.object({
  orders: z.array(
    z.object({
      driveId: publicId,
      orderId: publicId,
      number: z.string(),
      customer: z.string(),
      organization: z.string(),
      status: z.string(),
    }),
  ),
  sellers: z.array(
    z.object({ driveId: publicId, name: z.string(), number: z.int(), organization: z.string() }),
  ),
})
export type SearchView = z.infer<typeof searchReply>

export const settleBody = z.strictObject({
  resolution: z.string().trim().min(3, refusal('sayWhatWasDoneInA')).max(300),
})
