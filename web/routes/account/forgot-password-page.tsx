import { useMutation } from '@tanstack/react-query'
import { type FormEvent, useState } from 'react'
import { DoorPage } from '../../features/people/door-page.tsx'
import { requestReset } from '../../features/people/queries.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/fields.tsx'
import { Notice } from '../../ui/notice.tsx'

export function ForgotPasswordPage() {
  const { t } = useWords()
  const [email, setEmail] = useState('')
  const ask = useMutation({ mutationFn: () => requestReset(email.trim()) })
  function submit(event: FormEvent) {
    event.preventDefault()
    ask.mutate()
  }
  return (
    <DoorPage title={t('forgot.title')}>
      <p>{t('forgot.body')}</p>
      <form className="grid gap-4" onSubmit={submit}>
        <TextField
          label={t('signIn.email')}
          type="email"
          autoComplete="username"
          required
          value={email}
          onChange={event => setEmail(event.target.value)}
        />
        <Button type="submit" look="primary" aria-busy={ask.isPending}>
          {t('forgot.submit')}
        </Button>
      </form>
      {ask.isSuccess && (
        <Notice look="good">
          <p>{t('forgot.sent', { email: email.trim() })}</p>
        </Notice>
      )}
      {ask.error && (
        <Notice look="problem">
          <p>{t('unreachable')}</p>
        </Notice>
      )}
    </DoorPage>
  )
}
