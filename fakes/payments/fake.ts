import type Stripe from 'stripe'
import type { SettableClock } from '../clock.ts'
import type { BehaviourSwitch } from './behaviour.ts'
import type { Books } from './books.ts'

/** What the deeds of the stand-in work with: built once when it starts. */
export type Fake = {
  books: Books
  clock: SettableClock
  behaviour: BehaviourSwitch
  /** Where browsers reach it, without a slash at the end. */
  publicUrl: string
  /** Writes an event down and has it delivered once the surrounding transaction is committed. */
  announce(type: string, object: object, more?: Announcement): Stripe.Event
}

export type Announcement = {
  previous?: Record<string, unknown>
  /** The connected account the event is about, when it is not our own. */
  account?: string
  apiVersion?: string
}

/** The stand-in's time in Unix seconds, as the wire counts. */
export function seconds(fake: Fake): number {
  return Math.floor(fake.clock.now() / 1000)
}
