import { useMutation, useQueryClient } from '@tanstack/react-query'
import { type FormEvent, useState } from 'react'
import type { SellerView } from '#shared/sellers/contract.ts'
import { ApiError } from '../../lib/api.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextField } from '../../ui/fields.tsx'
import { Notice } from '../../ui/notice.tsx'
import { flagOrder, sellerQuery } from './queries.ts'

/** "I don't know this person": says what happens next before anything does. */
export function FlagDialog({ sellerId, order }: { sellerId: string; order: SellerView['orders'][number] }) {
  const { t } = useWords()
  const client = useQueryClient()
  // The notice mail leads straight here.
  const [open, setOpen] = useState(() => window.location.hash === `#unknown-${order.id}`)
  const [note, setNote] = useState('')
  const tell = useMutation({
    mutationFn: () => flagOrder(sellerId, order.id, note),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: sellerQuery(sellerId).queryKey })
      setOpen(false)
    },
  })
  function submit(event: FormEvent) {
    event.preventDefault()
    tell.mutate()
  }
  return (
    <>
      <Button look="quiet" className="!min-h-11 !px-0 text-[0.9em]" onClick={() => setOpen(true)}>
        {t('family.flag.button')}
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title={t('family.flag.title', { name: order.customerName })}
        closeLabel={t('family.flag.cancel')}
      >
        <form className="grid gap-4 px-5 py-5" onSubmit={submit}>
          <p>{t('family.flag.body')}</p>
          <TextField
            label={t('family.flag.note')}
            maxLength={300}
            value={note}
            onChange={event => setNote(event.target.value)}
          />
          {tell.error && (
            <Notice look="problem">
              <p>
                {tell.error instanceof ApiError && tell.error.status > 0
                  ? tell.error.message
                  : t('unreachable')}
              </p>
            </Notice>
          )}
          <Button type="submit" look="danger" aria-busy={tell.isPending}>
            {t('family.flag.confirm')}
          </Button>
        </form>
      </Dialog>
    </>
  )
}
