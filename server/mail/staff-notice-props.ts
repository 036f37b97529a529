import { wordsFor } from '#emails/parts/words.ts'
import { formatMoney } from '#shared/money.ts'
import type { Deps } from '../deps.ts'

/** What a short notice to staff or a lead says, by what happened. */
export function staffNoticeProps(deps: Deps, facts: Record<string, unknown>) {
  const site = deps.config.publicUrl
  const { t } = wordsFor('en')
  const number = String(facts.number)
  const amount = () =>
    formatMoney(Number(facts.amountCents), { locale: 'en', currency: String(facts.currency ?? 'usd') })
  switch (facts.notice) {
    case 'order_flagged':
      return {
        desk: 'organizer' as const,
        title: t('notice.flagged.title', { number }),
        sentences: [t('notice.flagged.body'), t('notice.flagged.discreet')],
        url: `${site}/organizer/${String(facts.drivePublicId)}/orders/${String(facts.orderPublicId)}`,
      }
    case 'refund_failed':
      return {
        title: t('notice.refundFailed.title', { number }),
        sentences: [t('notice.refundFailed.body', { amount: amount() })],
        url: `${site}/operator`,
      }
    default:
      return {
        title: t('notice.putAside.title'),
        sentences: [t('notice.putAside.body', { amount: amount() }), t('notice.putAside.waits')],
        url: `${site}/operator`,
      }
  }
}
