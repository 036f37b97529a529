import { and, eq, like, lt, ne } from 'drizzle-orm'
import type { Db } from '../db/open.ts'
import { secondFactorUse, session, twoFactor, user, verification } from '../db/schema/identity.ts'
import { driveMember } from '../db/schema/people.ts'
import { inTransaction, type Tx } from '../db/transaction.ts'
import { listStaffRoles } from './queries.ts'

export type SecondFactorState = 'on' | 'needed' | 'off'

/** True once a person's authenticator has proven itself by a first code. */
export function hasSecondFactor(tx: Tx, userId: string): boolean {
  return (
    tx
      .select({ id: twoFactor.id })
      .from(twoFactor)
      .innerJoin(user, eq(user.id, twoFactor.userId))
      .where(and(eq(twoFactor.userId, userId), eq(twoFactor.verified, true), eq(user.twoFactorEnabled, true)))
      .limit(1)
      .get() !== undefined
  )
}

/** Staff, leads and treasurers need one: they can move money or see everybody. */
export function needsSecondFactor(tx: Tx, userId: string): boolean {
  if (listStaffRoles(tx, userId).length > 0) return true
  return (
    tx
      .select({ role: driveMember.role })
      .from(driveMember)
      .where(and(eq(driveMember.userId, userId), ne(driveMember.role, 'helper')))
      .limit(1)
      .get() !== undefined
  )
}

export function secondFactorState(tx: Tx, userId: string): SecondFactorState {
  if (hasSecondFactor(tx, userId)) return 'on'
  return needsSecondFactor(tx, userId) ? 'needed' : 'off'
}

/** The sealed secret of somebody's factor, proven or not. */
export function findFactor(tx: Tx, userId: string) {
  return tx.select().from(twoFactor).where(eq(twoFactor.userId, userId)).get() ?? null
}

/**
 * Uses up a time step's code. False when that code, or a later one, was used before: whoever looked over a
 * shoulder comes too late (RFC 6238, section 5.2: a code is accepted once).
 */
export function claimStep(db: Db, of: { userId: string; step: number }): boolean {
  return inTransaction(
    db,
    tx =>
      tx
        .insert(secondFactorUse)
        .values({ userId: of.userId, lastStep: of.step })
        .onConflictDoUpdate({
          target: secondFactorUse.userId,
          set: { lastStep: of.step },
          setWhere: lt(secondFactorUse.lastStep, of.step),
        })
        .run().changes === 1,
  )
}

/** Ends somebody's sessions and half-done sign-ins, except the one whose token is named. */
export function endSessions(tx: Tx, userId: string, options: { exceptToken?: string } = {}) {
  const mine = eq(session.userId, userId)
  tx.delete(session)
    .where(options.exceptToken === undefined ? mine : and(mine, ne(session.token, options.exceptToken)))
    .run()
  tx.delete(verification)
    .where(and(eq(verification.value, userId), like(verification.identifier, '2fa-%')))
    .run()
}

/** Takes the factor off; afterwards the password alone signs in and no desk that needs the factor opens. */
export function deleteFactor(tx: Tx, userId: string, at: number) {
  tx.delete(twoFactor).where(eq(twoFactor.userId, userId)).run()
  tx.delete(secondFactorUse).where(eq(secondFactorUse.userId, userId)).run()
  tx.update(user)
    .set({ twoFactorEnabled: false, updatedAt: new Date(at) })
    .where(eq(user.id, userId))
    .run()
}
