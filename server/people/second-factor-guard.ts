import { createAuthMiddleware } from 'better-auth/api'
import { symmetricDecrypt } from 'better-auth/crypto'
import type { Db } from '../db/open.ts'
import { tidyRecoveryCode } from './recovery-codes.ts'
import { claimStep, findFactor } from './second-factor.ts'
import { matchingStep } from './totp.ts'

const VERIFY_CODE = '/two-factor/verify-totp'
const VERIFY_RECOVERY_CODE = '/two-factor/verify-backup-code'

/**
 * Stands before the sign-in library's own check of a code, which takes the same code twice and can let a
 * device off the factor for a month. A code that was used already goes on as an empty one, so that the
 * library refuses it in its usual words and counts it as a wrong try.
 *
 * Codes go by the machine's clock, as the phones that show them do, and not by a demonstration's own.
 */
export function secondFactorGuard(db: Db) {
  return createAuthMiddleware(async ctx => {
    if (ctx.path !== VERIFY_CODE && ctx.path !== VERIFY_RECOVERY_CODE) return
    const typed = typeof ctx.body?.code === 'string' ? (ctx.body.code as string) : ''
    const passOn = (code: string) => ({ context: { body: { code, trustDevice: false } } })
    if (ctx.path === VERIFY_RECOVERY_CODE) return passOn(tidyRecoveryCode(typed))

    const code = typed.replaceAll(/[\s-]/g, '')
    const cookie = ctx.context.createAuthCookie('two_factor')
    const challenge = await ctx.getSignedCookie(cookie.name, ctx.context.secret)
    const begun = challenge ? await ctx.context.internalAdapter.findVerificationValue(challenge) : null
    // No sign-in was begun: the library says so itself.
    if (!begun) return passOn(code)
    const factor = findFactor(db.orm, begun.value)
    if (!factor) return passOn(code)
    const secret = await symmetricDecrypt({ key: ctx.context.secretConfig, data: factor.secret })
    const step = matchingStep(secret, code, Date.now())
    return passOn(step !== null && claimStep(db, { userId: begun.value, step }) ? code : '')
  })
}
