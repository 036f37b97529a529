import { randomBytes } from 'node:crypto'

/** An unguessable public id: 128 bits from the system's generator, 22 characters that fit in an address. */
export function newPublicId(): string {
  return randomBytes(16).toString('base64url')
}
