import type { OrderStatus } from '#shared/orders/contract.ts'
import { useWords } from '../../lib/i18n.tsx'

const inks: Record<OrderStatus, string> = {
  awaiting_payment: '',
  paid: 'text-paid',
  partly_refunded: 'text-stamp',
  refunded: 'text-stamp',
  canceled: 'text-stamp',
  expired: 'text-ink-soft',
}

export function StatusWord({ status }: { status: OrderStatus }) {
  const { t } = useWords()
  return <span className={`font-semibold ${inks[status]}`}>{t(`orders.status.${status}`)}</span>
}
