import { useState } from 'react'
import { formatMoney } from '#shared/money.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { Dialog } from '../../ui/dialog.tsx'
import { OrderPad, type PadProps } from './order-pad.tsx'

/** Beside the catalog on a wide screen: the pad on its stack of plies. */
export function PadBeside(props: PadProps) {
  const { t } = useWords()
  return (
    <aside className="no-print sticky top-5 hidden pb-[15px] pr-[15px] lg:block" aria-label={t('pad.title')}>
      <span className="absolute inset-0 left-[15px] top-[15px] rounded-sm bg-goldenrod" />
      <span className="absolute bottom-[5px] left-[10px] right-[5px] top-[10px] rounded-sm bg-pink" />
      <span className="absolute bottom-[10px] left-[5px] right-[10px] top-[5px] rounded-sm bg-canary" />
      <div className="relative max-h-[calc(100dvh-3.5rem)] overflow-y-auto rounded-sm bg-sheet shadow-sheet">
        <div className="flex items-baseline justify-between gap-4 px-5 pb-2.5 pt-4 double-rule">
          <h2 className="text-[1.4rem]">{t('pad.title')}</h2>
          <span className="tabular">{t('pad.items', { count: props.priced.itemCount })}</span>
        </div>
        <OrderPad {...props} />
      </div>
    </aside>
  )
}

/** On a phone: a bar at the foot that opens the pad as a sheet. */
export function PadBar(props: PadProps) {
  const { t, locale } = useWords()
  const [open, setOpen] = useState(false)
  const total = formatMoney(props.priced.order?.totalCents ?? 0, {
    locale,
    currency: props.view.drive.currency,
  })
  return (
    <div className="no-print fixed inset-x-0 bottom-0 z-10 flex items-center gap-4 border-t-2 border-dashed border-field bg-sheet px-4 py-2.5 lg:hidden">
      <p className="leading-tight">
        <b>{t('pad.items', { count: props.priced.itemCount })}</b>
        <br />
        <span className="tabular">{total}</span>
      </p>
      <Button look="primary" className="ml-auto" onClick={() => setOpen(true)}>
        {t('pad.see')}
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title={t('pad.title')}
        closeLabel={t('pad.back')}
        from="foot"
      >
        <OrderPad {...props} />
      </Dialog>
    </div>
  )
}
