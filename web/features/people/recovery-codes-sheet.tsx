import { useEffect, useRef } from 'react'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { Sheet } from '../../ui/sheet.tsx'

/** Ten codes, shown this once and made for paper: only they are printed. */
export function RecoveryCodesSheet(props: { codes: string[]; email: string; onDone: () => void }) {
  const { t } = useWords()
  const heading = useRef<HTMLHeadingElement>(null)
  useEffect(() => heading.current?.focus(), [])
  return (
    <Sheet as="section" className="max-w-2xl px-5 py-6 sm:px-7" labelledBy="recovery-codes">
      <h2 id="recovery-codes" ref={heading} tabIndex={-1} className="no-print text-[1.4rem]">
        {t('secondFactor.codesTitle')}
      </h2>
      <p className="mt-3">{t('secondFactor.codesBody')}</p>
      <p className="mt-4 font-semibold">{t('secondFactor.codesFor', { email: props.email })}</p>
      <ol className="mt-2 grid gap-x-8 border-t border-rule sm:grid-cols-2">
        {props.codes.map(code => (
          <li key={code} className="flex items-center gap-3 border-b border-rule py-2">
            <span aria-hidden="true" className="inline-block size-5 border-[1.5px] border-field" />
            <span className="font-mono text-[1.15em] tracking-[0.06em]">{code}</span>
          </li>
        ))}
      </ol>
      <div className="no-print mt-6 flex flex-wrap gap-3">
        <Button look="primary" onClick={() => window.print()}>
          {t('secondFactor.print')}
        </Button>
        <Button onClick={props.onDone}>{t('secondFactor.done')}</Button>
      </div>
    </Sheet>
  )
}
