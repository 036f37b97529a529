import type { Request } from 'express'
import { AppError } from '#shared/errors.ts'
import type { Deps } from '../deps.ts'
import type { Access, Granted, Person } from '../http/route.ts'
import { findDriveAccess, findGuardianship, listStaffRoles } from './queries.ts'
import { hasSecondFactor } from './second-factor.ts'

/**
 * Decides whether the request may use the route, by what the memberships say right now.
 *
 * What is somebody else's, and what does not exist, get the same "not found", so that nothing is learned.
 */
export async function grant(deps: Deps, access: Access, req: Request): Promise<Granted> {
  if (access.who === 'anyone' || access.who === 'customer' || access.who === 'payment_service')
    return { person: null }
  const person = await deps.identity.findPerson(req)
  if (!person) throw new AppError('not_signed_in')
  switch (access.who) {
    case 'signed_in':
      return { person }
    case 'guardian':
      return grantGuardian(deps, person, String(req.params.sellerId))
    case 'drive':
      return grantDrive(deps, person, access, String(req.params.driveId))
    case 'staff': {
      const role = listStaffRoles(deps.db.orm, person.userId).find(held => access.roles.includes(held))
      if (!role) throw new AppError('not_found')
      demandSecondFactor(deps, person)
      return { person, role }
    }
  }
}

function grantGuardian(deps: Deps, person: Person, sellerPublicId: string): Granted {
  const found = findGuardianship(deps.db.orm, { userId: person.userId, sellerPublicId })
  if (!found) throw new AppError('not_found')
  return { person, sellerId: found.sellerId, driveId: found.driveId }
}

function grantDrive(
  deps: Deps,
  person: Person,
  access: Extract<Access, { who: 'drive' }>,
  drivePublicId: string,
): Granted {
  const found = findDriveAccess(deps.db.orm, { userId: person.userId, drivePublicId })
  if (!found) throw new AppError('not_found')
  if (found.memberRole && access.roles.includes(found.memberRole)) {
    if (found.memberRole !== 'helper') demandSecondFactor(deps, person)
    return { person, driveId: found.driveId, role: found.memberRole }
  }
  const staffRole = found.staffRoles.find(
    role => access.staff.includes(role) && (role !== 'rep' || found.repUserId === person.userId),
  )
  if (staffRole) {
    demandSecondFactor(deps, person)
    return { person, driveId: found.driveId, role: staffRole }
  }
  // A member of this drive knows that it exists; everybody else learns nothing.
  throw new AppError(found.memberRole ? 'not_allowed' : 'not_found')
}

/** Leads, treasurers and staff act only behind a second factor; a session of theirs has passed it at sign-in. */
function demandSecondFactor(deps: Deps, person: Person) {
  if (!hasSecondFactor(deps.db.orm, person.userId)) throw new AppError('second_factor_needed')
}
