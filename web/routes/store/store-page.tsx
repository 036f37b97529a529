import { useQuery } from '@tanstack/react-query'
import { useEffect } from 'react'
import { useParams, useSearchParams } from 'react-router-dom'
import { setQuantity } from '../../features/order-pad/pad.ts'
import { PadBar, PadBeside } from '../../features/order-pad/pad-place.tsx'
import { pricePad } from '../../features/order-pad/price-pad.ts'
import { usePad } from '../../features/order-pad/use-pad.ts'
import { CatalogList } from '../../features/store/catalog-list.tsx'
import { storeQuery } from '../../features/store/queries.ts'
import { StoreHead } from '../../features/store/store-head.tsx'
import { StoreState } from '../../features/store/store-state.tsx'
import { useServerNow } from '../../features/store/use-server-now.ts'
import { useWords } from '../../lib/i18n.tsx'
import { useWide } from '../../lib/use-wide.ts'
import { Notice } from '../../ui/notice.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { NotFoundPage } from '../not-found-page.tsx'

/** A seller's store: who it helps and when, the catalog, the order pad. */
export function StorePage() {
  const { token = '' } = useParams()
  const [search] = useSearchParams()
  const { t } = useWords()
  const { data: view, refetch } = useQuery(storeQuery(token))
  const now = useServerNow(view?.serverNow ?? '1970-01-01T00:00:00Z')
  const { pad, change } = usePad(token)
  const wide = useWide()

  // The page notices the close and the opening by itself, without waiting for its regular look.
  const boundary = view && view.drive.status === 'open' && now >= Date.parse(view.drive.closesAt)
  const opening = view && view.drive.status === 'not_open' && now >= Date.parse(view.drive.opensAt)
  useEffect(() => {
    if (boundary || opening) void refetch()
  }, [boundary, opening, refetch])

  if (!view) return <NotFoundPage />
  const priced = pricePad(pad, view)
  const isOpen = view.drive.status === 'open'
  const padProps = { token, view, pad, priced, change }
  return (
    <>
      <PageHeader />
      <main
        className={`mx-auto grid max-w-[85rem] gap-x-9 gap-y-5 px-3.5 sm:px-10 ${isOpen ? 'pb-32 lg:grid-cols-[minmax(0,1fr)_25.5rem] lg:pb-16' : 'pb-16'}`}
      >
        <div className="grid gap-4 lg:col-span-full">
          <StoreState view={view} now={now} cameBack={search.has('canceled') && pad.lines.length > 0} />
          <StoreHead view={view} />
          <noscript>
            <Notice>
              <p>
                {t('store.noScript', { contact: view.drive.contact.name, email: view.drive.contact.email })}
              </p>
            </Notice>
          </noscript>
        </div>
        <CatalogList
          view={view}
          quantityOf={code => pad.lines.find(line => line.code === code)?.quantity ?? 0}
          onQuantity={
            isOpen ? (item, quantity) => change(now => setQuantity(now, item.code, quantity)) : null
          }
        />
        {isOpen && <div>{wide !== false && <PadBeside {...padProps} />}</div>}
      </main>
      {isOpen && wide !== true && <PadBar {...padProps} />}
    </>
  )
}
