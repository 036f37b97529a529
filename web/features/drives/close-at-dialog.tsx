import { useMutation, useQueryClient } from '@tanstack/react-query'
import { type FormEvent, useState } from 'react'
import { formatDeadline, zoneName } from '#shared/deadline/formatting.ts'
import type { DriveView } from '#shared/drives/contract.ts'
import { ApiError } from '../../lib/api.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextField } from '../../ui/fields.tsx'
import { Notice } from '../../ui/notice.tsx'
import { closeDriveAt, driveQuery } from './queries.ts'

/** Moves the close: earlier, later, or open again. */
export function CloseAtDialog({ view }: { view: DriveView }) {
  const { t, locale } = useWords()
  const client = useQueryClient()
  const [open, setOpen] = useState(false)
  const [form, setForm] = useState({ date: '', time: '23:59', reason: '' })
  const move = useMutation({
    mutationFn: () => closeDriveAt(view.driveId, form),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: driveQuery(view.driveId).queryKey })
      setOpen(false)
    },
  })
  const problemAt = (path: string) =>
    move.error instanceof ApiError ? move.error.fields.find(field => field.path === path)?.message : undefined
  const hasField = ['date', 'time', 'reason'].some(path => problemAt(path))
  function submit(event: FormEvent) {
    event.preventDefault()
    move.mutate()
  }
  const closesAt = Date.parse(view.closesAt)
  return (
    <>
      <Button onClick={() => setOpen(true)}>{t('organizer.closeAt.button')}</Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title={t('organizer.closeAt.title')}
        closeLabel={t('order.give.keep')}
      >
        <form className="grid gap-4 px-5 py-5" onSubmit={submit}>
          <p>
            {t('organizer.closeAt.body', {
              sellers: view.totals.sellers,
              now: formatDeadline(closesAt, view.timeZone, locale),
            })}
          </p>
          <TextField
            label={t('organizer.closeAt.day')}
            problem={problemAt('date')}
            type="date"
            required
            value={form.date}
            onChange={event => setForm({ ...form, date: event.target.value })}
          />
          <TextField
            label={t('organizer.closeAt.time')}
            hint={t('organizer.closeAt.timeHint', { zone: zoneName(view.timeZone, closesAt, locale) })}
            problem={problemAt('time')}
            type="time"
            required
            value={form.time}
            onChange={event => setForm({ ...form, time: event.target.value })}
          />
          <TextField
            label={t('organizer.close.reason')}
            hint={t('organizer.close.reasonHint')}
            problem={problemAt('reason')}
            minLength={3}
            maxLength={300}
            required
            value={form.reason}
            onChange={event => setForm({ ...form, reason: event.target.value })}
          />
          {move.error && !hasField && (
            <Notice look="problem">
              <p>
                {move.error instanceof ApiError && move.error.status > 0
                  ? move.error.message
                  : t('unreachable')}
              </p>
            </Notice>
          )}
          <Button type="submit" look="primary" aria-busy={move.isPending}>
            {t('organizer.closeAt.confirm')}
          </Button>
        </form>
      </Dialog>
    </>
  )
}
