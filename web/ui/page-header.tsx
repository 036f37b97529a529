import type { ReactNode } from 'react'
import { Mark } from './mark.tsx'

/** The house's name on top of a page, and what stands beside it. */
export function PageHeader({ children, home }: { children?: ReactNode; home?: string }) {
  const name = (
    <span className="flex items-center gap-2.5 font-display text-[1.35rem] font-bold">
      <Mark />
      Tallykin
    </span>
  )
  return (
    <header className="no-print mx-auto flex max-w-[85rem] items-center justify-between gap-4 px-4 py-3.5 sm:px-10">
      {home ? (
        <a href={home} className="no-underline">
          {name}
        </a>
      ) : (
        name
      )}
      {children}
    </header>
  )
}
