import { useMutation, useQueryClient } from '@tanstack/react-query'
import { type FormEvent, useState } from 'react'
import type { OrderPageView } from '#shared/drives/orders-contract.ts'
import { ApiError } from '../../lib/api.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextField } from '../../ui/fields.tsx'
import { Notice } from '../../ui/notice.tsx'
import { move, orderQuery } from './queries.ts'

/** Credits an order to the seller it was meant for. */
export function MoveDialog({ driveId, view }: { driveId: string; view: OrderPageView }) {
  const { t } = useWords()
  const client = useQueryClient()
  const [open, setOpen] = useState(false)
  const [number, setNumber] = useState('')
  const [reason, setReason] = useState('')
  const go = useMutation({
    mutationFn: () => move(driveId, view.id, { sellerNumber: Number(number), reason }),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: orderQuery(driveId, view.id).queryKey })
      setOpen(false)
      setNumber('')
      setReason('')
    },
  })
  const problemAt = (path: string) =>
    go.error instanceof ApiError ? go.error.fields.find(field => field.path === path)?.message : undefined
  const items = view.lines.reduce((sum, line) => sum + line.quantity - line.refundedQuantity, 0)
  function submit(event: FormEvent) {
    event.preventDefault()
    go.mutate()
  }
  return (
    <>
      <Button onClick={() => setOpen(true)}>{t('order.move.button')}</Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title={t('order.move.title')}
        closeLabel={t('order.give.keep')}
      >
        <form className="grid gap-4 px-5 py-5" onSubmit={submit}>
          <p>{t('order.move.body', { items, from: view.sellers.map(seller => seller.name).join(', ') })}</p>
          <TextField
            label={t('order.move.number')}
            problem={problemAt('sellerNumber')}
            inputMode="numeric"
            pattern="\d{3}"
            maxLength={3}
            required
            value={number}
            onChange={event => setNumber(event.target.value.replaceAll(/\D/g, ''))}
          />
          <TextField
            label={t('order.give.reason')}
            hint={t('organizer.close.reasonHint')}
            problem={problemAt('reason')}
            minLength={3}
            maxLength={300}
            required
            value={reason}
            onChange={event => setReason(event.target.value)}
          />
          {go.error && !problemAt('sellerNumber') && !problemAt('reason') && (
            <Notice look="problem">
              <p>
                {go.error instanceof ApiError && go.error.status > 0 ? go.error.message : t('unreachable')}
              </p>
            </Notice>
          )}
          <Button type="submit" look="primary" aria-busy={go.isPending}>
            {t('order.move.confirm')}
          </Button>
        </form>
      </Dialog>
    </>
  )
}
