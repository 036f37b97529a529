import { useQuery } from '@tanstack/react-query'
import { useDeferredValue } from 'react'
import { Link, useSearchParams } from 'react-router-dom'
import { useWords } from '../../lib/i18n.tsx'
import { paths } from '../../paths.ts'
import { TextField } from '../../ui/fields.tsx'
import { Sheet } from '../../ui/sheet.tsx'
import { searchQuery } from './queries.ts'

/** Finds an order or a seller over all drives one sees; the text stands in the address. */
export function SearchSheet() {
  const { t } = useWords()
  const [search, setSearch] = useSearchParams()
  const text = search.get('q') ?? ''
  const { data } = useQuery(searchQuery(useDeferredValue(text)))
  const isEmpty = data && data.orders.length === 0 && data.sellers.length === 0
  return (
    <Sheet as="section" className="px-5 py-5 sm:px-7">
      <search>
        <TextField
          label={t('operator.search')}
          type="search"
          maxLength={100}
          value={text}
          onChange={event =>
            setSearch(event.target.value === '' ? {} : { q: event.target.value }, { replace: true })
          }
        />
      </search>
      <div aria-live="polite">
        {isEmpty && <p className="pt-3">{t('operator.search.none')}</p>}
        {data && data.orders.length > 0 && (
          <>
            <h2 className="pt-4 text-[1.1rem]">{t('operator.search.orders')}</h2>
            <ul>
              {data.orders.map(order => (
                <li key={order.orderId} className="border-b border-rule py-2">
                  <Link className="tabular" to={paths.organizerOrder(order.driveId, order.orderId)}>
                    {order.number}
                  </Link>{' '}
                  <bdi>{order.customer}</bdi>, {order.organization}
                </li>
              ))}
            </ul>
          </>
        )}
        {data && data.sellers.length > 0 && (
          <>
            <h2 className="pt-4 text-[1.1rem]">{t('operator.search.sellers')}</h2>
            <ul>
              {data.sellers.map(seller => (
                <li key={`${seller.driveId} ${seller.number}`} className="border-b border-rule py-2">
                  <Link to={`${paths.organizerOrders(seller.driveId)}?seller=${seller.number}`}>
                    <span className="tabular">{seller.number}</span> <bdi>{seller.name}</bdi>
                  </Link>
                  , {seller.organization}
                </li>
              ))}
            </ul>
          </>
        )}
      </div>
    </Sheet>
  )
}
