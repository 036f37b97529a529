import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { useNavigate } from 'react-router-dom'
import type { Me } from '#shared/people/contract.ts'
import type { SecondFactor } from '#shared/people/second-factor.ts'
import { DeskLayout } from '../../features/people/desk-layout.tsx'
import { PasswordForm } from '../../features/people/password-form.tsx'
import { FieldlessProblem } from '../../features/people/problem-at.tsx'
import { meQuery } from '../../features/people/queries.ts'
import { RecoveryCodesSheet } from '../../features/people/recovery-codes-sheet.tsx'
import { renewRecoveryCodes, secondFactorQuery } from '../../features/people/second-factor-queries.ts'
import { SetUpFactor } from '../../features/people/set-up-factor.tsx'
import { whereTo } from '../../features/people/where-to.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Sheet } from '../../ui/sheet.tsx'

/** One's own second factor: set it up, print recovery codes. */
export function SecondFactorPage() {
  const { t } = useWords()
  return (
    <DeskLayout ply="white" title={t('secondFactor.title')}>
      {me => <Content me={me} />}
    </DeskLayout>
  )
}

function Content({ me }: { me: Me }) {
  const client = useQueryClient()
  const navigate = useNavigate()
  const factor = useQuery(secondFactorQuery)
  const [codes, setCodes] = useState<{ list: string[]; isFirst: boolean } | null>(null)

  async function done() {
    const wasFirst = codes?.isFirst
    setCodes(null)
    await client.invalidateQueries()
    if (wasFirst) await navigate(whereTo(await client.fetchQuery(meQuery), null))
  }

  if (codes) return <RecoveryCodesSheet codes={codes.list} email={me.email} onDone={done} />
  if (factor.error) return <FieldlessProblem error={factor.error} />
  if (!factor.data) return null
  if (!factor.data.isOn) return <SetUpFactor onProven={list => setCodes({ list, isFirst: true })} />
  return <FactorIsOn factor={factor.data} onRenewed={list => setCodes({ list, isFirst: false })} />
}

function FactorIsOn(props: { factor: SecondFactor; onRenewed: (codes: string[]) => void }) {
  const { t } = useWords()
  const renew = useMutation({
    mutationFn: renewRecoveryCodes,
    onSuccess: answer => props.onRenewed(answer.recoveryCodes),
  })
  return (
    <Sheet as="section" className="grid max-w-2xl gap-4 px-5 py-6 sm:px-7">
      <p className="text-[1.1em] font-semibold">{t('secondFactor.on')}</p>
      <p>{t('secondFactor.left', { count: props.factor.recoveryCodesLeft })}</p>
      <p className="text-ink-soft">{t('secondFactor.newPhone')}</p>
      <h2 className="mt-2 text-[1.25rem]">{t('secondFactor.renewTitle')}</h2>
      <p>{t('secondFactor.renewBody')}</p>
      <PasswordForm submit={t('secondFactor.renew')} mutation={renew} />
    </Sheet>
  )
}
