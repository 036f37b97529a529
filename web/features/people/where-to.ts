import type { Me } from '#shared/people/contract.ts'
import { paths } from '../../paths.ts'

/** Where somebody goes after signing in: where they wanted to, if it is a desk of ours, else their own first desk. */
export function whereTo(me: Me, next: string | null): string {
  if (next && /^\/(family|organizer|operator|account)(\/[A-Za-z0-9_\-/]*)?$/.test(next)) return next
  if (me.drives[0]) return paths.organizer(me.drives[0].driveId)
  if (me.staff.length > 0) return paths.operator
  return paths.family
}

/** True on a desk that stays shut until a second factor is set up: all but the family's and a helper's own. */
export function needsFactorAt(me: Me, pathname: string): boolean {
  if (me.secondFactor !== 'needed') return false
  const driveId = /^\/organizer\/([\w-]+)/.exec(pathname)?.[1]
  if (driveId) return me.drives.find(drive => drive.driveId === driveId)?.role !== 'helper'
  return pathname.startsWith('/operator')
}
