import { useSearchParams } from 'react-router-dom'
import type { OrdersQuery } from '#shared/drives/orders-contract.ts'

const names = ['search', 'status', 'group', 'seller', 'flagged', 'sort', 'direction', 'page'] as const

/** The selection, kept in the address: it survives a reload, goes back with the back button and can be mailed. */
export function useOrdersSearch(): {
  query: OrdersQuery
  change: (changes: Partial<Record<(typeof names)[number], string>>) => void
} {
  const [search, setSearch] = useSearchParams()
  const query = Object.fromEntries(
    names.flatMap(name => {
      const value = search.get(name)
      return value ? [[name, value]] : []
    }),
  ) as OrdersQuery
  return {
    query,
    change(changes) {
      setSearch(
        now => {
          const next = new URLSearchParams(now)
          // Another selection starts on its first page.
          if (!('page' in changes)) next.delete('page')
          for (const [name, value] of Object.entries(changes))
            value ? next.set(name, value) : next.delete(name)
          return next
        },
        { replace: 'search' in changes },
      )
    },
  }
}
