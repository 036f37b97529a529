import { useQueryClient } from '@tanstack/react-query'
import { useEffect, useRef, useState } from 'react'
import type { PlacedOrder, PlaceOrderRequest } from '#shared/orders/contract.ts'
import type { StoreView } from '#shared/stores/contract.ts'
import { ApiError, post } from '../../lib/api.ts'
import { apiPaths } from '../../paths.ts'
import { storeQuery } from '../store/queries.ts'
import type { Pad, PadStore } from './pad.ts'
import type { PricedPad } from './price-pad.ts'

/** After this long the payment page of a try is as good as gone; the next try opens another. */
const PAGE_LASTS_MS = 25 * 60_000

type Ordering = { token: string; view: StoreView; pad: Pad; priced: PricedPad; change: PadStore['change'] }

/**
 * Sends the pad and goes on to the payment page. The key stays with the content: the same pad sent again, after
 * a failure or from another tab, is the same order.
 */
export function useOrder({ token, pad, priced, change }: Ordering) {
  const client = useQueryClient()
  const [sending, setSending] = useState(false)
  const [error, setError] = useState<ApiError | null>(null)
  const busy = useRef(false)

  // A page restored from the browser's back-forward memory comes back with its button still busy.
  useEffect(() => {
    const restored = (event: PageTransitionEvent) => {
      if (!event.persisted) return
      busy.current = false
      setSending(false)
    }
    window.addEventListener('pageshow', restored)
    return () => window.removeEventListener('pageshow', restored)
  }, [])

  async function send() {
    if (busy.current || !priced.order || pad.relationship === '') return
    busy.current = true
    setSending(true)
    setError(null)
    const order: PlaceOrderRequest = {
      lines: priced.lines
        .filter(line => line.item?.available)
        .map(line => ({ itemCode: line.code, quantity: line.quantity })),
      giftCents: priced.giftCents,
      coverFee: pad.coverFee,
      quotedTotalCents: priced.order.totalCents,
      customer: { name: pad.name, email: pad.email.trim(), relationship: pad.relationship },
      locale: 'en',
    }
    const content = JSON.stringify(order)
    const last = pad.attempt
    const isSame = last?.content === content && Date.now() - last.at < PAGE_LASTS_MS
    const key = isSame ? last.key : crypto.randomUUID()
    const replaces = isSame ? undefined : (last?.receiptId ?? undefined)
    const at = isSame ? last.at : Date.now()
    change(now => ({ ...now, attempt: { key, content, receiptId: isSame ? last.receiptId : null, at } }))
    try {
      const placed = await post<PlacedOrder>(
        apiPaths.orders(token),
        { ...order, ...(replaces && { replaces }) },
        { 'Idempotency-Key': key },
      )
      const receiptId = placed.receiptUrl.split('/').at(-1) ?? null
      change(now => ({ ...now, attempt: { key, content, receiptId, at } }))
      window.location.assign(placed.payUrl)
    } catch (thrown) {
      busy.current = false
      setSending(false)
      const refusal = thrown instanceof ApiError ? thrown : new ApiError(0, {})
      // A key that was used for something else, or an order that has ended, needs a new one next time.
      if (refusal.code === 'key_reused') change(now => ({ ...now, attempt: null }))
      setError(refusal)
      if (refusal.status === 409) await client.invalidateQueries({ queryKey: storeQuery(token).queryKey })
    }
  }

  return { send, sending, error, clearError: () => setError(null) }
}
