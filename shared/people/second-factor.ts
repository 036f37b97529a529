import { z } from 'zod'
import { refusal } from '../messages/refusals.ts'
import { driveRoles } from './contract.ts'

const password = z.string().min(1, refusal('pleaseTypeYourPassword')).max(128)
const reason = z.string().trim().min(3, refusal('sayWhyInAFewWords')).max(300)
/** Somebody's own id; ids made by hand or by the sign-in library have other lengths than ours. */
export const userId = z.string().regex(/^[A-Za-z0-9_-]{16,64}$/)

/** Where somebody's own second factor stands. */
export const secondFactorReply = z.object({ isOn: z.boolean(), recoveryCodesLeft: z.int() })
export type SecondFactor = z.infer<typeof secondFactorReply>

export const beginSecondFactorBody = z.strictObject({ password })
/** What an authenticator app needs: the picture to scan, or the secret to type, in groups of four. */
export const beginSecondFactorReply = z.object({ qrSvg: z.string(), secret: z.string() })
export type NewSecondFactor = z.infer<typeof beginSecondFactorReply>

export const proveSecondFactorBody = z.strictObject({
  code: z
    .string()
    .transform(text => text.replaceAll(/[\s-]/g, ''))
    .pipe(z.string().regex(/^\d{6}$/, 'A code has six digits.')),
})
export const renewRecoveryCodesBody = z.strictObject({ password })
export const recoveryCodesReply = z.object({ recoveryCodes: z.array(z.string()) })
export type RecoveryCodes = z.infer<typeof recoveryCodesReply>

export const resetSecondFactorBody = z.strictObject({ reason })
export const resetSecondFactorReply = z.object({ reset: z.literal(true) })

/** The people of a drive. An e-mail address is null for those who need not know it. */
export const teamReply = z.object({
  members: z.array(
    z.object({
      userId: z.string(),
      name: z.string(),
      email: z.string().nullable(),
      role: z.enum(driveRoles),
      secondFactor: z.boolean(),
      isMe: z.boolean(),
      mayReset: z.boolean(),
    }),
  ),
})
export type Team = z.infer<typeof teamReply>
