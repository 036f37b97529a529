import { useMutation, useQueryClient } from '@tanstack/react-query'
import { type FormEvent, useState } from 'react'
import { Link, useNavigate, useSearchParams } from 'react-router-dom'
import { CodeStep } from '../../features/people/code-step.tsx'
import { DoorPage } from '../../features/people/door-page.tsx'
import { meQuery, requestLink, signIn } from '../../features/people/queries.ts'
import { whereTo } from '../../features/people/where-to.ts'
import { ApiError } from '../../lib/api.ts'
import { useWords } from '../../lib/i18n.tsx'
import { paths } from '../../paths.ts'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/fields.tsx'
import { Notice } from '../../ui/notice.tsx'

/** E-mail and password for everybody, then the code of a second factor; for families also a link by e-mail. */
export function SignInPage() {
  const { t } = useWords()
  const [search] = useSearchParams()
  const navigate = useNavigate()
  const client = useQueryClient()
  const [email, setEmail] = useState('')
  const [password, setPassword] = useState('')
  const [asksCode, setAsksCode] = useState(false)
  async function land() {
    client.clear()
    const me = await client.fetchQuery(meQuery)
    await navigate(whereTo(me, search.get('next')), { replace: true })
  }
  const enter = useMutation({
    mutationFn: () => signIn({ email: email.trim(), password }),
    onSuccess: async answer => {
      setPassword('')
      if (answer.twoFactorRedirect) setAsksCode(true)
      else await land()
    },
  })
  const link = useMutation({ mutationFn: () => requestLink(email.trim()) })

  function submit(event: FormEvent) {
    event.preventDefault()
    enter.mutate()
  }

  if (asksCode)
    return (
      <DoorPage title={t('code.title')}>
        <CodeStep onSignedIn={land} onStartAgain={() => setAsksCode(false)} />
      </DoorPage>
    )
  return (
    <DoorPage title={t('signIn.title')}>
      <form className="grid gap-4" onSubmit={submit}>
        <TextField
          label={t('signIn.email')}
          type="email"
          autoComplete="username"
          required
          value={email}
          onChange={event => setEmail(event.target.value)}
        />
        <TextField
          label={t('signIn.password')}
          type="password"
          autoComplete="current-password"
          required
          value={password}
          onChange={event => setPassword(event.target.value)}
        />
        {enter.error && <Refused error={enter.error} />}
        <Button type="submit" look="primary" aria-busy={enter.isPending}>
          {t('signIn.submit')}
        </Button>
        <p>
          <Link to={paths.forgotPassword}>{t('signIn.forgot')}</Link>
        </p>
      </form>
      <section className="grid gap-3 border-t border-rule pt-5">
        <h2 className="text-xl">{t('signIn.linkTitle')}</h2>
        <p>{t('signIn.linkBody')}</p>
        <p>
          <Button disabled={email.trim() === ''} onClick={() => link.mutate()}>
            {t('signIn.linkSubmit')}
          </Button>
        </p>
        {link.isSuccess && (
          <Notice look="good">
            <p>{t('signIn.linkSent', { email: email.trim() })}</p>
          </Notice>
        )}
        {link.error && <Refused error={link.error} />}
      </section>
    </DoorPage>
  )
}

function Refused({ error }: { error: Error }) {
  const { t } = useWords()
  const status = error instanceof ApiError ? error.status : 0
  const sentence = status === 0 ? t('unreachable') : status === 429 ? t('signIn.many') : t('signIn.wrong')
  return (
    <Notice look="problem">
      <p>{sentence}</p>
    </Notice>
  )
}
