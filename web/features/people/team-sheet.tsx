import { useQuery } from '@tanstack/react-query'
import { useRef, useState } from 'react'
import type { Team } from '#shared/people/second-factor.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { Sheet } from '../../ui/sheet.tsx'
import { FieldlessProblem } from './problem-at.tsx'
import { ResetFactorDialog } from './reset-factor-dialog.tsx'
import { teamQuery } from './second-factor-queries.ts'

type Member = Team['members'][number]

/** The people of a drive, their roles, and a way to take a lost second factor off. */
export function TeamSheet({ driveId }: { driveId: string }) {
  const { t } = useWords()
  const team = useQuery(teamQuery(driveId))
  const [asked, setAsked] = useState<Member | null>(null)
  const [told, setTold] = useState('')
  const heading = useRef<HTMLHeadingElement>(null)
  const members = team.data?.members ?? []
  const showsEmail = members.some(member => member.email !== null)
  return (
    <Sheet as="section" className="px-5 py-6 sm:px-7" labelledBy="team">
      <h2 id="team" ref={heading} tabIndex={-1} className="text-[1.35rem]">
        {t('team.title')}
      </h2>
      <FieldlessProblem error={team.error} />
      <ul className="mt-3 border-t border-rule">
        {members.map(member => (
          <li
            key={member.userId}
            className="flex flex-wrap items-center justify-between gap-x-6 gap-y-1 border-b border-rule py-3"
          >
            <div className="min-w-0">
              <p className="font-semibold">
                {member.isMe ? t('team.me', { name: member.name }) : member.name}
              </p>
              <p className="text-[0.92em] text-ink-soft">
                {t(`team.role.${member.role}`)} · {t('team.factor')}: {factorWord(member)}
              </p>
              {showsEmail && member.email && (
                <p className="text-[0.92em] [overflow-wrap:anywhere]">{member.email}</p>
              )}
            </div>
            {member.mayReset && (
              <Button aria-label={t('team.resetOf', { name: member.name })} onClick={() => setAsked(member)}>
                {t('team.reset')}
              </Button>
            )}
          </li>
        ))}
      </ul>
      <p role="status" className="mt-3 empty:hidden">
        {told}
      </p>
      {asked && (
        <ResetFactorDialog
          driveId={driveId}
          member={asked}
          onClose={() => setAsked(null)}
          onDone={() => {
            setTold(t('team.resetDone', { name: asked.name }))
            setAsked(null)
            // The button that had the focus is gone.
            heading.current?.focus()
          }}
        />
      )}
    </Sheet>
  )

  function factorWord(member: Member): string {
    if (member.secondFactor) return t('team.factorOn')
    return member.role === 'helper' ? t('team.factorFree') : t('team.factorOff')
  }
}
