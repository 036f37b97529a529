import type { OrdersQuery } from '#shared/drives/orders-contract.ts'
import type { Deps } from '../deps.ts'
import { csvLine } from './csv.ts'
import { eachOrder } from './orders-table.ts'

/** The orders as a spreadsheet reads them: the same selection as on the screen. */
export function ordersCsv(deps: Deps, driveId: number, query: OrdersQuery): string {
  const lines = [
    csvLine([
      'Order',
      'Placed (UTC)',
      'Status',
      'Customer',
      'Knows the seller as',
      'Seller',
      'Group',
      'Items',
      'Total',
      'Refunded',
    ]),
  ]
  for (const row of eachOrder(deps, driveId, query))
    lines.push(
      csvLine([
        row.number,
        row.placedAt,
        row.status,
        row.customerName,
        row.relationship,
        row.seller,
        row.group ?? '',
        row.itemCount,
        { cents: row.totalCents },
        { cents: row.refundedCents },
      ]),
    )
  // A mark at the front tells spreadsheets that this is UTF-8.
  return `\ufeff${lines.join('')}`
}
