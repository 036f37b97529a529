import { useEffect, useState } from 'react'
import type { OrdersQuery } from '#shared/drives/orders-contract.ts'
import type { OrderStatus } from '#shared/orders/contract.ts'
import { useWords } from '../../lib/i18n.tsx'
import { CheckField, SelectField, TextField } from '../../ui/fields.tsx'

const statuses: OrderStatus[] = [
  'awaiting_payment',
  'paid',
  'partly_refunded',
  'refunded',
  'canceled',
  'expired',
]
/** Typing is looked up once it pauses. */
const PAUSE_MS = 250

type OrdersFiltersProps = {
  query: OrdersQuery
  groups: string[]
  onChange: (changes: { search?: string; status?: string; group?: string; flagged?: string }) => void
}

export function OrdersFilters({ query, groups, onChange }: OrdersFiltersProps) {
  const { t } = useWords()
  const [typed, setTyped] = useState(query.search ?? '')
  useEffect(() => setTyped(query.search ?? ''), [query.search])
  useEffect(() => {
    if (typed === (query.search ?? '')) return
    const timer = setTimeout(() => onChange({ search: typed }), PAUSE_MS)
    return () => clearTimeout(timer)
  }, [typed, query.search, onChange])
  return (
    <search className="grid items-end gap-x-5 gap-y-3 sm:grid-cols-2 lg:grid-cols-[2fr_1fr_1fr_auto]">
      <TextField
        label={t('orders.search')}
        type="search"
        value={typed}
        maxLength={100}
        onChange={event => setTyped(event.target.value)}
      />
      <SelectField
        label={t('orders.status')}
        value={query.status ?? ''}
        onChange={event => onChange({ status: event.target.value })}
      >
        <option value="">{t('orders.all')}</option>
        {statuses.map(status => (
          <option key={status} value={status}>
            {t(`orders.status.${status}`)}
          </option>
        ))}
      </SelectField>
      <SelectField
        label={t('orders.group')}
        value={query.group ?? ''}
        onChange={event => onChange({ group: event.target.value })}
      >
        <option value="">{t('orders.all')}</option>
        {groups.map(group => (
          <option key={group}>{group}</option>
        ))}
      </SelectField>
      <CheckField
        label={t('orders.flagged')}
        checked={query.flagged === 'yes'}
        onChange={event => onChange({ flagged: event.target.checked ? 'yes' : '' })}
      />
    </search>
  )
}
