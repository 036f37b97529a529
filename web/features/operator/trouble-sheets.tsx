import { useMutation, useQueryClient } from '@tanstack/react-query'
import { type FormEvent, useState } from 'react'
import { Link } from 'react-router-dom'
import { formatShortInstant } from '#shared/deadline/formatting.ts'
import { formatMoney } from '#shared/money.ts'
import type { OperatorView } from '#shared/operator/contract.ts'
import { ApiError } from '../../lib/api.ts'
import { type MessageKey, useWords } from '../../lib/i18n.tsx'
import { paths } from '../../paths.ts'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { TextField } from '../../ui/fields.tsx'
import { Sheet } from '../../ui/sheet.tsx'
import { operatorQuery, retryLetter, settle } from './queries.ts'

type PutAside = OperatorView['putAside'][number]

/** The operator's clocks read the zone of the browser: they look at drives in several. */
const ownZone = () => Intl.DateTimeFormat().resolvedOptions().timeZone

export function PutAsideSheet({ view }: { view: OperatorView }) {
  const { t, locale } = useWords()
  return (
    <Sheet as="section" labelledBy="put-aside" className="px-5 py-6 sm:px-7">
      <h2 id="put-aside" className="text-[1.35rem]">
        {t('operator.putAside')}
      </h2>
      {view.putAside.length === 0 && <p className="mt-1 text-ink-soft">{t('operator.putAside.none')}</p>}
      <ul>
        {view.putAside.map(payment => (
          <li key={payment.id} className="grid grid-cols-[1fr_auto] gap-x-4 border-b border-rule py-3">
            <span>
              <b className="text-stamp">
                {formatMoney(payment.amountCents, { locale, currency: payment.currency })}
              </b>{' '}
              {t(`operator.putAside.${payment.reason}` as MessageKey)}
              <span className="block text-[0.95em] text-ink-soft">
                {payment.driveId && payment.orderId && payment.orderNumber && (
                  <>
                    <Link to={paths.organizerOrder(payment.driveId, payment.orderId)}>
                      {payment.orderNumber}
                    </Link>
                    , {payment.organization} ·{' '}
                  </>
                )}
                {formatShortInstant(Date.parse(payment.at), ownZone(), locale)}
              </span>
            </span>
            {view.roles.includes('admin') && <SettleDialog payment={payment} />}
          </li>
        ))}
      </ul>
    </Sheet>
  )
}

function SettleDialog({ payment }: { payment: PutAside }) {
  const { t, locale } = useWords()
  const client = useQueryClient()
  const [open, setOpen] = useState(false)
  const [resolution, setResolution] = useState('')
  const note = useMutation({
    mutationFn: () => settle(payment.id, resolution),
    onSuccess: () => client.invalidateQueries({ queryKey: operatorQuery.queryKey }),
  })
  function submit(event: FormEvent) {
    event.preventDefault()
    note.mutate()
  }
  return (
    <>
      <Button onClick={() => setOpen(true)}>{t('operator.putAside.settle')}</Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title={t('operator.putAside.title')}
        closeLabel={t('order.give.keep')}
      >
        <form className="grid gap-4 px-5 py-5" onSubmit={submit}>
          <p>
            {t('operator.putAside.body', {
              amount: formatMoney(payment.amountCents, { locale, currency: payment.currency }),
            })}
          </p>
          <TextField
            label={t('operator.putAside.what')}
            problem={
              note.error
                ? note.error instanceof ApiError && note.error.status > 0
                  ? note.error.message
                  : t('unreachable')
                : undefined
            }
            minLength={3}
            maxLength={300}
            required
            value={resolution}
            onChange={event => setResolution(event.target.value)}
          />
          <Button type="submit" look="primary" aria-busy={note.isPending}>
            {t('operator.putAside.confirm')}
          </Button>
        </form>
      </Dialog>
    </>
  )
}

export function FailedLettersSheet({ view }: { view: OperatorView }) {
  const { t, locale } = useWords()
  const client = useQueryClient()
  const again = useMutation({
    mutationFn: retryLetter,
    onSuccess: () => client.invalidateQueries({ queryKey: operatorQuery.queryKey }),
  })
  return (
    <Sheet as="section" labelledBy="failed-letters" className="px-5 py-6 sm:px-7">
      <h2 id="failed-letters" className="text-[1.35rem]">
        {t('operator.letters')}
      </h2>
      {view.failedLetters.length === 0 && <p className="mt-1 text-ink-soft">{t('operator.letters.none')}</p>}
      <ul>
        {view.failedLetters.map(letter => (
          <li key={letter.id} className="grid grid-cols-[1fr_auto] gap-x-4 border-b border-rule py-3">
            <span className="min-w-0 break-words">
              <b>{letter.to}</b>
              <span className="block text-[0.95em] text-ink-soft">
                {formatShortInstant(Date.parse(letter.at), ownZone(), locale)}{' '}
                {t('operator.letters.tries', { count: letter.attempts })} · {letter.error}
              </span>
            </span>
            {view.roles.includes('admin') && (
              <Button onClick={() => again.mutate(letter.id)}>{t('operator.letters.retry')}</Button>
            )}
          </li>
        ))}
      </ul>
    </Sheet>
  )
}
