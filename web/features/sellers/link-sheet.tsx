import { useState } from 'react'
import type { SellerView } from '#shared/sellers/contract.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { Sheet } from '../../ui/sheet.tsx'

/** The store link, with the rule that goes with it wherever it is handed out. */
export function LinkSheet({ view }: { view: SellerView }) {
  const { t } = useWords()
  const [copied, setCopied] = useState(false)
  if (!view.link) return null
  const { url, state } = view.link
  return (
    <Sheet as="section" className="px-5 py-6 sm:px-7">
      <h2 className="text-[1.35rem]">{t('family.link.title')}</h2>
      <p className="mt-1 font-semibold">{t('family.link.rule')}</p>
      <p className="tabular mt-3 break-all rounded-sm border border-field px-3 py-2.5">
        <a href={url}>{url}</a>
      </p>
      <div className="mt-3 flex flex-wrap items-center gap-4">
        <Button
          onClick={async () => {
            await navigator.clipboard.writeText(url)
            setCopied(true)
          }}
        >
          {t('family.link.copy')}
        </Button>
        <span role="status" className="font-semibold text-paid">
          {copied && t('family.link.copied')}
        </span>
        <span className={`ml-auto font-semibold ${state === 'live' ? 'text-paid' : 'text-stamp'}`}>
          {state === 'live' ? t('family.link.live') : t('family.link.paused')}
        </span>
      </div>
    </Sheet>
  )
}
