import { z } from 'zod'
import { refusal } from '../messages/refusals.ts'
import { cleanText } from '../text.ts'

export const consentBody = z.strictObject({ show: z.boolean() })

export const flagBody = z.strictObject({
  /** What the family wants to add; may be empty. */
  note: z
    .string()
    .max(2_000)
    .transform((raw, context) => {
      const cleaned = cleanText(raw, { max: 300, multiline: true })
      if (cleaned.ok) return cleaned.text
      context.addIssue({ code: 'custom', message: refusal(`text.${cleaned.problem}`, { max: 300 }) })
      return z.NEVER
    }),
})

export const resolveFlagBody = z.strictObject({
  reason: z.string().trim().min(3, refusal('sayWhyInAFewWords')).max(300),
})
