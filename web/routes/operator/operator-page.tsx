import { useQuery } from '@tanstack/react-query'
import { DrivesBoard } from '../../features/operator/drives-board.tsx'
import { operatorQuery } from '../../features/operator/queries.ts'
import { SearchSheet } from '../../features/operator/search-sheet.tsx'
import { FailedLettersSheet, PutAsideSheet } from '../../features/operator/trouble-sheets.tsx'
import { DeskLayout } from '../../features/people/desk-layout.tsx'
import { ApiError } from '../../lib/api.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Notice } from '../../ui/notice.tsx'

/** The operator's first room: drives by stage, what needs somebody, and a search over all of it. */
export function OperatorPage() {
  const { t } = useWords()
  const { data: view, error } = useQuery(operatorQuery)
  const seesTrouble = view && (view.roles.includes('admin') || view.roles.includes('rep'))
  return (
    <DeskLayout ply="white" title={t('desk.operator')}>
      {() => (
        <>
          {error && !view && (
            <Notice look="problem">
              <p>{error instanceof ApiError && error.status > 0 ? error.message : t('unreachable')}</p>
            </Notice>
          )}
          {view && (
            <div className="grid items-start gap-6 lg:grid-cols-[minmax(0,1.3fr)_minmax(0,1fr)]">
              <div className="grid gap-6">
                {seesTrouble && <SearchSheet />}
                <DrivesBoard view={view} />
              </div>
              {seesTrouble && (
                <div className="grid gap-6">
                  <PutAsideSheet view={view} />
                  <FailedLettersSheet view={view} />
                </div>
              )}
            </div>
          )}
        </>
      )}
    </DeskLayout>
  )
}
