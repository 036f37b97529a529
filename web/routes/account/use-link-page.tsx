import { useMutation, useQueryClient } from '@tanstack/react-query'
import { Link, useNavigate } from 'react-router-dom'
import { DoorPage } from '../../features/people/door-page.tsx'
import { meQuery, signInByLink } from '../../features/people/queries.ts'
import { whereTo } from '../../features/people/where-to.ts'
import { useWords } from '../../lib/i18n.tsx'
import { paths } from '../../paths.ts'
import { Button } from '../../ui/button.tsx'
import { Notice } from '../../ui/notice.tsx'

/** Where a mailed link leads. Opening it does nothing; the button does, so that a mail scanner cannot use it up. */
export function UseLinkPage() {
  const { t } = useWords()
  const navigate = useNavigate()
  const client = useQueryClient()
  const enter = useMutation({
    mutationFn: () => signInByLink(window.location.hash.slice(1)),
    onSuccess: async () => {
      client.clear()
      const me = await client.fetchQuery(meQuery)
      await navigate(whereTo(me, null), { replace: true })
    },
  })
  return (
    <DoorPage title={t('signIn.usingTitle')}>
      <p>{t('signIn.usingBody')}</p>
      {enter.error && (
        <Notice look="problem">
          <p>{t('signIn.usingWrong')}</p>
          <p>
            <Link to={paths.signIn}>{t('signIn.again')}</Link>
          </p>
        </Notice>
      )}
      <Button look="primary" aria-busy={enter.isPending} onClick={() => enter.mutate()}>
        {t('signIn.usingButton')}
      </Button>
    </DoorPage>
  )
}
