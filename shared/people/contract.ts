import { z } from 'zod'

export const driveRoles = ['lead', 'treasurer', 'helper'] as const
export const staffRoles = ['admin', 'rep', 'clerk', 'warehouse'] as const
export type DriveRole = (typeof driveRoles)[number]
export type StaffRole = (typeof staffRoles)[number]

/** Who is signed in and which desks are theirs. */
export const meReply = z.object({
  name: z.string(),
  email: z.string(),
  family: z.array(
    z.object({ sellerId: z.string(), name: z.string(), organization: z.string(), drive: z.string() }),
  ),
  drives: z.array(
    z.object({ driveId: z.string(), drive: z.string(), organization: z.string(), role: z.enum(driveRoles) }),
  ),
  staff: z.array(z.enum(staffRoles)),
  /** `needed`: some desk of theirs stays shut until it is set up. */
  secondFactor: z.enum(['on', 'needed', 'off']),
})
export type Me = z.infer<typeof meReply>
