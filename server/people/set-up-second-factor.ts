import type { Request } from 'express'
import { toString as toQr } from 'qrcode'
import { AppError } from '#shared/errors.ts'
import { refusal } from '#shared/messages/refusals.ts'
import { logActivity } from '../activity/log-activity.ts'
import { inTransaction } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import type { Person } from '../http/route.ts'
import { claimStep, endSessions, findFactor, hasSecondFactor } from './second-factor.ts'
import { matchingStep } from './totp.ts'

type Asked = { person: Person; request: Request }

const wrongPassword = () =>
  new AppError('invalid_input', {
    detail: refusal('thisIsNotThePasswordOf'),
    errors: [{ path: 'password', message: refusal('thisIsNotThePasswordOf2') }],
  })

const wrongCode = () =>
  new AppError('invalid_input', {
    detail: refusal('thisCodeDoesNotFitPlease'),
    errors: [{ path: 'code', message: refusal('thisCodeDoesNotFitPlease') }],
  })

/**
 * Makes a secret for somebody's authenticator app. It counts only once a code of it has been typed; asking
 * again before that makes another.
 *
 * @throws AppError conflict when a factor is set up already.
 */
export async function beginSecondFactor(deps: Deps, asked: Asked & { password: string }) {
  if (hasSecondFactor(deps.db.orm, asked.person.userId))
    throw new AppError('conflict', { detail: refusal('yourSecondFactorIsSetUp') })
  const address = await deps.identity.secondFactor.begin(asked.request, asked.password)
  if (address === null) throw wrongPassword()
  const secret = new URL(address).searchParams.get('secret') ?? ''
  return {
    qrSvg: await toQr(address, { type: 'svg', margin: 4, errorCorrectionLevel: 'M' }),
    secret: secret.replaceAll(/(.{4})(?=.)/g, '$1 '),
  }
}

/**
 * Turns the factor on by its first code. Sessions from before, which came in by the password alone, end;
 * this one goes on under a new cookie.
 */
export async function proveSecondFactor(deps: Deps, asked: Asked & { code: string; requestId: string }) {
  const { userId } = asked.person
  const factor = findFactor(deps.db.orm, userId)
  if (!factor || factor.verified)
    throw new AppError('conflict', { detail: refusal('thereIsNoSetupToFinish') })
  const secret = await deps.identity.secondFactor.open(factor.secret)
  const step = matchingStep(secret, asked.code, Date.now())
  if (step === null || !claimStep(deps.db, { userId, step })) throw wrongCode()
  const proven = await deps.identity.secondFactor.prove(asked.request, asked.code)
  if (!proven) throw wrongCode()
  inTransaction(deps.db, tx => {
    endSessions(tx, userId, { exceptToken: proven.sessionToken })
    logActivity(tx, {
      at: deps.now(),
      driveId: null,
      actor: userId,
      action: 'second_factor_set_up',
      subject: `user:${userId}`,
      before: { secondFactor: false },
      after: { secondFactor: true },
      requestId: asked.requestId,
    })
  })
  return {
    cookies: proven.cookies,
    recoveryCodes: await deps.identity.secondFactor.listRecoveryCodes(userId),
  }
}

/** New recovery codes in place of the old ones, printed or used up. */
export async function renewRecoveryCodes(
  deps: Deps,
  asked: Asked & { password: string; requestId: string },
): Promise<string[]> {
  const { userId } = asked.person
  if (!hasSecondFactor(deps.db.orm, userId))
    throw new AppError('conflict', { detail: refusal('pleaseSetUpYourSecondFactor') })
  const codes = await deps.identity.secondFactor.renewRecoveryCodes(asked.request, asked.password)
  if (codes === null) throw wrongPassword()
  inTransaction(deps.db, tx =>
    logActivity(tx, {
      at: deps.now(),
      driveId: null,
      actor: userId,
      action: 'recovery_codes_renewed',
      subject: `user:${userId}`,
      requestId: asked.requestId,
    }),
  )
  return codes
}
