import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import type { SellerView } from '#shared/sellers/contract.ts'
import { ApiError } from '../../lib/api.ts'
import { useWords } from '../../lib/i18n.tsx'
import { useHydrated } from '../../lib/use-hydrated.ts'
import { apiPaths } from '../../paths.ts'
import { Button, buttonClass } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { Notice } from '../../ui/notice.tsx'
import { Sheet } from '../../ui/sheet.tsx'
import { changeLink, sellerQuery } from './queries.ts'

/** The store link and everything that can be done with it, with the rule that goes wherever it is handed out. */
export function LinkSheet({ view }: { view: SellerView }) {
  const { t } = useWords()
  const client = useQueryClient()
  const change = useMutation({
    mutationFn: (verb: 'pause' | 'resume' | 'replace') => changeLink(view.sellerId, verb),
    onSuccess: () => client.invalidateQueries({ queryKey: sellerQuery(view.sellerId).queryKey }),
  })
  if (!view.link) return null
  const { url, state } = view.link
  const isLive = state === 'live'
  return (
    <Sheet as="section" labelledBy="link" className="px-5 py-6 sm:px-7">
      <div className="flex flex-wrap items-baseline justify-between gap-3">
        <h2 id="link" className="text-[1.35rem]">
          {t('family.link.title')}
        </h2>
        <span className={`font-semibold ${isLive ? 'text-paid' : 'text-stamp'}`}>
          {isLive ? t('family.link.live') : t('family.link.paused')}
        </span>
      </div>
      <p className="mt-1 font-semibold">{t('family.link.rule')}</p>
      {!isLive && <p className="mt-1">{t('family.link.pausedNote')}</p>}
      <div className="mt-3 grid items-center gap-4 sm:grid-cols-[1fr_auto]">
        <p className="tabular break-all rounded-sm border border-field px-3 py-2.5">
          <a href={url}>{url}</a>
        </p>
        <img
          // Another link is another picture, whatever the browser has kept.
          src={`${apiPaths.linkQr(view.sellerId)}?${url.slice(-6)}`}
          alt={t('family.link.qr')}
          width="120"
          height="120"
          className="size-[120px] bg-white"
        />
      </div>
      <ShareButtons view={view} url={url} />
      <div className="mt-4 flex flex-wrap gap-3 border-t border-rule pt-4">
        <Button onClick={() => change.mutate(isLive ? 'pause' : 'resume')} aria-busy={change.isPending}>
          {isLive ? t('family.link.pause') : t('family.link.resume')}
        </Button>
        <ReplaceDialog view={view} onReplace={() => change.mutateAsync('replace')} />
      </div>
      {change.error && (
        <div className="mt-3">
          <Notice look="problem">
            <p>
              {change.error instanceof ApiError && change.error.status > 0
                ? change.error.message
                : t('unreachable')}
            </p>
          </Notice>
        </div>
      )}
    </Sheet>
  )
}

function ShareButtons({ view, url }: { view: SellerView; url: string }) {
  const { t } = useWords()
  const [copied, setCopied] = useState(false)
  const hydrated = useHydrated()
  const mayShare = hydrated && typeof navigator.share === 'function'
  return (
    <div className="mt-3 flex flex-wrap items-center gap-3">
      <Button
        onClick={async () => {
          await navigator.clipboard.writeText(url)
          setCopied(true)
        }}
      >
        {t('family.link.copy')}
      </Button>
      {mayShare && (
        <Button
          onClick={() =>
            navigator
              .share({
                text: t('family.link.shareText', { name: view.displayName, organization: view.organization }),
                url,
              })
              .catch(() => {
                // Closing the share sheet is no failure.
              })
          }
        >
          {t('family.link.share')}
        </Button>
      )}
      <a className={buttonClass('quiet')} href={apiPaths.linkQr(view.sellerId)} download="store-link.svg">
        {t('family.link.download')}
      </a>
      <span role="status" className="font-semibold text-paid">
        {copied && t('family.link.copied')}
      </span>
    </div>
  )
}

function ReplaceDialog({ view, onReplace }: { view: SellerView; onReplace: () => Promise<unknown> }) {
  const { t } = useWords()
  const [open, setOpen] = useState(false)
  return (
    <>
      <Button look="danger" onClick={() => setOpen(true)}>
        {t('family.link.replace')}
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title={t('family.link.replaceTitle')}
        closeLabel={t('family.link.keep')}
      >
        <div className="grid gap-4 px-5 py-5">
          <p>{t('family.link.replaceBody', { orders: view.orders.length })}</p>
          <p className="font-semibold">{t('family.link.rule')}</p>
          <Button look="danger" onClick={() => onReplace().then(() => setOpen(false))}>
            {t('family.link.replace')}
          </Button>
        </div>
      </Dialog>
    </>
  )
}
