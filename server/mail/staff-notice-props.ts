import { formatMoney } from '#shared/money.ts'
import type { Deps } from '../deps.ts'

/** What a short notice to staff or a lead says, by what happened. */
export function staffNoticeProps(deps: Deps, facts: Record<string, unknown>) {
  const site = deps.config.publicUrl
  const amount = () =>
    formatMoney(Number(facts.amountCents), { locale: 'en', currency: String(facts.currency ?? 'usd') })
  switch (facts.notice) {
    case 'order_flagged':
      return {
        desk: 'organizer' as const,
        title: `A family does not know who placed order ${String(facts.number)}`,
        sentences: [
          'They ask you to look at it. Hand over nothing of it until you have settled it: the person is known after all, the order belongs to another seller, or it is refunded.',
          'The customer is not told who asked.',
        ],
        url: `${site}/organizer/${String(facts.drivePublicId)}/orders/${String(facts.orderPublicId)}`,
      }
    case 'refund_failed':
      return {
        title: `The refund of order ${String(facts.number)} was refused`,
        sentences: [
          `The card service did not give back ${amount()}. Nothing of it was booked; it can be tried again, or paid back another way.`,
        ],
        url: `${site}/operator`,
      }
    default:
      return {
        title: 'A payment was put aside',
        sentences: [
          `A payment of ${amount()} does not fit its order and was not credited.`,
          'It waits on the operator desk for somebody to look at it.',
        ],
        url: `${site}/operator`,
      }
  }
}
