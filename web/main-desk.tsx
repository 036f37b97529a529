import './styles/app.css'
import { QueryClient, QueryClientProvider } from '@tanstack/react-query'
import { StrictMode } from 'react'
import { createRoot } from 'react-dom/client'
import { createBrowserRouter, RouterProvider } from 'react-router-dom'
import { deskRoutes } from './app/desk-routes.tsx'
import { ApiError } from './lib/api.ts'
import { WordsProvider } from './lib/i18n.tsx'

// The dialog's scroll lock adds a style element and asks here for the page's nonce.
Object.assign(globalThis, { __webpack_nonce__: document.querySelector<HTMLElement>('script[nonce]')?.nonce })

const client = new QueryClient({
  defaultOptions: {
    queries: {
      staleTime: 5_000,
      // A refusal stays a refusal; only a silent network is asked again.
      retry: (count, error) => error instanceof ApiError && error.status === 0 && count < 2,
    },
  },
})

createRoot(document.getElementById('root')!).render(
  <StrictMode>
    <QueryClientProvider client={client}>
      <WordsProvider locale="en">
        <RouterProvider router={createBrowserRouter(deskRoutes)} />
      </WordsProvider>
    </QueryClientProvider>
  </StrictMode>,
)
