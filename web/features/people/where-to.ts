import type { Me } from '#shared/people/contract.ts'
import { paths } from '../../paths.ts'

/** Where somebody goes after signing in: where they wanted to, if it is a desk of ours, else their own first desk. */
export function whereTo(me: Me, next: string | null): string {
  if (next && /^\/(family|organizer|operator)(\/[A-Za-z0-9_\-/]*)?$/.test(next)) return next
  if (me.drives[0]) return paths.organizer(me.drives[0].driveId)
  if (me.staff.length > 0) return paths.operator
  return paths.family
}
