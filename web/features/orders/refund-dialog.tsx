import { useMutation, useQueryClient } from '@tanstack/react-query'
import { type FormEvent, useId, useState } from 'react'
import type { OrderPageView } from '#shared/drives/orders-contract.ts'
import { formatMoney } from '#shared/money.ts'
import { ApiError } from '../../lib/api.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextField } from '../../ui/fields.tsx'
import { Notice } from '../../ui/notice.tsx'
import { Stepper } from '../../ui/stepper.tsx'
import { orderQuery, refund } from './queries.ts'

/** Gives back an order, whole or by line, after saying in numbers what that does. */
export function RefundDialog({ driveId, view }: { driveId: string; view: OrderPageView }) {
  const { t, locale } = useWords()
  const client = useQueryClient()
  const name = useId()
  const [open, setOpen] = useState(false)
  const [whole, setWhole] = useState(true)
  const [chosen, setChosen] = useState<Record<number, number>>({})
  const [reason, setReason] = useState('')
  const [tried, setTried] = useState(false)
  const money = (cents: number) => formatMoney(cents, { locale, currency: 'usd' })
  const left = view.lines.filter(line => line.refundedQuantity < line.quantity)
  const lines = left.flatMap(line => {
    const quantity = chosen[line.lineId] ?? 0
    return quantity > 0 ? [{ lineId: line.lineId, quantity, cents: quantity * line.unitPriceCents }] : []
  })
  const everything = view.refundableCents ?? 0
  const cents = whole ? everything : lines.reduce((sum, line) => sum + line.cents, 0)
  const items = whole
    ? left.reduce((sum, line) => sum + line.quantity - line.refundedQuantity, 0)
    : lines.reduce((sum, line) => sum + line.quantity, 0)
  const give = useMutation({
    mutationFn: () =>
      refund(driveId, view.id, {
        what: whole ? 'everything' : lines.map(({ lineId, quantity }) => ({ lineId, quantity })),
        reason,
      }),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: orderQuery(driveId, view.id).queryKey })
      setOpen(false)
      setChosen({})
      setReason('')
      setTried(false)
    },
  })
  const problem =
    give.error instanceof ApiError
      ? give.error.fields.find(field => field.path === 'reason')?.message
      : undefined

  function submit(event: FormEvent) {
    event.preventDefault()
    setTried(true)
    if (cents > 0 && reason.trim().length >= 3) give.mutate()
  }

  return (
    <>
      <Button look="danger" onClick={() => setOpen(true)}>
        {t('order.give.button')}
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title={t('order.give.title')}
        closeLabel={t('order.give.keep')}
      >
        <form className="grid gap-4 px-5 py-5" noValidate onSubmit={submit}>
          <fieldset className="grid gap-2">
            <legend className="sr-only">{t('order.give.title')}</legend>
            <label className="grid grid-cols-[auto_1fr] gap-x-3">
              <input
                type="radio"
                name={name}
                className="mt-1 size-5 accent-action"
                checked={whole}
                onChange={() => setWhole(true)}
              />
              <span>
                <b>{t('order.give.everything', { amount: money(everything) })}</b>
                <span className="block text-[0.92em] text-ink-soft">{t('order.give.everythingNote')}</span>
              </span>
            </label>
            {left.length > 0 && (
              <label className="grid grid-cols-[auto_1fr] gap-x-3">
                <input
                  type="radio"
                  name={name}
                  className="mt-1 size-5 accent-action"
                  checked={!whole}
                  onChange={() => setWhole(false)}
                />
                <span>
                  <b>{t('order.give.lines')}</b>
                  <span className="block text-[0.92em] text-ink-soft">{t('order.give.linesNote')}</span>
                </span>
              </label>
            )}
          </fieldset>
          {!whole && (
            <ul>
              {left.map(line => {
                const max = line.quantity - line.refundedQuantity
                const label = t('order.give.quantity', { item: line.name, left: max })
                return (
                  <li
                    key={line.lineId}
                    className="flex flex-wrap items-center justify-between gap-3 border-b border-rule py-2"
                  >
                    <span>{line.name}</span>
                    <Stepper
                      value={chosen[line.lineId] ?? 0}
                      max={max}
                      onChange={quantity =>
                        setChosen(now => ({ ...now, [line.lineId]: Math.max(0, Math.min(max, quantity)) }))
                      }
                      labels={{
                        group: label,
                        amount: label,
                        less: t('pad.less', { item: line.name }),
                        more: t('pad.more', { item: line.name }),
                      }}
                    />
                  </li>
                )
              })}
            </ul>
          )}
          <TextField
            label={t('order.give.reason')}
            hint={t('order.give.reasonHint')}
            problem={problem ?? (tried && reason.trim().length < 3 ? t('field.fill') : undefined)}
            maxLength={300}
            required
            value={reason}
            onChange={event => setReason(event.target.value)}
          />
          <p aria-live="polite">
            {t('order.give.sum', { amount: money(cents), name: view.customer.name, items })}
          </p>
          {tried && cents === 0 && (
            <Notice look="problem">
              <p>{t('order.give.nothing')}</p>
            </Notice>
          )}
          {give.error && !problem && (
            <Notice look="problem">
              <p>
                {give.error instanceof ApiError && give.error.status > 0
                  ? give.error.message
                  : t('unreachable')}
              </p>
            </Notice>
          )}
          <Button type="submit" look="danger" aria-busy={give.isPending} disabled={give.isPending}>
            {t('order.give.confirm', { amount: money(cents) })}
          </Button>
        </form>
      </Dialog>
    </>
  )
}
