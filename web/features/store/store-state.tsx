import { formatDays, formatDeadline, formatInstant } from '#shared/deadline/formatting.ts'
import { isLastHour } from '#shared/deadline/store-status.ts'
import type { StoreView } from '#shared/stores/contract.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Notice } from '../../ui/notice.tsx'
import { Stamp } from '../../ui/stamp.tsx'

/** Says what the store's state means for the customer, where it is anything but simply open. */
export function StoreState({ view, now, cameBack }: { view: StoreView; now: number; cameBack: boolean }) {
  const { t, locale } = useWords()
  const { drive } = view
  const closesAt = Date.parse(drive.closesAt)
  const deadline = formatDeadline(closesAt, drive.timeZone, locale)
  switch (drive.status) {
    case 'not_open':
      return (
        <Notice
          title={t('store.state.notOpen.title', {
            time: formatInstant(Date.parse(drive.opensAt), drive.timeZone, locale),
          })}
        >
          <p>{t('store.state.notOpen.body')}</p>
        </Notice>
      )
    case 'paused':
      return (
        <Notice look="problem">
          <div className="flex flex-wrap items-center gap-5">
            <Stamp word={t('store.stamp.paused')} ink="stamp" />
            <div className="min-w-60 flex-1">
              <p className="font-bold">{t('store.state.paused.title')}</p>
              <p>{t('store.state.paused.body')}</p>
            </div>
          </div>
        </Notice>
      )
    case 'closed':
      return (
        <Notice look="problem">
          <div className="flex flex-wrap items-center gap-5">
            <Stamp word={t('store.stamp.closed')} ink="stamp" />
            <div className="min-w-60 flex-1">
              <p className="font-bold">{t('store.state.closed.title')}</p>
              <p>
                {t('store.state.closed.body', {
                  time: deadline,
                  days: formatDays(drive.deliveryFrom, drive.deliveryTo, locale),
                })}
              </p>
            </div>
          </div>
        </Notice>
      )
    case 'open':
      return (
        <>
          {cameBack && (
            <Notice title={t('store.canceled.title')}>
              <p>{t('store.canceled.body')}</p>
            </Notice>
          )}
          {isLastHour(closesAt, now) && (
            <Notice look="problem" title={t('store.state.lastHour.title', { time: deadline })}>
              <p>{t('store.state.lastHour.body')}</p>
            </Notice>
          )}
        </>
      )
  }
}
