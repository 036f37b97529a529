import { useQuery, useQueryClient } from '@tanstack/react-query'
import { useEffect } from 'react'
import { useParams } from 'react-router-dom'
import { clearPaidPad } from '../../features/order-pad/pad.ts'
import { checkReceipt, receiptQuery } from '../../features/receipt/queries.ts'
import { ReceiptSheet } from '../../features/receipt/receipt-sheet.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import { NotFoundPage } from '../not-found-page.tsx'

/** The customer's receipt, and where they come back to from the payment page. */
export function ReceiptPage() {
  const { receipt = '' } = useParams()
  const client = useQueryClient()
  const { data: view } = useQuery(receiptQuery(receipt))
  const status = view?.status

  useEffect(() => {
    if (status !== 'awaiting_payment') return
    checkReceipt(receipt)
      .then(fresh => client.setQueryData(receiptQuery(receipt).queryKey, fresh))
      .catch(() => {
        // The regular look at the receipt goes on; it will show the payment as soon as it is known.
      })
  }, [receipt, status, client])

  useEffect(() => {
    if (status !== 'paid') return
    try {
      clearPaidPad(window.localStorage, receipt)
    } catch {
      // Without storage there is no pad to clear.
    }
  }, [receipt, status])

  if (!view) return <NotFoundPage />
  return (
    <>
      <PageHeader />
      <main className="mx-auto max-w-3xl px-3.5 pb-20 sm:px-6">
        <ReceiptSheet view={view} />
      </main>
    </>
  )
}
