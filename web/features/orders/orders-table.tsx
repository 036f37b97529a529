import {
  createColumnHelper,
  type RowSelectionState,
  rowSelectionFeature,
  tableFeatures,
  useTable,
} from '@tanstack/react-table'
import { useMemo, useState } from 'react'
import { Link } from 'react-router-dom'
import { formatShortInstant } from '#shared/deadline/formatting.ts'
import type { OrderRowView, OrdersQuery, OrdersView } from '#shared/drives/orders-contract.ts'
import { formatAmount } from '#shared/money.ts'
import { useWords } from '../../lib/i18n.tsx'
import { apiPaths, paths } from '../../paths.ts'
import { buttonClass } from '../../ui/button.tsx'
import { toSearch } from './queries.ts'
import { StatusWord } from './status-word.tsx'

type OrdersTableProps = {
  driveId: string
  view: OrdersView
  query: OrdersQuery
  onSort: (sort: string, direction: 'up' | 'down') => void
}

const features = tableFeatures({ rowSelectionFeature })
const helper = createColumnHelper<typeof features, OrderRowView>()
const columns = helper.columns([
  helper.accessor('number', {}),
  helper.accessor('placedAt', {}),
  helper.accessor('customerName', {}),
  helper.accessor('seller', {}),
  helper.accessor('itemCount', {}),
  helper.accessor('totalCents', {}),
  helper.accessor('status', {}),
])

/** Columns by what the server sorts by; those without a name are not sorted. */
const heads = [
  { id: 'number', label: 'orders.col.number', sort: 'number', right: false },
  { id: 'placedAt', label: 'orders.col.placed', sort: 'placed', right: false },
  { id: 'customerName', label: 'orders.col.customer', sort: 'customer', right: false },
  { id: 'seller', label: 'orders.col.seller', sort: 'seller', right: false },
  { id: 'itemCount', label: 'orders.col.items', sort: null, right: true },
  { id: 'totalCents', label: 'orders.col.total', sort: 'total', right: true },
  { id: 'status', label: 'orders.col.status', sort: null, right: false },
] as const

/** The orders of a page: sorted by the server, ticked here. */
export function OrdersTable({ driveId, view, query, onSort }: OrdersTableProps) {
  const { t } = useWords()
  const [rowSelection, setRowSelection] = useState<RowSelectionState>({})
  const data = useMemo(() => view.rows, [view.rows])
  const table = useTable({
    features,
    columns,
    data,
    getRowId: row => row.id,
    state: { rowSelection },
    onRowSelectionChange: setRowSelection,
  })
  const ticked = Object.keys(rowSelection).filter(id => rowSelection[id])
  const sort = query.sort ?? 'placed'
  const direction = query.direction ?? 'down'
  return (
    <>
      <div className="flex flex-wrap items-center gap-x-5 gap-y-2 py-3">
        <p role="status">
          {t('orders.count', { count: view.total })} · {t('orders.selected', { count: ticked.length })}
        </p>
        <a
          className={`${buttonClass('plain')} ml-auto`}
          href={apiPaths.driveOrdersCsv(driveId) + toSearch(query)}
          download
        >
          {t('orders.export')}
        </a>
        {ticked.length > 0 && (
          <a
            className={buttonClass('plain')}
            href={apiPaths.driveOrdersCsv(driveId) + toSearch({ ids: ticked.slice(0, 200).join(',') })}
            download
          >
            {t('orders.exportSelected')}
          </a>
        )}
      </div>
      {/* biome-ignore lint/a11y/noNoninteractiveTabindex: a table wider than the screen is scrolled with the keyboard too */}
      <section className="overflow-x-auto" aria-label={t('orders.title')} tabIndex={0}>
        <table className="w-full min-w-[52rem]">
          <thead>
            <tr className="border-b-[1.5px] border-ink text-left">
              <th className="w-11 py-1">
                <input
                  type="checkbox"
                  className="size-6 accent-action"
                  aria-label={t('orders.tickAll')}
                  checked={data.length > 0 && data.every(row => rowSelection[row.id])}
                  onChange={event => table.toggleAllRowsSelected(event.target.checked)}
                />
              </th>
              {heads.map(head => (
                <th
                  key={head.id}
                  className={`py-1 pr-3 text-[0.92em] text-ink-soft ${head.right ? 'text-right' : ''}`}
                  aria-sort={
                    head.sort === sort ? (direction === 'up' ? 'ascending' : 'descending') : undefined
                  }
                >
                  {head.sort ? (
                    <button
                      type="button"
                      className="min-h-11 font-semibold"
                      onClick={() =>
                        onSort(head.sort, head.sort === sort && direction === 'down' ? 'up' : 'down')
                      }
                    >
                      {t(head.label)}
                      <span aria-hidden="true">
                        {' '}
                        {head.sort === sort ? (direction === 'up' ? '▲' : '▼') : ''}
                      </span>
                    </button>
                  ) : (
                    t(head.label)
                  )}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {table.getRowModel().rows.map(row => (
              <OrderTableRow
                key={row.id}
                driveId={driveId}
                order={row.original}
                timeZone={view.timeZone}
                isTicked={rowSelection[row.id] ?? false}
                onTick={ticked => row.toggleSelected(ticked)}
              />
            ))}
          </tbody>
        </table>
      </section>
    </>
  )
}

type OrderTableRowProps = {
  driveId: string
  order: OrderRowView
  timeZone: string
  isTicked: boolean
  onTick: (ticked: boolean) => void
}

function OrderTableRow({ driveId, order, timeZone, isTicked, onTick }: OrderTableRowProps) {
  const { t, locale } = useWords()
  return (
    <tr className={`border-b border-rule ${isTicked ? 'bg-canary text-on-ply' : ''}`}>
      <td className="py-1">
        <input
          type="checkbox"
          className="size-6 accent-action align-middle"
          aria-label={t('orders.tick', { number: order.number })}
          checked={isTicked}
          onChange={event => onTick(event.target.checked)}
        />
      </td>
      <td className="tabular whitespace-nowrap py-2.5 pr-3">
        <Link to={paths.organizerOrder(driveId, order.id)}>{order.number}</Link>
      </td>
      <td className="whitespace-nowrap py-2.5 pr-3">
        {formatShortInstant(Date.parse(order.placedAt), timeZone, locale)}
      </td>
      <td className="py-2.5 pr-3">
        <bdi>{order.customerName}</bdi>
      </td>
      <td className="py-2.5 pr-3">
        <bdi>{order.seller}</bdi>
      </td>
      <td className="tabular py-2.5 pr-3 text-right">{order.itemCount}</td>
      <td className="tabular py-2.5 pr-3 text-right">{formatAmount(order.totalCents, locale)}</td>
      <td className="whitespace-nowrap py-2.5 pr-3">
        <StatusWord status={order.status} />
        {order.flagged && <b className="ml-2 text-stamp">{t('orders.flag')}</b>}
      </td>
    </tr>
  )
}
