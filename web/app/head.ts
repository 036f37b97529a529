import { formatDeadline } from '#shared/deadline/formatting.ts'
import type { Locale } from '#shared/wire.ts'
import type { PageData } from '../entry-server.tsx'
import { wordsOf } from '../lib/i18n.tsx'

export type Head = { title: string; description: string; preview: boolean }

/** Title and description of a page; what a link preview shows never names more than the public name. */
export function headOf(data: PageData, locale: Locale): Head {
  const { t } = wordsOf(locale)
  if ('store' in data) {
    const { view } = data.store
    const organization = view.organization.name
    const title = view.seller
      ? t('store.title', { name: view.seller.displayName, organization })
      : t('store.titleGroup', { group: view.group?.name ?? organization, organization })
    const purpose = view.drive.purpose
    const isOver = view.drive.status === 'closed'
    const description = isOver
      ? t('store.descriptionClosed', { purpose })
      : t('store.description', {
          purpose,
          deadline: formatDeadline(Date.parse(view.drive.closesAt), view.drive.timeZone, locale),
        })
    return { title, description, preview: true }
  }
  if ('receipt' in data)
    return {
      title: t('receipt.title', { number: data.receipt.view.orderNumber }),
      description: t('receipt.description', { organization: data.receipt.view.organization.name }),
      preview: false,
    }
  return { title: t('page.notFound.title'), description: t('page.notFound.body'), preview: false }
}
