import type { QueryClient } from '@tanstack/react-query'
import type { RouteObject } from 'react-router-dom'
import { receiptQuery } from '../features/receipt/queries.ts'
import { storeQuery } from '../features/store/queries.ts'
import { BrokenPage, NotFoundPage } from '../routes/not-found-page.tsx'
import { ReceiptPage } from '../routes/store/receipt-page.tsx'
import { StorePage } from '../routes/store/store-page.tsx'

/** The customer's pages. Their data are in the query cache before anything is drawn, on both sides. */
export function storeRoutes(client: QueryClient, options: { notFound: boolean }): RouteObject[] {
  if (options.notFound)
    return [{ id: 'nothing', path: '*', Component: NotFoundPage, ErrorBoundary: BrokenPage }]
  return [
    {
      id: 'store',
      path: '/s/:token',
      loader: async ({ params }) => {
        await client.ensureQueryData(storeQuery(params.token!))
        return null
      },
      Component: StorePage,
      ErrorBoundary: BrokenPage,
    },
    {
      id: 'receipt',
      path: '/r/:receipt',
      loader: async ({ params }) => {
        await client.ensureQueryData(receiptQuery(params.receipt!))
        return null
      },
      Component: ReceiptPage,
      ErrorBoundary: BrokenPage,
    },
    { id: 'nothing', path: '*', Component: NotFoundPage },
  ]
}

/** The id of the route whose loader ran on the server, so that the browser does not run it again. */
export function routeIdOf(pathname: string): string {
  return pathname.startsWith('/s/') ? 'store' : pathname.startsWith('/r/') ? 'receipt' : 'nothing'
}
