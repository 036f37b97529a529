import { Link } from 'react-router-dom'
import { useWords } from '../../lib/i18n.tsx'
import { paths } from '../../paths.ts'
import { buttonClass } from '../../ui/button.tsx'
import { Sheet } from '../../ui/sheet.tsx'

/** In place of a desk that stays shut until the second factor is set up: why, and where. */
export function SecondFactorNotice() {
  const { t } = useWords()
  return (
    <Sheet as="section" className="max-w-2xl px-5 py-6 sm:px-7" labelledBy="factor-needed">
      <h2 id="factor-needed" className="text-[1.4rem]">
        {t('secondFactor.neededTitle')}
      </h2>
      <p className="mt-3">{t('secondFactor.needed')}</p>
      <p className="mt-5">
        <Link className={`${buttonClass('primary')} no-underline`} to={paths.secondFactor}>
          {t('secondFactor.setUp')}
        </Link>
      </p>
    </Sheet>
  )
}
