import { NavLink } from 'react-router-dom'
import { useWords } from '../../lib/i18n.tsx'
import { paths } from '../../paths.ts'

/** The sheets of a drive's desk. */
export function DriveNav({ driveId }: { driveId: string }) {
  const { t } = useWords()
  const tab = ({ isActive }: { isActive: boolean }) =>
    `inline-flex min-h-11 items-center rounded-t-sm px-4 font-semibold no-underline ${isActive ? 'bg-canary text-on-ply' : 'bg-sheet hover:underline'}`
  return (
    <nav aria-label={t('organizer.nav')} className="mb-5 flex flex-wrap gap-1 border-b-[3px] border-canary">
      <NavLink end className={tab} to={paths.organizer(driveId)}>
        {t('organizer.nav.overview')}
      </NavLink>
      <NavLink className={tab} to={paths.organizerOrders(driveId)}>
        {t('organizer.nav.orders')}
      </NavLink>
    </nav>
  )
}
