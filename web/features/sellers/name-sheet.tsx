import { useMutation, useQueryClient } from '@tanstack/react-query'
import type { SellerView } from '#shared/sellers/contract.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { Notice } from '../../ui/notice.tsx'
import { Sheet } from '../../ui/sheet.tsx'
import { sellerQuery, setNameShown } from './queries.ts'

/** What the public reads of the seller, and the family's say in it. */
export function NameSheet({ view }: { view: SellerView }) {
  const { t } = useWords()
  const client = useQueryClient()
  const change = useMutation({
    mutationFn: (show: boolean) => setNameShown(view.sellerId, show),
    onSuccess: () => client.invalidateQueries({ queryKey: sellerQuery(view.sellerId).queryKey }),
  })
  return (
    <Sheet as="section" labelledBy="name" className="px-5 py-6 sm:px-7">
      <h2 id="name" className="text-[1.35rem]">
        {t('family.name.title')}
      </h2>
      <p className="mt-1" role="status">
        {view.nameShown
          ? t('family.name.shown', { name: view.displayName })
          : t('family.name.hidden', { group: view.group, name: view.displayName })}
      </p>
      <p className="mt-3">
        <Button onClick={() => change.mutate(!view.nameShown)} aria-busy={change.isPending}>
          {view.nameShown
            ? t('family.name.hide', { group: view.group })
            : t('family.name.show', { name: view.displayName })}
        </Button>
      </p>
      {change.error && (
        <Notice look="problem">
          <p>{t('unreachable')}</p>
        </Notice>
      )}
    </Sheet>
  )
}
