import { DeskLayout } from '../../features/people/desk-layout.tsx'
import { useWords } from '../../lib/i18n.tsx'

/** The operator's first room. */
export function OperatorPage() {
  const { t } = useWords()
  return (
    <DeskLayout ply="white" title={t('desk.operator')}>
      {() => <p>{t('operator.empty')}</p>}
    </DeskLayout>
  )
}
