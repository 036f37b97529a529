import { formatDays, formatDeadline, formatInstant } from '#shared/deadline/formatting.ts'
import type { SellerView } from '#shared/sellers/contract.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Sheet } from '../../ui/sheet.tsx'
import { TallyMarks } from '../../ui/tally-marks.tsx'

/** What the seller has sold, in tally marks towards the next prize, and where the store stands. */
export function TallySheet({ view }: { view: SellerView }) {
  const { t, locale } = useWords()
  const { tally, drive } = view
  const store =
    drive.status === 'not_open'
      ? t('family.notOpen', { time: formatInstant(Date.parse(drive.opensAt), drive.timeZone, locale) })
      : drive.status === 'closed'
        ? t('family.closed', { time: formatDeadline(Date.parse(drive.closesAt), drive.timeZone, locale) })
        : t('family.open', { time: formatDeadline(Date.parse(drive.closesAt), drive.timeZone, locale) })
  return (
    <Sheet as="section" className="px-5 py-6 sm:px-7">
      <h2 className="text-[1.6rem]">{view.fullName}</h2>
      <p className="text-ink-soft">{t('family.number', { number: view.number, group: view.group })}</p>
      <p className="mt-4 text-[1.15em]" aria-live="polite">
        <b>{t('family.sold', { count: tally.items })}</b>{' '}
        {t('family.toNext', { count: tally.itemsToNextPrize })}
      </p>
      <div className="mt-3">
        <TallyMarks
          count={tally.items}
          goal={tally.items + tally.itemsToNextPrize}
          label={t('family.tallyLabel', { count: tally.items, next: tally.itemsToNextPrize })}
        />
      </div>
      <p className="mt-4">{t('family.prizes', { count: tally.prizesEarned })}</p>
      <p className="mt-1">
        {store}. {t('family.arrives', { days: formatDays(drive.deliveryFrom, drive.deliveryTo, locale) })}
      </p>
    </Sheet>
  )
}
