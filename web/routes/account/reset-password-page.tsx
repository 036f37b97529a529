import { useMutation } from '@tanstack/react-query'
import { type FormEvent, useState } from 'react'
import { Link } from 'react-router-dom'
import { DoorPage } from '../../features/people/door-page.tsx'
import { resetPassword } from '../../features/people/queries.ts'
import { ApiError } from '../../lib/api.ts'
import { useWords } from '../../lib/i18n.tsx'
import { paths } from '../../paths.ts'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/fields.tsx'
import { Notice } from '../../ui/notice.tsx'

const SHORTEST = 10

export function ResetPasswordPage() {
  const { t } = useWords()
  const [password, setPassword] = useState('')
  const [tried, setTried] = useState(false)
  const save = useMutation({
    mutationFn: () => resetPassword({ token: window.location.hash.slice(1), newPassword: password }),
  })
  function submit(event: FormEvent) {
    event.preventDefault()
    setTried(true)
    if (password.length >= SHORTEST) save.mutate()
  }
  if (save.isSuccess)
    return (
      <DoorPage title={t('reset.title')}>
        <Notice look="good">
          <p>{t('reset.done')}</p>
        </Notice>
        <p>
          <Link to={paths.signIn}>{t('signIn.title')}</Link>
        </p>
      </DoorPage>
    )
  return (
    <DoorPage title={t('reset.title')}>
      <form className="grid gap-4" onSubmit={submit}>
        <TextField
          label={t('reset.password')}
          hint={t('reset.hint')}
          problem={tried && password.length < SHORTEST ? t('reset.short') : undefined}
          type="password"
          autoComplete="new-password"
          value={password}
          onChange={event => setPassword(event.target.value)}
        />
        <Button type="submit" look="primary" aria-busy={save.isPending}>
          {t('reset.submit')}
        </Button>
      </form>
      {save.error && (
        <Notice look="problem">
          <p>
            {save.error instanceof ApiError && save.error.status > 0 ? t('reset.wrong') : t('unreachable')}
          </p>
          <p>
            <Link to={paths.forgotPassword}>{t('signIn.again')}</Link>
          </p>
        </Notice>
      )}
    </DoorPage>
  )
}
