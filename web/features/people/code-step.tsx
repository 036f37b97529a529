import { useMutation } from '@tanstack/react-query'
import { type FormEvent, useEffect, useState } from 'react'
import { ApiError } from '../../lib/api.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/fields.tsx'
import { Notice } from '../../ui/notice.tsx'
import { verifyCode, verifyRecoveryCode } from './queries.ts'

const FIELD = 'sign-in-code'

/** The second step of signing in: the code of the authenticator app, or a printed one. */
export function CodeStep(props: { onSignedIn: () => Promise<void>; onStartAgain: () => void }) {
  const { t } = useWords()
  const [byPaper, setByPaper] = useState(false)
  const [code, setCode] = useState('')
  const verify = useMutation({
    mutationFn: () => (byPaper ? verifyRecoveryCode(code) : verifyCode(code)),
    onSuccess: props.onSignedIn,
    onError: () => {
      // A code that was refused is never right later.
      setCode('')
      document.getElementById(FIELD)?.focus()
    },
  })
  // biome-ignore lint/correctness/useExhaustiveDependencies: the field is another one after the switch.
  useEffect(() => document.getElementById(FIELD)?.focus(), [byPaper])

  function submit(event: FormEvent) {
    event.preventDefault()
    verify.mutate()
  }
  function change() {
    verify.reset()
    setCode('')
    setByPaper(!byPaper)
  }

  return (
    <>
      <p>{byPaper ? t('code.recoveryBody') : t('code.body')}</p>
      <form className="grid gap-4" onSubmit={submit}>
        {byPaper ? (
          <TextField
            key="paper"
            id={FIELD}
            label={t('code.recoveryLabel')}
            hint={t('code.recoveryHint')}
            autoComplete="off"
            autoCapitalize="characters"
            spellCheck={false}
            required
            maxLength={20}
            value={code}
            onChange={event => setCode(event.target.value)}
          />
        ) : (
          <TextField
            key="app"
            id={FIELD}
            label={t('code.label')}
            hint={t('code.hint')}
            inputMode="numeric"
            autoComplete="one-time-code"
            required
            maxLength={10}
            value={code}
            onChange={event => setCode(event.target.value)}
          />
        )}
        {verify.error && <Refused error={verify.error} byPaper={byPaper} onStartAgain={props.onStartAgain} />}
        <Button type="submit" look="primary" aria-busy={verify.isPending}>
          {t('code.submit')}
        </Button>
      </form>
      <div className="grid justify-items-start gap-1 border-t border-rule pt-4">
        <Button look="quiet" className="text-left" onClick={change}>
          {byPaper ? t('code.useApp') : t('code.useRecovery')}
        </Button>
        <Button look="quiet" className="text-left" onClick={props.onStartAgain}>
          {t('code.startAgain')}
        </Button>
        {byPaper && <p className="px-2 text-ink-soft">{t('code.lost')}</p>}
      </div>
    </>
  )
}

function Refused(props: { error: Error; byPaper: boolean; onStartAgain: () => void }) {
  const { t } = useWords()
  const { status, code } = props.error instanceof ApiError ? props.error : { status: 0, code: '' }
  const isOver = ['INVALID_TWO_FACTOR_COOKIE', 'TOO_MANY_ATTEMPTS_REQUEST_NEW_CODE'].includes(code)
  const sentence = () => {
    if (status === 0) return t('unreachable')
    if (code === 'ACCOUNT_TEMPORARILY_LOCKED') return t('code.locked')
    if (status === 429) return t('signIn.many')
    if (isOver) return t('code.late')
    return props.byPaper ? t('code.recoveryWrong') : t('code.wrong')
  }
  return (
    <Notice look="problem">
      <p>{sentence()}</p>
      {isOver && (
        <p>
          <Button onClick={props.onStartAgain}>{t('code.startAgain')}</Button>
        </p>
      )}
    </Notice>
  )
}
