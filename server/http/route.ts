import type { Request } from 'express'
import type { z } from 'zod'
import type { DriveRole, StaffRole } from '#shared/people/contract.ts'
import type { Deps } from '../deps.ts'

/** Somebody who is signed in. What they may do is asked of the memberships each time. */
export type Person = { userId: string; name: string; email: string; sessionId: string }

/**
 * Who may use a route. Beside the handler, so that nobody has to look elsewhere; the server does not start
 * with a route that names none.
 *
 * - `anyone`: public facts only.
 * - `customer`: whoever holds the link or the receipt address named in the path.
 * - `payment_service`: proven by its signature.
 * - `signed_in`: anybody with an account; sees what is theirs.
 * - `guardian`: a guardian of the seller named by `:sellerId`.
 * - `drive`: a member of the drive named by `:driveId` in one of `roles`, or staff in one of `staff`
 *   (a rep only for the drives they run).
 * - `staff`: the operator's people in one of `roles`.
 */
export type Access =
  | { who: 'anyone' }
  | { who: 'customer' }
  | { who: 'payment_service' }
  | { who: 'signed_in' }
  | { who: 'guardian' }
  | { who: 'drive'; roles: readonly DriveRole[]; staff: readonly StaffRole[] }
  | { who: 'staff'; roles: readonly StaffRole[] }

/** What the access check found out, for the handler to use. */
export type Granted = {
  person: Person | null
  /** Internal ids of what the path names, where access depended on it. */
  driveId?: number
  sellerId?: number
  /** In which role access to the drive was granted. */
  role?: DriveRole | StaffRole
}

type Schema = z.ZodType | undefined
type Out<S extends Schema> = S extends z.ZodType ? z.output<S> : undefined

export type Reply = { status: number; body: unknown; headers?: Record<string, string | string[]> }

export type RouteContext<P extends Schema, Q extends Schema, B extends Schema> = {
  deps: Deps
  params: Out<P>
  query: Out<Q>
  body: Out<B>
  /** The body as it came, for a route that declares `rawBody`. */
  rawBody: unknown
  granted: Granted
  requestId: string
  /** The request itself, for the identity library alone. */
  request: Request
  /** Trimmed value of a request header, or undefined. */
  header: (name: string) => string | undefined
}

export type RouteSpec<P extends Schema = Schema, Q extends Schema = Schema, B extends Schema = Schema> = {
  method: 'get' | 'post' | 'put' | 'delete'
  /** Below `/api`, in Express form. */
  path: string
  summary: string
  access: Access
  params?: P
  query?: Q
  body?: B
  /** Hands the handler the unread bytes instead, up to 1 MB. */
  rawBody?: boolean
  /** Header names the route reads, for the published description. */
  headers?: Record<string, string>
  /** Reply schemas by status; a reply is cut to its schema, so that a new column never leaks. */
  replies: Record<number, z.ZodType>
  handler: (context: RouteContext<P, Q, B>) => Reply | Promise<Reply>
}

/** A route whose own types are settled; what the mounting code and the tests walk over. */
export type AnyRoute = Omit<RouteSpec, 'handler'> & {
  handler: (context: RouteContext<Schema, Schema, Schema>) => Reply | Promise<Reply>
}

/** Declares a route: contract, access and handler in one place. */
export function route<
  P extends Schema = undefined,
  Q extends Schema = undefined,
  B extends Schema = undefined,
>(spec: RouteSpec<P, Q, B>): AnyRoute {
  return spec as unknown as AnyRoute
}

export function reply(status: number, body: unknown, headers?: Record<string, string | string[]>): Reply {
  return headers ? { status, body, headers } : { status, body }
}
