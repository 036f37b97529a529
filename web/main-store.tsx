import './styles/app.css'
import { type DehydratedState, hydrate, QueryClient, QueryClientProvider } from '@tanstack/react-query'
import { StrictMode } from 'react'
import { hydrateRoot } from 'react-dom/client'
import { createBrowserRouter, RouterProvider } from 'react-router-dom'
import type { Locale } from '#shared/wire.ts'
import { routeIdOf, storeRoutes } from './app/store-routes.tsx'
import { WordsProvider } from './lib/i18n.tsx'

// The dialog's scroll lock adds a style element and asks here for the page's nonce.
Object.assign(globalThis, { __webpack_nonce__: document.querySelector<HTMLElement>('script[nonce]')?.nonce })

const state = JSON.parse(document.getElementById('state')?.textContent ?? '{}') as {
  queries: DehydratedState
  notFound: boolean
  locale: Locale
}
const client = new QueryClient({ defaultOptions: { queries: { retry: 1 } } })
hydrate(client, state.queries)
const router = createBrowserRouter(storeRoutes(client, { notFound: state.notFound }), {
  hydrationData: { loaderData: { [state.notFound ? 'nothing' : routeIdOf(window.location.pathname)]: null } },
})

hydrateRoot(
  document.getElementById('root')!,
  <StrictMode>
    <QueryClientProvider client={client}>
      <WordsProvider locale={state.locale}>
        <RouterProvider router={router} />
      </WordsProvider>
    </QueryClientProvider>
  </StrictMode>,
)
