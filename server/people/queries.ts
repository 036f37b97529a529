import { and, eq } from 'drizzle-orm'
import type { DriveRole, StaffRole } from '#shared/people/contract.ts'
import { drive, organization } from '../db/schema/drives.ts'
import { user } from '../db/schema/identity.ts'
import { driveMember, guardian, staffMember } from '../db/schema/people.ts'
import { seller, sellerPerson } from '../db/schema/sellers.ts'
import type { Tx } from '../db/transaction.ts'

export function listStaffRoles(tx: Tx, userId: string): StaffRole[] {
  return tx
    .select({ role: staffMember.role })
    .from(staffMember)
    .where(eq(staffMember.userId, userId))
    .all()
    .map(row => row.role as StaffRole)
}

export function findDriveAccess(tx: Tx, of: { userId: string; drivePublicId: string }) {
  const found = tx
    .select({ driveId: drive.id, repUserId: drive.repUserId, memberRole: driveMember.role })
    .from(drive)
    .leftJoin(driveMember, and(eq(driveMember.driveId, drive.id), eq(driveMember.userId, of.userId)))
    .where(eq(drive.publicId, of.drivePublicId))
    .get()
  if (!found) return null
  return {
    driveId: found.driveId,
    repUserId: found.repUserId,
    memberRole: found.memberRole as DriveRole | null,
    staffRoles: listStaffRoles(tx, of.userId),
  }
}

/** Somebody's membership of one drive. */
export function findMember(tx: Tx, of: { driveId: number; userId: string }) {
  return (
    tx
      .select()
      .from(driveMember)
      .where(and(eq(driveMember.driveId, of.driveId), eq(driveMember.userId, of.userId)))
      .get() ?? null
  )
}

export function findGuardianship(tx: Tx, of: { userId: string; sellerPublicId: string }) {
  return (
    tx
      .select({ sellerId: seller.id, driveId: seller.driveId })
      .from(guardian)
      .innerJoin(seller, eq(seller.id, guardian.sellerId))
      .where(and(eq(guardian.userId, of.userId), eq(seller.publicId, of.sellerPublicId)))
      .get() ?? null
  )
}

/** The guardians to be told of an order of this seller. */
export function listGuardians(tx: Tx, sellerId: number) {
  return tx
    .select({ userId: user.id, name: user.name, email: user.email })
    .from(guardian)
    .innerJoin(user, eq(user.id, guardian.userId))
    .where(eq(guardian.sellerId, sellerId))
    .all()
}

export function findUserByEmail(tx: Tx, email: string) {
  return tx.select().from(user).where(eq(user.email, email.toLowerCase())).get() ?? null
}

/** A family account: guardian of somebody, and neither staff nor member of a drive, nor behind a second factor. */
export function mayUseSignInLink(tx: Tx, userId: string): boolean {
  const person = tx.select({ twoFactor: user.twoFactorEnabled }).from(user).where(eq(user.id, userId)).get()
  if (!person || person.twoFactor) return false
  if (listStaffRoles(tx, userId).length > 0) return false
  const member = tx
    .select({ role: driveMember.role })
    .from(driveMember)
    .where(eq(driveMember.userId, userId))
    .get()
  if (member) return false
  return (
    tx.select({ id: guardian.sellerId }).from(guardian).where(eq(guardian.userId, userId)).get() !== undefined
  )
}

/** The desks of somebody, for the doors on their screen. */
export function listDesks(tx: Tx, userId: string) {
  const family = tx
    .select({
      sellerId: seller.publicId,
      firstName: sellerPerson.firstName,
      lastName: sellerPerson.lastName,
      organization: organization.name,
      drive: drive.name,
    })
    .from(guardian)
    .innerJoin(seller, eq(seller.id, guardian.sellerId))
    .innerJoin(sellerPerson, eq(sellerPerson.sellerId, seller.id))
    .innerJoin(drive, eq(drive.id, seller.driveId))
    .innerJoin(organization, eq(organization.id, drive.organizationId))
    .where(eq(guardian.userId, userId))
    .orderBy(seller.number)
    .all()
  const drives = tx
    .select({
      driveId: drive.publicId,
      drive: drive.name,
      organization: organization.name,
      role: driveMember.role,
    })
    .from(driveMember)
    .innerJoin(drive, eq(drive.id, driveMember.driveId))
    .innerJoin(organization, eq(organization.id, drive.organizationId))
    .where(eq(driveMember.userId, userId))
    .orderBy(drive.closesAt)
    .all()
  return { family, drives, staff: listStaffRoles(tx, userId) }
}

export function listStaff(tx: Tx, role: StaffRole) {
  return tx
    .select({ userId: user.id, name: user.name, email: user.email })
    .from(staffMember)
    .innerJoin(user, eq(user.id, staffMember.userId))
    .where(eq(staffMember.role, role))
    .all()
}

/** Members of a drive in one role, with the drive's public id for the letters they get. */
export function listMembers(tx: Tx, driveId: number, role: DriveRole) {
  return tx
    .select({ userId: user.id, name: user.name, email: user.email, drivePublicId: drive.publicId })
    .from(driveMember)
    .innerJoin(user, eq(user.id, driveMember.userId))
    .innerJoin(drive, eq(drive.id, driveMember.driveId))
    .where(and(eq(driveMember.driveId, driveId), eq(driveMember.role, role)))
    .all()
}
