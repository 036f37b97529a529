import { useMutation, useQueryClient } from '@tanstack/react-query'
import { type FormEvent, useState } from 'react'
import type { DriveView } from '#shared/drives/contract.ts'
import { ApiError } from '../../lib/api.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextField } from '../../ui/fields.tsx'
import { Notice } from '../../ui/notice.tsx'
import { closeDrive, driveQuery } from './queries.ts'

/** Closes the stores now, after saying in numbers what that does. */
export function CloseDialog({ view }: { view: DriveView }) {
  const { t } = useWords()
  const client = useQueryClient()
  const [open, setOpen] = useState(false)
  const [reason, setReason] = useState('')
  const close = useMutation({
    mutationFn: () => closeDrive(view.driveId, reason),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: driveQuery(view.driveId).queryKey })
      setOpen(false)
    },
  })
  function submit(event: FormEvent) {
    event.preventDefault()
    close.mutate()
  }
  const field =
    close.error instanceof ApiError
      ? close.error.fields.find(problem => problem.path === 'reason')
      : undefined
  return (
    <>
      <Button look="danger" onClick={() => setOpen(true)}>
        {t('organizer.close.button')}
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title={t('organizer.close.title')}
        closeLabel={t('organizer.close.cancel')}
      >
        <form className="grid gap-4 px-5 py-5" onSubmit={submit}>
          <p>
            {t('organizer.close.body', {
              sellers: view.totals.sellers,
              waiting: view.totals.awaitingPayment,
            })}
          </p>
          <TextField
            label={t('organizer.close.reason')}
            hint={t('organizer.close.reasonHint')}
            problem={field?.message}
            required
            minLength={3}
            maxLength={300}
            value={reason}
            onChange={event => setReason(event.target.value)}
          />
          {close.error && !field && (
            <Notice look="problem">
              <p>
                {close.error instanceof ApiError && close.error.status > 0
                  ? close.error.message
                  : t('unreachable')}
              </p>
            </Notice>
          )}
          <Button type="submit" look="danger" aria-busy={close.isPending}>
            {t('organizer.close.confirm')}
          </Button>
        </form>
      </Dialog>
    </>
  )
}
