import { queryOptions } from '@tanstack/react-query'
import type { StoreView } from '#shared/stores/contract.ts'
import { get } from '../../lib/api.ts'
import { apiPaths } from '../../paths.ts'

/** What a store link shows; looked at again every minute, so that a close or a correction is seen. */
export const storeQuery = (token: string) =>
  queryOptions({
    queryKey: ['store', token],
    queryFn: () => get<StoreView>(apiPaths.store(token)),
    staleTime: 20_000,
    refetchInterval: 60_000,
  })
