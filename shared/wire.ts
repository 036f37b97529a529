import { z } from 'zod'

/** Unguessable public id: 22 base64url characters (128 random bits and two spare). */
export const publicId = z.string().regex(/^[A-Za-z0-9_-]{22}$/)
/** An instant on the wire: ISO 8601 in UTC, ending in Z. */
export const instant = z.iso.datetime()
/** A calendar day of the drive's own zone, `YYYY-MM-DD`. */
export const day = z.iso.date()
export const cents = z.int().min(0).max(1_000_000_000)
export const locale = z.enum(['en', 'es'])
export type Locale = z.infer<typeof locale>

/** The body of every refusal (RFC 9457 problem details). */
export const problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string(),
  code: z.string(),
  requestId: z.string().optional(),
  errors: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
  totalCents: cents.optional(),
})
export type Problem = z.infer<typeof problem>
