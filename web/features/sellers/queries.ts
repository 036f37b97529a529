import { queryOptions } from '@tanstack/react-query'
import type { SellerView } from '#shared/sellers/contract.ts'
import { get } from '../../lib/api.ts'
import { apiPaths } from '../../paths.ts'

/** A seller as the family sees them; looked at again every second and a half, so that an order shows as it comes in. */
export const sellerQuery = (sellerId: string) =>
  queryOptions({
    queryKey: ['seller', sellerId],
    queryFn: () => get<SellerView>(apiPaths.seller(sellerId)),
    refetchInterval: 1_500,
  })
