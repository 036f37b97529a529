import { queryOptions } from '@tanstack/react-query'
import type { SellerView } from '#shared/sellers/contract.ts'
import { get, post } from '../../lib/api.ts'
import { apiPaths } from '../../paths.ts'

/** A seller as the family sees them; looked at again every second and a half, so that an order shows as it comes in. */
export const sellerQuery = (sellerId: string) =>
  queryOptions({
    queryKey: ['seller', sellerId],
    queryFn: () => get<SellerView>(apiPaths.seller(sellerId)),
    refetchInterval: 1_500,
  })

export const changeLink = (sellerId: string, verb: 'pause' | 'resume' | 'replace') =>
  post<unknown>(apiPaths.changeLink(sellerId, verb), {})
export const setNameShown = (sellerId: string, show: boolean) =>
  post<unknown>(apiPaths.consent(sellerId), { show })
export const flagOrder = (sellerId: string, orderId: string, note: string) =>
  post<unknown>(apiPaths.flagOrder(sellerId, orderId), { note })
