import { useEffect } from 'react'
import { ApiError } from '../../lib/api.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Notice } from '../../ui/notice.tsx'

/** What a refusal says of one field. */
export function problemAt(error: Error | null, path: string): string | undefined {
  return error instanceof ApiError ? error.fields.find(problem => problem.path === path)?.message : undefined
}

/** A refusal that concerns no single field. */
export function FieldlessProblem({ error }: { error: Error | null }) {
  const { t } = useWords()
  if (!error || (error instanceof ApiError && error.fields.length > 0)) return null
  return (
    <Notice look="problem">
      <p>{error instanceof ApiError && error.status > 0 ? error.message : t('unreachable')}</p>
    </Notice>
  )
}

/** Brings somebody whose input was refused back to the field. */
export function useFocusOnProblem(error: Error | null, fieldId: string) {
  useEffect(() => {
    if (error) document.getElementById(fieldId)?.focus()
  }, [error, fieldId])
}
