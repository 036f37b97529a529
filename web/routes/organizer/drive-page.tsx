import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { DriveNav } from '../../features/drives/drive-nav.tsx'
import { Overview } from '../../features/drives/overview.tsx'
import { driveQuery } from '../../features/drives/queries.ts'
import { DeskLayout } from '../../features/people/desk-layout.tsx'
import { TeamSheet } from '../../features/people/team-sheet.tsx'
import { ApiError } from '../../lib/api.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Notice } from '../../ui/notice.tsx'

/** One drive on the organizer desk. */
export function DrivePage() {
  const { driveId = '' } = useParams()
  const { t } = useWords()
  const { data: view, error } = useQuery(driveQuery(driveId))
  return (
    <DeskLayout ply="canary" title={t('desk.organizer')} aside={view?.organization}>
      {() => (
        <>
          <DriveNav driveId={driveId} />
          {error && !view && (
            <Notice look="problem">
              <p>{error instanceof ApiError && error.status > 0 ? error.message : t('unreachable')}</p>
            </Notice>
          )}
          {view && <Overview view={view} />}
          {view && (
            <div className="mt-6">
              <TeamSheet driveId={driveId} />
            </div>
          )}
        </>
      )}
    </DeskLayout>
  )
}
