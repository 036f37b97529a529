import { useMutation, useQueryClient } from '@tanstack/react-query'
import { type FormEvent, useState } from 'react'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextField } from '../../ui/fields.tsx'
import { FieldlessProblem, problemAt } from './problem-at.tsx'
import { resetMemberFactor, teamQuery } from './second-factor-queries.ts'

/** Says what taking a second factor off does, and asks why. */
export function ResetFactorDialog(props: {
  driveId: string
  member: { userId: string; name: string }
  onClose: () => void
  onDone: () => void
}) {
  const { t } = useWords()
  const client = useQueryClient()
  const [reason, setReason] = useState('')
  const { name, userId } = props.member
  const reset = useMutation({
    mutationFn: () => resetMemberFactor(props.driveId, userId, reason),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: teamQuery(props.driveId).queryKey })
      props.onDone()
    },
  })
  function submit(event: FormEvent) {
    event.preventDefault()
    reset.mutate()
  }
  return (
    <Dialog
      open
      onOpenChange={open => !open && props.onClose()}
      title={t('team.resetTitle', { name })}
      closeLabel={t('team.resetCancel')}
    >
      <form className="grid gap-4 px-5 py-5" onSubmit={submit}>
        <p>{t('team.resetBody', { name })}</p>
        <TextField
          label={t('team.resetReason')}
          hint={t('team.resetReasonHint', { name })}
          problem={problemAt(reset.error, 'reason')}
          required
          minLength={3}
          maxLength={300}
          value={reason}
          onChange={event => setReason(event.target.value)}
        />
        <FieldlessProblem error={reset.error} />
        <Button type="submit" look="danger" aria-busy={reset.isPending}>
          {t('team.resetConfirm')}
        </Button>
      </form>
    </Dialog>
  )
}
