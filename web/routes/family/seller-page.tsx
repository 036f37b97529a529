import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { DeskLayout } from '../../features/people/desk-layout.tsx'
import { LinkSheet } from '../../features/sellers/link-sheet.tsx'
import { NameSheet } from '../../features/sellers/name-sheet.tsx'
import { OrdersSheet } from '../../features/sellers/orders-sheet.tsx'
import { sellerQuery } from '../../features/sellers/queries.ts'
import { TallySheet } from '../../features/sellers/tally-sheet.tsx'
import { ApiError } from '../../lib/api.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Notice } from '../../ui/notice.tsx'

/** One seller on the family desk. */
export function SellerPage() {
  const { sellerId = '' } = useParams()
  const { t } = useWords()
  const { data: view, error } = useQuery(sellerQuery(sellerId))
  return (
    <DeskLayout ply="pink" title={t('desk.family')} aside={view?.organization}>
      {() => (
        <div className="text-[1.125rem]">
          {error && !view && (
            <Notice look="problem">
              <p>{error instanceof ApiError && error.status > 0 ? error.message : t('unreachable')}</p>
            </Notice>
          )}
          {view && (
            <div className="grid items-start gap-6 lg:grid-cols-[minmax(0,1fr)_minmax(0,1fr)]">
              <div className="grid gap-6">
                <TallySheet view={view} />
                <NameSheet view={view} />
                <LinkSheet view={view} />
              </div>
              <OrdersSheet view={view} />
            </div>
          )}
        </div>
      )}
    </DeskLayout>
  )
}
