import { queryOptions } from '@tanstack/react-query'
import type { ReceiptView } from '#shared/orders/contract.ts'
import { get, post } from '../../lib/api.ts'
import { apiPaths } from '../../paths.ts'

/** An order by its receipt address; while its payment is awaited it is asked for again and again. */
export const receiptQuery = (id: string) =>
  queryOptions({
    queryKey: ['receipt', id],
    queryFn: () => get<ReceiptView>(apiPaths.receipt(id)),
    staleTime: 5_000,
    refetchInterval: query => (query.state.data?.status === 'awaiting_payment' ? 3_000 : false),
  })

/** Has the server ask the payment service now. */
export const checkReceipt = (id: string) => post<ReceiptView>(apiPaths.checkReceipt(id), {})
