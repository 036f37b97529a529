import { dehydrate, QueryClient, QueryClientProvider } from '@tanstack/react-query'
import { StrictMode } from 'react'
import { renderToString } from 'react-dom/server'
import { createStaticHandler, createStaticRouter, StaticRouterProvider } from 'react-router-dom'
import type { ReceiptView } from '#shared/orders/contract.ts'
import type { StoreView } from '#shared/stores/contract.ts'
import type { Locale } from '#shared/wire.ts'
import { type Head, headOf } from './app/head.ts'
import { storeRoutes } from './app/store-routes.tsx'
import { receiptQuery } from './features/receipt/queries.ts'
import { storeQuery } from './features/store/queries.ts'
import { WordsProvider } from './lib/i18n.tsx'

export { document } from './app/document.ts'

export type PageData =
  | { store: { token: string; view: StoreView } }
  | { receipt: { id: string; view: ReceiptView } }
  | { notFound: true }

type RenderRequest = { url: string; locale: Locale; data: PageData }

/** Draws a customer's page with its data, for the first response. */
export async function render({ url, locale, data }: RenderRequest): Promise<{
  status: number
  html: string
  head: Head
  dehydrated: unknown
}> {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } })
  if ('store' in data) client.setQueryData(storeQuery(data.store.token).queryKey, data.store.view)
  if ('receipt' in data) client.setQueryData(receiptQuery(data.receipt.id).queryKey, data.receipt.view)
  const notFound = 'notFound' in data
  const handler = createStaticHandler(storeRoutes(client, { notFound }))
  const context = await handler.query(new Request(new URL(url, 'http://localhost')))
  if (context instanceof Response) throw new Error(`${url} answered a redirect`)
  const router = createStaticRouter(handler.dataRoutes, context)
  const html = renderToString(
    <StrictMode>
      <QueryClientProvider client={client}>
        <WordsProvider locale={locale}>
          <StaticRouterProvider router={router} context={context} hydrate={false} />
        </WordsProvider>
      </QueryClientProvider>
    </StrictMode>,
  )
  return {
    status: notFound ? 404 : context.statusCode,
    html,
    head: headOf(data, locale),
    dehydrated: { queries: dehydrate(client), notFound, locale },
  }
}
