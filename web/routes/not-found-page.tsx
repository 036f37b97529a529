import { useWords } from '../lib/i18n.tsx'
import { Button } from '../ui/button.tsx'
import { PageHeader } from '../ui/page-header.tsx'
import { Sheet } from '../ui/sheet.tsx'

/** Nothing at this address; the same for a link that never was and one that was replaced. */
export function NotFoundPage() {
  const { t } = useWords()
  return (
    <>
      <PageHeader home="/" />
      <main className="mx-auto max-w-2xl px-4 pb-20 pt-6">
        <Sheet ply="goldenrod" className="px-5 py-8 sm:px-9">
          <h1 className="text-3xl">{t('page.notFound.title')}</h1>
          <p className="mt-4">{t('page.notFound.body')}</p>
        </Sheet>
      </main>
    </>
  )
}

/** Something broke while drawing the page. */
export function BrokenPage() {
  const { t } = useWords()
  return (
    <>
      <PageHeader home="/" />
      <main className="mx-auto max-w-2xl px-4 pb-20 pt-6">
        <Sheet className="px-5 py-8 sm:px-9">
          <h1 className="text-3xl">{t('page.error.title')}</h1>
          <p className="mt-4">{t('page.error.body')}</p>
          <p className="mt-4">
            <Button onClick={() => window.location.reload()}>{t('page.reload')}</Button>
          </p>
        </Sheet>
      </main>
    </>
  )
}
