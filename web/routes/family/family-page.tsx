import { Link, Navigate } from 'react-router-dom'
import { DeskLayout } from '../../features/people/desk-layout.tsx'
import { useWords } from '../../lib/i18n.tsx'
import { paths } from '../../paths.ts'
import { Sheet } from '../../ui/sheet.tsx'

/** The sellers of a family; with only one, that one at once. */
export function FamilyPage() {
  const { t } = useWords()
  return (
    <DeskLayout ply="pink" title={t('desk.family')}>
      {me => {
        const only = me.family.length === 1 ? me.family[0] : null
        if (only) return <Navigate to={paths.familySeller(only.sellerId)} replace />
        if (me.family.length === 0) return <p>{t('family.none')}</p>
        return (
          <ul className="grid gap-4 sm:grid-cols-2">
            {me.family.map(seller => (
              <li key={seller.sellerId}>
                <Sheet ply="pink" className="px-5 py-5">
                  <h2 className="text-[1.35rem]">
                    <Link to={paths.familySeller(seller.sellerId)}>{seller.name}</Link>
                  </h2>
                  <p className="text-ink-soft">{seller.organization}</p>
                </Sheet>
              </li>
            ))}
          </ul>
        )
      }}
    </DeskLayout>
  )
}
