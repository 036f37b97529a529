import { type FormEvent, type ReactNode, useState } from 'react'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/fields.tsx'
import { FieldlessProblem, problemAt, useFocusOnProblem } from './problem-at.tsx'

/** Asks for the password once more, before something that a borrowed session must not do. */
export function PasswordForm(props: {
  submit: string
  hint?: ReactNode
  mutation: { mutate: (password: string) => void; error: Error | null; isPending: boolean }
}) {
  const { t } = useWords()
  const [password, setPassword] = useState('')
  useFocusOnProblem(props.mutation.error, 'password-again')
  function submit(event: FormEvent) {
    event.preventDefault()
    props.mutation.mutate(password)
  }
  return (
    <form className="grid max-w-sm gap-4" onSubmit={submit}>
      <TextField
        id="password-again"
        label={t('secondFactor.password')}
        hint={props.hint}
        problem={problemAt(props.mutation.error, 'password')}
        type="password"
        autoComplete="current-password"
        required
        value={password}
        onChange={event => setPassword(event.target.value)}
      />
      <FieldlessProblem error={props.mutation.error} />
      <Button type="submit" look="primary" aria-busy={props.mutation.isPending}>
        {props.submit}
      </Button>
    </form>
  )
}
