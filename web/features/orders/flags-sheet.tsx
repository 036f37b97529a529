import { useMutation, useQueryClient } from '@tanstack/react-query'
import { type FormEvent, useState } from 'react'
import { formatShortInstant } from '#shared/deadline/formatting.ts'
import type { OrderPageView } from '#shared/drives/orders-contract.ts'
import { ApiError, post } from '../../lib/api.ts'
import { type MessageKey, useWords } from '../../lib/i18n.tsx'
import { apiPaths } from '../../paths.ts'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/fields.tsx'
import { Sheet } from '../../ui/sheet.tsx'
import { orderQuery } from './queries.ts'

/** A family does not know who ordered: what they say, and settling it. Moving or refunding settles it as well. */
export function FlagsSheet({ driveId, view }: { driveId: string; view: OrderPageView }) {
  const { t, locale } = useWords()
  const client = useQueryClient()
  const [reason, setReason] = useState('')
  const settle = useMutation({
    mutationFn: () => post<unknown>(apiPaths.settleFlags(driveId, view.id), { reason }),
    onSuccess: () => client.invalidateQueries({ queryKey: orderQuery(driveId, view.id).queryKey }),
  })
  if (view.flags.length === 0) return null
  const isOpen = view.flags.some(flag => flag.resolution === null)
  function submit(event: FormEvent) {
    event.preventDefault()
    settle.mutate()
  }
  return (
    <Sheet
      as="section"
      labelledBy="flags"
      className={`px-5 py-5 sm:px-7 ${isOpen ? 'border-l-8 border-stamp' : ''}`}
    >
      <h2 id="flags" className="text-[1.25rem]">
        {t('order.flags')}
      </h2>
      <ul>
        {view.flags.map(flag => (
          <li key={flag.id} className="border-b border-rule py-2">
            <b>
              {flag.resolution
                ? t(`order.flag.${flag.resolution}` as MessageKey)
                : t('order.flagOpen', { note: flag.note || t('order.flagNoNote') })}
            </b>
            <span className="block text-[0.95em] text-ink-soft">
              <bdi>{flag.seller}</bdi> · {formatShortInstant(Date.parse(flag.at), view.timeZone, locale)}
            </span>
          </li>
        ))}
      </ul>
      {isOpen && view.mayRefund && (
        <form className="mt-3 grid items-end gap-3 sm:grid-cols-[1fr_auto]" onSubmit={submit}>
          <TextField
            label={t('order.give.reason')}
            problem={
              settle.error
                ? settle.error instanceof ApiError && settle.error.status > 0
                  ? settle.error.message
                  : t('unreachable')
                : undefined
            }
            minLength={3}
            maxLength={300}
            required
            value={reason}
            onChange={event => setReason(event.target.value)}
          />
          <Button type="submit" aria-busy={settle.isPending}>
            {t('order.flag.resolveKnown')}
          </Button>
        </form>
      )}
    </Sheet>
  )
}
