import { Dialog as Radix } from 'radix-ui'
import type { ReactNode } from 'react'

type DialogProps = {
  open: boolean
  onOpenChange: (open: boolean) => void
  title: string
  closeLabel: string
  /** From the foot of a phone's screen, or in the middle. */
  from?: 'foot' | 'middle'
  children: ReactNode
}

const places = {
  foot: 'sheet-up inset-x-0 bottom-0 max-h-[94dvh] rounded-t-sm',
  middle: 'left-1/2 top-1/2 w-[min(34rem,94vw)] max-h-[92dvh] -translate-x-1/2 -translate-y-1/2 rounded-sm',
}

/** A sheet laid over the page; focus stays inside, Escape closes it, focus returns to where it was. */
export function Dialog({ open, onOpenChange, title, closeLabel, from = 'middle', children }: DialogProps) {
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-20 bg-[#0b1230b0]" />
        <Radix.Content
          aria-describedby={undefined}
          className={`fixed z-30 overflow-y-auto overscroll-contain bg-sheet text-ink shadow-sheet ${places[from]}`}
        >
          <div className="sticky top-0 z-10 flex items-baseline justify-between gap-4 bg-sheet px-5 pb-2 pt-4 double-rule">
            <Radix.Title className="font-display text-[1.4rem] font-bold">{title}</Radix.Title>
            <Radix.Close className="min-h-11 px-2 font-semibold underline underline-offset-4">
              {closeLabel}
            </Radix.Close>
          </div>
          {children}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  )
}
