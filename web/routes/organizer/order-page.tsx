import { useQuery } from '@tanstack/react-query'
import { Link, useParams } from 'react-router-dom'
import { DriveNav } from '../../features/drives/drive-nav.tsx'
import { OrderSheets } from '../../features/orders/order-sheets.tsx'
import { orderQuery } from '../../features/orders/queries.ts'
import { DeskLayout } from '../../features/people/desk-layout.tsx'
import { ApiError } from '../../lib/api.ts'
import { useWords } from '../../lib/i18n.tsx'
import { paths } from '../../paths.ts'
import { Notice } from '../../ui/notice.tsx'

/** One order of a drive. */
export function OrderPage() {
  const { driveId = '', orderId = '' } = useParams()
  const { t } = useWords()
  const { data: view, error } = useQuery(orderQuery(driveId, orderId))
  return (
    <DeskLayout ply="canary" title={t('desk.organizer')}>
      {() => (
        <>
          <DriveNav driveId={driveId} />
          <p className="mb-4">
            <Link to={paths.organizerOrders(driveId)}>{t('order.back')}</Link>
          </p>
          {error && (
            <Notice look="problem">
              <p>{error instanceof ApiError && error.status > 0 ? error.message : t('unreachable')}</p>
            </Notice>
          )}
          {view && <OrderSheets driveId={driveId} view={view} />}
        </>
      )}
    </DeskLayout>
  )
}
