import { formatDays, formatDeadline, formatInstant, sameOffset } from '#shared/deadline/formatting.ts'
import type { StoreView } from '#shared/stores/contract.ts'
import { useWords } from '../../lib/i18n.tsx'
import { useHydrated } from '../../lib/use-hydrated.ts'
import { Facts } from '../../ui/facts.tsx'
import { LetterBoxes } from '../../ui/letter-boxes.tsx'
import { Sheet } from '../../ui/sheet.tsx'
import { creditOf } from './credit.ts'

/** Who the store belongs to, whom the money helps, when it closes and when the food arrives: before the catalog. */
export function StoreHead({ view }: { view: StoreView }) {
  const { t, locale } = useWords()
  const { drive, organization } = view
  const rows = [
    deadlineRow(),
    {
      name: t('store.fact.arrives'),
      value: (
        <>
          {view.seller
            ? t('store.arrives', {
                days: formatDays(drive.deliveryFrom, drive.deliveryTo, locale),
                name: view.seller.displayName.replace(/ \S\.$/, ''),
              })
            : t('store.arrivesGroup', { days: formatDays(drive.deliveryFrom, drive.deliveryTo, locale) })}
          . {t('store.notShipped')}
        </>
      ),
    },
    {
      name: t('store.fact.helps'),
      value: t('store.helps', {
        percent: new Intl.NumberFormat(locale, { style: 'percent', maximumFractionDigits: 2 }).format(
          drive.shareBp / 10_000,
        ),
        organization: organization.name,
        fees: drive.organizationBearsCardFees ? 'yes' : 'no',
      }),
    },
    {
      name: t('store.fact.questions'),
      value: (
        <>
          {t('store.contact', { name: drive.contact.name })} ·{' '}
          <a href={`mailto:${drive.contact.email}`}>{t('store.write')}</a>
        </>
      ),
    },
  ]

  function deadlineRow() {
    const closesAt = Date.parse(drive.closesAt)
    if (drive.status === 'not_open') {
      const opensAt = Date.parse(drive.opensAt)
      return {
        name: t('store.fact.opens'),
        value: (
          <>
            {formatInstant(opensAt, drive.timeZone, locale)}
            <ViewerTime instant={opensAt} zone={drive.timeZone} />
          </>
        ),
      }
    }
    return {
      name: drive.status === 'closed' ? t('store.fact.closed') : t('store.fact.open'),
      value: (
        <>
          {formatDeadline(closesAt, drive.timeZone, locale)}
          <ViewerTime instant={closesAt - 60_000} zone={drive.timeZone} />
        </>
      ),
    }
  }

  return (
    <Sheet
      ply="goldenrod"
      as="section"
      labelledBy="store-title"
      className="grid gap-x-12 gap-y-6 px-4 pb-6 pt-5 sm:px-8 sm:pt-6 lg:grid-cols-[1fr_minmax(24rem,1fr)]"
    >
      <div>
        <p className="mb-1.5 text-[0.88em] font-semibold text-ink-soft">
          {view.seller ? t('store.belongs') : t('store.belongsGroup')}
        </p>
        <LetterBoxes text={creditOf(view)} />
        <h1 id="store-title" className="mt-4 max-w-[24ch] text-[1.65rem] sm:text-[2.1rem]">
          {t('store.headline', { purpose: drive.purpose, organization: organization.name })}
        </h1>
      </div>
      <Facts rows={rows} />
    </Sheet>
  )
}

/** The same moment on the viewer's own clock, where that reads otherwise; only the browser knows. */
function ViewerTime({ instant, zone }: { instant: number; zone: string }) {
  const { t, locale } = useWords()
  const hydrated = useHydrated()
  if (!hydrated) return null
  const own = Intl.DateTimeFormat().resolvedOptions().timeZone
  if (!own || sameOffset(own, zone, instant)) return null
  return (
    <span className="block text-[0.88em] font-normal text-ink-soft">
      {t('store.viewerTime', { time: formatInstant(instant, own, locale) })}
    </span>
  )
}
