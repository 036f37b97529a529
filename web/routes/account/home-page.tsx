import { Link } from 'react-router-dom'
import { DoorPage } from '../../features/people/door-page.tsx'
import { useWords } from '../../lib/i18n.tsx'
import { paths } from '../../paths.ts'
import { buttonClass } from '../../ui/button.tsx'

export function HomePage() {
  const { t } = useWords()
  return (
    <DoorPage title={t('home.title')}>
      <p>{t('home.body')}</p>
      <p className="text-ink-soft">{t('home.customers')}</p>
      <p>
        <Link className={`${buttonClass('primary')} no-underline`} to={paths.signIn}>
          {t('home.signIn')}
        </Link>
      </p>
    </DoorPage>
  )
}
