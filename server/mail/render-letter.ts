import { renderGuardianNotice } from '#emails/guardian-notice.tsx'
import { renderOrderCanceled } from '#emails/order-canceled.tsx'
import { renderPasswordReset } from '#emails/password-reset.tsx'
import { renderReceipt } from '#emails/receipt.tsx'
import { renderSecondFactorReset } from '#emails/second-factor-reset.tsx'
import { renderSignInLink } from '#emails/sign-in-link.tsx'
import { renderStaffNotice } from '#emails/staff-notice.tsx'
import type { outbox } from '../db/schema/mail.ts'
import type { Deps } from '../deps.ts'
import { findOrder } from '../orders/queries.ts'
import { LINK_MINUTES, RESET_MINUTES } from '../people/identity.ts'
import { guardianNoticeProps, receiptProps, refundNoticeProps } from './letter-props.ts'
import { staffNoticeProps } from './staff-notice-props.ts'

export type RenderedLetter = {
  subject: string
  html: string
  text: string
  replyTo?: { name: string; address: string }
}

/** The letter cannot be written, and trying again will not help. */
export class LetterError extends Error {
  constructor(message: string) {
    super(message)
    this.name = 'LetterError'
  }
}

/** Writes the letter of an outbox row from the snapshots it points at. */
export async function renderLetter(deps: Deps, row: typeof outbox.$inferSelect): Promise<RenderedLetter> {
  const facts = JSON.parse(row.facts) as Record<string, unknown>
  const locale = row.locale as 'en' | 'es'
  const site = deps.config.publicUrl
  switch (row.kind) {
    case 'receipt': {
      const order = findOrder(deps.db.orm, row.subject.slice('order:'.length))
      if (!order) throw new LetterError('the order of this receipt is gone')
      const props = receiptProps(deps, order)
      const letter = await renderReceipt(props)
      return { ...letter, replyTo: { name: props.contact.name, address: props.contact.email } }
    }
    case 'guardian_notice':
      return renderGuardianNotice(guardianNoticeProps(deps, facts, locale))
    case 'refund_notice':
      return renderOrderCanceled(refundNoticeProps(deps, facts, locale))
    case 'sign_in_link':
      return renderSignInLink({
        locale,
        email: row.recipientEmail,
        minutes: LINK_MINUTES,
        url: `${site}/sign-in/link#${String(facts.token)}`,
      })
    case 'password_reset':
      return renderPasswordReset({
        locale,
        minutes: RESET_MINUTES,
        url: `${site}/reset-password#${String(facts.token)}`,
      })
    case 'second_factor_reset':
      return renderSecondFactorReset({
        locale,
        by: String(facts.by),
        reason: String(facts.reason),
        signInUrl: `${site}/sign-in?next=/account/second-factor`,
        newPasswordUrl: `${site}/forgot-password`,
      })
    case 'staff_notice':
      return renderStaffNotice(staffNoticeProps(deps, facts))
    default:
      throw new LetterError(`no letter is known by the name ${row.kind}`)
  }
}
