import { queryOptions } from '@tanstack/react-query'
import type { OperatorView, SearchView } from '#shared/operator/contract.ts'
import { get, post } from '../../lib/api.ts'
import { apiPaths } from '../../paths.ts'

export const operatorQuery = queryOptions({
  queryKey: ['operator'],
  queryFn: () => get<OperatorView>(apiPaths.operator),
  refetchInterval: 3_000,
})

export const searchQuery = (text: string) =>
  queryOptions({
    queryKey: ['operator', 'search', text],
    queryFn: () => get<SearchView>(apiPaths.operatorSearch(text)),
    enabled: text.trim().length >= 2,
  })

export const settle = (paymentId: string, resolution: string) =>
  post<unknown>(apiPaths.settlePutAside(paymentId), { resolution })
export const retryLetter = (letterId: number) => post<unknown>(apiPaths.retryLetter(letterId), {})
