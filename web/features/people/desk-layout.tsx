import { useMutation, useQuery } from '@tanstack/react-query'
import { type ReactNode, useEffect } from 'react'
import { Link, Navigate, useLocation } from 'react-router-dom'
import type { Me } from '#shared/people/contract.ts'
import { ApiError } from '../../lib/api.ts'
import { useWords } from '../../lib/i18n.tsx'
import { paths } from '../../paths.ts'
import { Button } from '../../ui/button.tsx'
import { Notice } from '../../ui/notice.tsx'
import { PageHeader } from '../../ui/page-header.tsx'
import type { Ply } from '../../ui/sheet.tsx'
import { meQuery, signOut, signOutEverywhere } from './queries.ts'
import { SecondFactorNotice } from './second-factor-notice.tsx'
import { needsFactorAt } from './where-to.ts'

type DeskLayoutProps = { ply: Ply; title: string; aside?: ReactNode; children: (me: Me) => ReactNode }

const bands: Record<Ply, string> = {
  white: 'bg-sheet double-rule',
  canary: 'bg-canary',
  pink: 'bg-pink',
  goldenrod: 'bg-goldenrod',
}

/** A desk: its ply's band with the name, who is signed in, and the doors to their other desks. */
export function DeskLayout({ ply, title, aside, children }: DeskLayoutProps) {
  const { t } = useWords()
  const me = useQuery(meQuery)
  const { pathname } = useLocation()
  useEffect(() => {
    document.title = `${title} · Tallykin`
  }, [title])
  if (me.error instanceof ApiError && me.error.status === 401)
    return <Navigate to={`${paths.signIn}?next=${encodeURIComponent(pathname)}`} replace />
  return (
    <>
      <PageHeader home={paths.home}>{me.data && <Account me={me.data} />}</PageHeader>
      <div className={`${bands[ply]} text-on-ply`}>
        <div className="mx-auto flex max-w-[85rem] flex-wrap items-baseline justify-between gap-x-6 gap-y-1 px-4 py-3 sm:px-10">
          <h1 className="text-[1.6rem]">{title}</h1>
          {aside && <p className="font-semibold">{aside}</p>}
        </div>
      </div>
      <main className="mx-auto max-w-[85rem] px-3.5 pb-20 pt-6 sm:px-10">
        {me.isPending && <p className="text-ink-soft">{t('desk.loading')}</p>}
        {me.error && (
          <Notice look="problem">
            <p>{me.error instanceof ApiError && me.error.status > 0 ? me.error.message : t('unreachable')}</p>
          </Notice>
        )}
        {me.data && (needsFactorAt(me.data, pathname) ? <SecondFactorNotice /> : children(me.data))}
      </main>
    </>
  )
}

function Account({ me }: { me: Me }) {
  const { t } = useWords()
  const leave = useMutation({ mutationFn: signOut, onSettled: () => window.location.assign(paths.signIn) })
  const leaveElsewhere = useMutation({ mutationFn: signOutEverywhere })
  return (
    <details className="relative">
      <summary className="flex min-h-11 items-center rounded-sm px-2 font-semibold">{me.name}</summary>
      <div className="absolute right-0 z-20 mt-1 grid w-72 gap-1 rounded-sm bg-sheet p-3 shadow-sheet outline-1 outline-rule">
        <p className="px-2 text-[0.9em] text-ink-soft">{t('desk.signedInAs', { name: me.email })}</p>
        <DeskLinks me={me} />
        <Link className="flex min-h-11 items-center px-2 font-semibold" to={paths.secondFactor}>
          {t('secondFactor.menu')}
        </Link>
        <Button look="quiet" className="justify-start" onClick={() => leave.mutate()}>
          {t('desk.signOut')}
        </Button>
        <Button look="quiet" className="justify-start" onClick={() => leaveElsewhere.mutate()}>
          {t('desk.signOutEverywhere')}
        </Button>
        <p role="status" className="px-2 text-[0.9em]">
          {leaveElsewhere.isSuccess && t('desk.signedOutElsewhere')}
        </p>
      </div>
    </details>
  )
}

/** The doors to the desks of the person who is signed in. */
export function DeskLinks({ me }: { me: Me }) {
  const { t } = useWords()
  const link = 'flex min-h-11 items-center px-2 font-semibold'
  return (
    <>
      {me.family.length > 0 && (
        <Link className={link} to={paths.family}>
          {t('desk.family')}
        </Link>
      )}
      {me.drives.map(drive => (
        <Link key={drive.driveId} className={link} to={paths.organizer(drive.driveId)}>
          {t('desk.organizer')}: {drive.organization}
        </Link>
      ))}
      {me.staff.length > 0 && (
        <Link className={link} to={paths.operator}>
          {t('desk.operator')}
        </Link>
      )}
    </>
  )
}
