import { formatDay, formatDays, formatDeadline, formatInstant } from '#shared/deadline/formatting.ts'
import type { DriveView } from '#shared/drives/contract.ts'
import { formatAmount, formatMoney } from '#shared/money.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Facts } from '../../ui/facts.tsx'
import { Sheet } from '../../ui/sheet.tsx'
import { Stamp } from '../../ui/stamp.tsx'
import { CloseAtDialog } from './close-at-dialog.tsx'
import { CloseDialog } from './close-dialog.tsx'
import { DaysChart } from './days-chart.tsx'
import { NeedsSheet } from './needs-sheet.tsx'

/** Where the drive stands: its state, what was sold, by group and by seller. */
export function Overview({ view }: { view: DriveView }) {
  return (
    <div className="grid items-start gap-6 lg:grid-cols-[minmax(0,1fr)_minmax(0,1.2fr)]">
      <div className="grid gap-6">
        <StateSheet view={view} />
        <NeedsSheet view={view} />
        <GroupsSheet view={view} />
      </div>
      <SellersSheet view={view} />
    </div>
  )
}

function StateSheet({ view }: { view: DriveView }) {
  const { t, locale } = useWords()
  const { totals } = view
  const money = (cents: number) => formatMoney(cents, { locale, currency: 'usd' })
  const mayLead = ['lead', 'rep', 'admin'].includes(view.role)
  const percent = new Intl.NumberFormat(locale, { style: 'percent' })
  return (
    <Sheet as="section" className="px-5 py-6 sm:px-7">
      <div className="flex flex-wrap items-center justify-between gap-4">
        <p className="text-[1.1em] font-semibold">{stateSentence()}</p>
        {view.status === 'closed' && <Stamp word={t('store.stamp.closed')} ink="stamp" />}
      </div>
      <dl className="mt-5 grid grid-cols-2 gap-x-6 gap-y-4 sm:grid-cols-3">
        {[
          { name: t('organizer.sold'), value: String(totals.items) },
          { name: t('organizer.money'), value: money(totals.itemsCents) },
          { name: t('organizer.gifts'), value: money(totals.giftCents) },
          { name: t('organizer.orders'), value: String(totals.orders) },
          { name: t('organizer.refunded'), value: money(totals.refundedCents) },
          { name: t('organizer.waiting'), value: String(totals.awaitingPayment) },
        ].map(figure => (
          <div key={figure.name}>
            <dt className="text-[0.92em] font-semibold text-ink-soft">{figure.name}</dt>
            <dd className="font-display text-[1.6rem] font-bold leading-tight">{figure.value}</dd>
          </div>
        ))}
      </dl>
      <div className="mt-5">
        <Facts
          rows={[
            {
              name: t('organizer.selling'),
              value: t('organizer.sellingOf', { some: totals.sellersWithOrders, all: totals.sellers }),
            },
            ...(view.goalCents === null
              ? []
              : [
                  {
                    name: t('organizer.goal'),
                    value: t('organizer.goalOf', {
                      percent: percent.format(totals.itemsCents / view.goalCents),
                      amount: money(view.goalCents),
                    }),
                  },
                ]),
            ...(view.pace === null
              ? []
              : [
                  {
                    name: t('organizer.pace'),
                    value: (
                      <>
                        {t('organizer.paceValue', {
                          items: view.pace.items,
                          amount: money(view.pace.itemsCents),
                        })}
                        <span className="block text-[0.92em] font-normal text-ink-soft">
                          {t('organizer.paceNote')}
                        </span>
                      </>
                    ),
                  },
                ]),
            { name: t('organizer.turnIn'), value: formatDay(view.turnInOn, locale) },
            { name: t('organizer.delivery'), value: formatDays(view.deliveryFrom, view.deliveryTo, locale) },
          ]}
        />
      </div>
      <DaysChart view={view} />
      {mayLead && view.status !== 'not_open' && (
        <div className="mt-6 flex flex-wrap gap-3">
          <CloseAtDialog view={view} />
          {view.status === 'open' && <CloseDialog view={view} />}
        </div>
      )}
    </Sheet>
  )

  function stateSentence(): string {
    const at = (iso: string) => formatInstant(Date.parse(iso), view.timeZone, locale)
    if (view.status === 'not_open') return t('organizer.notOpen', { time: at(view.opensAt) })
    if (view.closedEarlyAt !== null) return t('organizer.closedEarly', { time: at(view.closedEarlyAt) })
    const deadline = formatDeadline(Date.parse(view.closesAt), view.timeZone, locale)
    return view.status === 'closed'
      ? t('organizer.closed', { time: deadline })
      : t('organizer.open', { time: deadline })
  }
}

function GroupsSheet({ view }: { view: DriveView }) {
  const { t, locale } = useWords()
  return (
    <Sheet as="section" labelledBy="by-group" className="px-5 py-6 sm:px-7">
      <h2 id="by-group" className="text-[1.35rem]">
        {t('organizer.groups')}
      </h2>
      <table className="mt-2 w-full">
        <thead>
          <tr className="border-b-[1.5px] border-ink text-left text-[0.9em] text-ink-soft">
            <th className="py-1.5">{t('organizer.group')}</th>
            <th className="py-1.5 text-right">{t('organizer.count')}</th>
            <th className="py-1.5 text-right">{t('organizer.itemsShort')}</th>
            <th className="py-1.5 text-right">{t('organizer.amount')}</th>
          </tr>
        </thead>
        <tbody>
          {view.groups.map(group => (
            <tr key={group.name} className="border-b border-rule">
              <td className="py-2">{group.name}</td>
              <td className="tabular py-2 text-right">{group.sellers}</td>
              <td className="tabular py-2 text-right">{group.items}</td>
              <td className="tabular py-2 text-right">{formatAmount(group.itemsCents, locale)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </Sheet>
  )
}

function SellersSheet({ view }: { view: DriveView }) {
  const { t, locale } = useWords()
  return (
    <Sheet as="section" labelledBy="by-seller" className="px-5 py-6 sm:px-7">
      <h2 id="by-seller" className="text-[1.35rem]">
        {t('organizer.sellers')}
      </h2>
      <table className="mt-2 w-full">
        <thead>
          <tr className="border-b-[1.5px] border-ink text-left text-[0.9em] text-ink-soft">
            <th className="py-1.5 pr-3">{t('organizer.numberShort')}</th>
            <th className="py-1.5">{t('organizer.seller')}</th>
            <th className="hidden py-1.5 sm:table-cell">{t('organizer.group')}</th>
            <th className="py-1.5 text-right">{t('organizer.itemsShort')}</th>
            <th className="py-1.5 text-right">{t('organizer.amount')}</th>
          </tr>
        </thead>
        <tbody>
          {view.sellers.map(seller => (
            <tr key={seller.number} className="border-b border-rule">
              <td className="tabular py-2 pr-3">{seller.number}</td>
              <td className="py-2">
                <bdi>{seller.name}</bdi>
              </td>
              <td className="hidden py-2 sm:table-cell">{seller.group}</td>
              <td className="tabular py-2 text-right">{seller.items}</td>
              <td className="tabular py-2 text-right">{formatAmount(seller.itemsCents, locale)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </Sheet>
  )
}
