import { type ReactNode, useEffect } from 'react'
import { paths } from '../../paths.ts'
import { PageHeader } from '../../ui/page-header.tsx'
import { Sheet } from '../../ui/sheet.tsx'

/** A page in front of the desks: one sheet with a title. */
export function DoorPage({ title, children }: { title: string; children: ReactNode }) {
  useEffect(() => {
    document.title = `${title} · Tallykin`
  }, [title])
  return (
    <>
      <PageHeader home={paths.home} />
      <main className="mx-auto max-w-xl px-3.5 pb-20 pt-4">
        <Sheet ply="canary" className="px-5 py-7 sm:px-9">
          <h1 className="mb-5 text-[1.9rem]">{title}</h1>
          <div className="grid gap-5">{children}</div>
        </Sheet>
      </main>
    </>
  )
}
