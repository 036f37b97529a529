import { Link } from 'react-router-dom'
import type { DriveView } from '#shared/drives/contract.ts'
import { useWords } from '../../lib/i18n.tsx'
import { paths } from '../../paths.ts'
import { Sheet } from '../../ui/sheet.tsx'

/** What waits for somebody, each with the way there. */
export function NeedsSheet({ view }: { view: DriveView }) {
  const { t } = useWords()
  const { needs } = view
  const rows = [
    {
      count: needs.flags,
      text: t('organizer.needs.flags', { count: needs.flags }),
      to: `${paths.organizerOrders(view.driveId)}?flagged=yes`,
    },
    {
      count: needs.failedLetters,
      text: t('organizer.needs.failedLetters', { count: needs.failedLetters }),
      to: null,
    },
    {
      count: needs.openRefunds,
      text: t('organizer.needs.openRefunds', { count: needs.openRefunds }),
      to: null,
    },
  ].filter(row => row.count > 0)
  return (
    <Sheet as="section" labelledBy="needs" className="px-5 py-6 sm:px-7">
      <h2 id="needs" className="text-[1.35rem]">
        {t('organizer.needs.title')}
      </h2>
      {rows.length === 0 && <p className="mt-1 text-ink-soft">{t('organizer.needs.none')}</p>}
      <ul>
        {rows.map(row => (
          <li key={row.text} className="border-b border-rule py-2">
            {row.text} {row.to && <Link to={row.to}>{t('organizer.needs.see')}</Link>}
          </li>
        ))}
      </ul>
    </Sheet>
  )
}
