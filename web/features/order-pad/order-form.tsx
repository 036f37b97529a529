import { type FormEvent, type ReactNode, useRef, useState } from 'react'
import { formatMoney } from '#shared/money.ts'
import { relationshipNames } from '#shared/orders/relationships.ts'
import { isEmailAddress } from '#shared/text.ts'
import { type MessageKey, useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { CheckField, SelectField, TextField } from '../../ui/fields.tsx'
import { Notice } from '../../ui/notice.tsx'
import { creditOf } from '../store/credit.ts'
import type { PadProps } from './order-pad.tsx'
import type { Pad } from './pad.ts'
import { useOrder } from './use-order.ts'

type Problems = Partial<Record<'name' | 'email' | 'relationship' | 'gift', string>>

/** Gift, cover, who orders, and the strip that is torn off to pay. */
export function OrderForm({
  token,
  view,
  pad,
  priced,
  change,
  totals,
  frost,
}: PadProps & { totals: ReactNode; frost: ReactNode }) {
  const { t, locale } = useWords()
  const form = useRef<HTMLFormElement>(null)
  const [tried, setTried] = useState(false)
  const { send, sending, error, clearError } = useOrder({ token, view, pad, priced, change })
  const credit = creditOf(view)
  const organization = view.organization.name
  const money = (cents: number) => formatMoney(cents, { locale, currency: view.drive.currency })
  const set = (changes: Partial<Pad>) => {
    clearError()
    change(now => ({ ...now, ...changes }))
  }
  const problems = tried ? findProblems() : {}

  function findProblems(): Problems {
    const fromServer = (path: string) => error?.fields.find(field => field.path === path)?.message
    const found: Problems = {}
    const name = pad.name.trim() === '' ? t('pad.nameMissing') : fromServer('customer.name')
    const email = isEmailAddress(pad.email.trim()) ? fromServer('customer.email') : t('pad.emailWrong')
    const relationship = pad.relationship === '' ? t('pad.relationshipMissing') : undefined
    const gift = priced.giftIsWrong ? t('pad.giftWrong') : fromServer('giftCents')
    if (gift) found.gift = gift
    if (name) found.name = name
    if (email) found.email = email
    if (relationship) found.relationship = relationship
    return found
  }

  function submit(event: FormEvent) {
    event.preventDefault()
    setTried(true)
    if (Object.keys(findProblems()).length > 0) {
      // The fields are marked in the next rendering; then the first of them gets the focus.
      requestAnimationFrame(() => form.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus())
      return
    }
    void send()
  }

  return (
    <form ref={form} noValidate onSubmit={submit} aria-busy={sending}>
      <div className="grid gap-4 border-b border-rule px-5 py-4">
        <TextField
          label={t('pad.giftLabel', { organization })}
          hint={t('pad.giftHint', { organization })}
          problem={problems.gift}
          inputMode="decimal"
          autoComplete="off"
          placeholder="0.00"
          value={pad.gift}
          onChange={event => set({ gift: event.target.value })}
        />
        {priced.coverCents > 0 && view.drive.organizationBearsCardFees && (
          <CheckField
            label={t('pad.coverLabel', { amount: money(priced.coverCents) })}
            hint={t('pad.coverHint', {
              organization,
              total: money((priced.order?.totalCents ?? 0) + (pad.coverFee ? 0 : priced.coverCents)),
            })}
            checked={pad.coverFee}
            onChange={event => set({ coverFee: event.target.checked })}
          />
        )}
      </div>
      {totals}
      <div className="perforation" />
      <div className="grid gap-4 px-5 pb-6 pt-5">
        <h3 className="text-xl">{t('pad.details')}</h3>
        <TextField
          label={t('pad.name')}
          hint={t('pad.nameHint', { name: credit })}
          problem={problems.name}
          autoComplete="name"
          maxLength={100}
          required
          value={pad.name}
          onChange={event => set({ name: event.target.value })}
        />
        <TextField
          label={t('pad.email')}
          hint={t('pad.emailHint')}
          problem={problems.email}
          type="email"
          inputMode="email"
          autoComplete="email"
          maxLength={254}
          required
          value={pad.email}
          onChange={event => set({ email: event.target.value })}
        />
        <SelectField
          label={t('pad.relationship', { name: credit })}
          problem={problems.relationship}
          required
          value={pad.relationship}
          onChange={event => set({ relationship: event.target.value as Pad['relationship'] })}
        >
          <option value="">{t('pad.choose')}</option>
          {relationshipNames.map(name => (
            <option key={name} value={name}>
              {t(`relationship.${name}`)}
            </option>
          ))}
        </SelectField>
        {frost}
        {error && <Refusal error={error} total={money(error.totalCents ?? 0)} />}
        {priced.problem && tried && (
          <Notice look="problem">
            <p>{t(`pad.problem.${priced.problem}` as MessageKey)}</p>
          </Notice>
        )}
        <Button
          type="submit"
          look="primary"
          wide
          aria-busy={sending}
          aria-disabled={sending || !priced.order}
        >
          {sending ? t('pad.paying') : t('pad.pay', { total: money(priced.order?.totalCents ?? 0) })}
        </Button>
        <p className="text-[0.9em] text-ink-soft">
          {t('pad.after', { name: credit, count: priced.itemCount })}
        </p>
      </div>
    </form>
  )
}

function Refusal({
  error,
  total,
}: {
  error: NonNullable<ReturnType<typeof useOrder>['error']>
  total: string
}) {
  const { t } = useWords()
  const sentence =
    error.code === 'unreachable'
      ? t('pad.refused.unreachable')
      : error.code === 'total_changed'
        ? t('pad.refused.total', { total })
        : error.message
  return (
    <Notice look="problem" title={t('pad.refused.title')}>
      <p>{sentence}</p>
    </Notice>
  )
}
