import { useQuery } from '@tanstack/react-query'
import { useCallback } from 'react'
import { useParams } from 'react-router-dom'
import { DriveNav } from '../../features/drives/drive-nav.tsx'
import { OrdersFilters } from '../../features/orders/orders-filters.tsx'
import { OrdersTable } from '../../features/orders/orders-table.tsx'
import { ordersListQuery } from '../../features/orders/queries.ts'
import { useOrdersSearch } from '../../features/orders/use-orders-search.ts'
import { DeskLayout } from '../../features/people/desk-layout.tsx'
import { ApiError } from '../../lib/api.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { Notice } from '../../ui/notice.tsx'
import { Sheet } from '../../ui/sheet.tsx'

/** All orders of a drive. */
export function OrdersPage() {
  const { driveId = '' } = useParams()
  const { t } = useWords()
  const { query, change } = useOrdersSearch()
  const { data: view, error } = useQuery(ordersListQuery(driveId, query))
  // Kept the same between renderings, so that a pause in typing is not taken for a change of the filters.
  const onFilter = useCallback((changes: Record<string, string>) => change(changes), [change])
  return (
    <DeskLayout ply="canary" title={t('desk.organizer')}>
      {() => (
        <>
          <DriveNav driveId={driveId} />
          {error && (
            <Notice look="problem">
              <p>{error instanceof ApiError && error.status > 0 ? error.message : t('unreachable')}</p>
            </Notice>
          )}
          {view && (
            <Sheet as="section" labelledBy="orders-title" className="px-4 py-5 sm:px-6">
              <h2 id="orders-title" className="mb-3 text-[1.5rem]">
                {t('orders.title')}
              </h2>
              <OrdersFilters query={query} groups={view.groups} onChange={onFilter} />
              <OrdersTable
                driveId={driveId}
                view={view}
                query={query}
                onSort={(sort, direction) => change({ sort, direction })}
              />
              {view.total === 0 && (
                <div className="grid justify-items-start gap-3 py-4">
                  <p>{t('orders.none')}</p>
                  <Button
                    onClick={() => change({ search: '', status: '', group: '', seller: '', flagged: '' })}
                  >
                    {t('orders.clear')}
                  </Button>
                </div>
              )}
              {view.pages > 1 && (
                <nav
                  className="flex items-center justify-between gap-4 pt-4"
                  aria-label={t('orders.page', view)}
                >
                  <Button disabled={view.page <= 1} onClick={() => change({ page: String(view.page - 1) })}>
                    {t('orders.before')}
                  </Button>
                  <span>{t('orders.page', { page: view.page, pages: view.pages })}</span>
                  <Button
                    disabled={view.page >= view.pages}
                    onClick={() => change({ page: String(view.page + 1) })}
                  >
                    {t('orders.after')}
                  </Button>
                </nav>
              )}
            </Sheet>
          )}
        </>
      )}
    </DeskLayout>
  )
}
