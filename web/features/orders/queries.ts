import { keepPreviousData, queryOptions } from '@tanstack/react-query'
import type { OrderPageView, OrdersQuery, OrdersView } from '#shared/drives/orders-contract.ts'
import { get, post } from '../../lib/api.ts'
import { apiPaths } from '../../paths.ts'

/** The selection as it stands in the address. */
export function toSearch(query: OrdersQuery): string {
  const search = new URLSearchParams(
    Object.entries(query).filter(
      (entry): entry is [string, string] => typeof entry[1] === 'string' && entry[1] !== '',
    ),
  ).toString()
  return search === '' ? '' : `?${search}`
}

export const ordersListQuery = (driveId: string, query: OrdersQuery) =>
  queryOptions({
    queryKey: ['orders', driveId, query],
    queryFn: () => get<OrdersView>(apiPaths.driveOrders(driveId) + toSearch(query)),
    placeholderData: keepPreviousData,
    refetchInterval: 1_500,
  })

export const orderQuery = (driveId: string, orderId: string) =>
  queryOptions({
    queryKey: ['order', driveId, orderId],
    queryFn: () => get<OrderPageView>(apiPaths.driveOrder(driveId, orderId)),
    refetchInterval: 3_000,
  })

export type RefundRequest = { what: 'everything' | { lineId: number; quantity: number }[]; reason: string }

export const refund = (driveId: string, orderId: string, body: RefundRequest) =>
  post<{ amountCents: number; state: string }>(apiPaths.refundOrder(driveId, orderId), body)

export const move = (driveId: string, orderId: string, body: { sellerNumber: number; reason: string }) =>
  post<unknown>(apiPaths.moveOrder(driveId, orderId), body)
