import { Link } from 'react-router-dom'
import { formatDay, formatDeadline } from '#shared/deadline/formatting.ts'
import { formatMoney } from '#shared/money.ts'
import type { OperatorDrive, OperatorView } from '#shared/operator/contract.ts'
import { stages } from '#shared/operator/stages.ts'
import { useWords } from '../../lib/i18n.tsx'
import { paths } from '../../paths.ts'
import { Sheet } from '../../ui/sheet.tsx'

/** All drives one sees, in the order of their stages; one's own first. */
export function DrivesBoard({ view }: { view: OperatorView }) {
  const { t } = useWords()
  const mayOpen = view.roles.includes('admin') || view.roles.includes('rep')
  return (
    <Sheet as="section" labelledBy="drives" className="px-5 py-6 sm:px-7">
      <h2 id="drives" className="text-[1.35rem]">
        {t('operator.drives')}
      </h2>
      {view.drives.length === 0 && <p className="py-3">{t('operator.drives.none')}</p>}
      {stages.map(stage => {
        const drives = view.drives
          .filter(drive => drive.stage === stage)
          .sort((a, b) => Number(b.mine) - Number(a.mine))
        if (drives.length === 0) return null
        return (
          <section key={stage} className="mt-4">
            <h3 className="pb-1 text-[1.1rem] double-rule">{t(`operator.stage.${stage}`)}</h3>
            <ul>
              {drives.map(drive => (
                <DriveRow key={drive.driveId} drive={drive} mayOpen={mayOpen} />
              ))}
            </ul>
          </section>
        )
      })}
    </Sheet>
  )
}

function DriveRow({ drive, mayOpen }: { drive: OperatorDrive; mayOpen: boolean }) {
  const { t, locale } = useWords()
  const time = formatDeadline(Date.parse(drive.closesAt), drive.timeZone, locale)
  const isOver = !['set_up', 'not_open', 'selling'].includes(drive.stage)
  return (
    <li className="grid gap-x-4 border-b border-rule py-3 sm:grid-cols-[1fr_auto]">
      <span>
        <b>
          {mayOpen ? (
            <Link to={paths.organizer(drive.driveId)}>{drive.organization}</Link>
          ) : (
            drive.organization
          )}
        </b>
        {drive.mine && (
          <span className="ml-2 border border-ink px-1.5 text-[0.85em]">{t('operator.mine')}</span>
        )}
        <span className="block text-[0.95em] text-ink-soft">
          {isOver ? t('operator.closed', { time }) : t('operator.closes', { time })} ·{' '}
          {t('operator.delivers', { day: formatDay(drive.deliveryFrom, locale) })}
          {drive.rep && <> · {t('operator.rep', { name: drive.rep })}</>}
        </span>
      </span>
      <span className="sm:text-right">
        {t('operator.sold', {
          items: drive.items,
          amount: formatMoney(drive.itemsCents, { locale, currency: 'usd' }),
        })}
        {drive.flags > 0 && <b className="block text-stamp">{t('operator.flags', { count: drive.flags })}</b>}
      </span>
    </li>
  )
}
