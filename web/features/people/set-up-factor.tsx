import { useMutation } from '@tanstack/react-query'
import { type FormEvent, useEffect, useRef, useState } from 'react'
import type { NewSecondFactor } from '#shared/people/second-factor.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { TextField } from '../../ui/fields.tsx'
import { Sheet } from '../../ui/sheet.tsx'
import { PasswordForm } from './password-form.tsx'
import { FieldlessProblem, problemAt, useFocusOnProblem } from './problem-at.tsx'
import { beginSecondFactor, proveSecondFactor } from './second-factor-queries.ts'

/** Setting up an authenticator app: password, picture or secret, a first code. */
export function SetUpFactor(props: { onProven: (recoveryCodes: string[]) => void }) {
  const { t } = useWords()
  const begin = useMutation({ mutationFn: beginSecondFactor })
  return (
    <Sheet as="section" className="max-w-2xl px-5 py-6 sm:px-7">
      <p>{t('secondFactor.why')}</p>
      {begin.data ? (
        <Prove made={begin.data} onProven={props.onProven} />
      ) : (
        <div className="mt-6 grid gap-4">
          <h2 className="text-[1.25rem]">{t('secondFactor.step1')}</h2>
          <PasswordForm
            hint={t('secondFactor.passwordHint')}
            submit={t('secondFactor.next')}
            mutation={begin}
          />
        </div>
      )}
    </Sheet>
  )
}

function Prove({ made, onProven }: { made: NewSecondFactor; onProven: (codes: string[]) => void }) {
  const { t } = useWords()
  const [code, setCode] = useState('')
  const prove = useMutation({
    mutationFn: () => proveSecondFactor(code),
    onSuccess: answer => onProven(answer.recoveryCodes),
  })
  const heading = useRef<HTMLHeadingElement>(null)
  useEffect(() => heading.current?.focus(), [])
  useFocusOnProblem(prove.error, 'first-code')
  function submit(event: FormEvent) {
    event.preventDefault()
    prove.mutate()
  }
  return (
    <>
      <div className="mt-6 grid items-start gap-x-7 gap-y-4 sm:grid-cols-[auto_1fr]">
        <h2 ref={heading} tabIndex={-1} className="text-[1.25rem] sm:col-span-2">
          {t('secondFactor.step2')}
        </h2>
        <img
          src={`data:image/svg+xml,${encodeURIComponent(made.qrSvg)}`}
          alt={t('secondFactor.qr')}
          width={220}
          height={220}
          className="size-[13.75rem] rounded-sm border border-rule bg-white"
        />
        <div className="grid gap-3">
          <p>{t('secondFactor.scan')}</p>
          <p className="font-semibold">{t('secondFactor.type')}</p>
          <p className="rounded-sm border-[1.5px] border-field px-3 py-2 font-mono leading-relaxed tracking-[0.04em]">
            {made.secret}
          </p>
          <p className="text-[0.9em] text-ink-soft">{t('secondFactor.secretNote')}</p>
        </div>
      </div>
      <form className="mt-6 grid max-w-sm gap-4" onSubmit={submit}>
        <h2 className="text-[1.25rem]">{t('secondFactor.step3')}</h2>
        <TextField
          id="first-code"
          label={t('secondFactor.code')}
          problem={problemAt(prove.error, 'code')}
          inputMode="numeric"
          autoComplete="one-time-code"
          required
          maxLength={10}
          value={code}
          onChange={event => setCode(event.target.value)}
        />
        <FieldlessProblem error={prove.error} />
        <Button type="submit" look="primary" aria-busy={prove.isPending}>
          {t('secondFactor.finish')}
        </Button>
      </form>
    </>
  )
}
