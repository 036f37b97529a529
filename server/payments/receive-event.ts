import { and, asc, eq, isNull, lt } from 'drizzle-orm'
import { AppError } from '#shared/errors.ts'
import { refusal } from '#shared/messages/refusals.ts'
import type { PaymentAnnouncement, SessionState } from '../clients/payments.ts'
import { paymentEvent } from '../db/schema/payments.ts'
import { inTransaction } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { hit } from '../faults.ts'
import { applySession } from '../orders/apply-session.ts'
import { findSessionByIntent } from './queries.ts'

/** After so many failures an event waits for staff instead of being tried again. */
const MAX_ATTEMPTS = 20

/**
 * Takes a webhook: proves it genuine, writes it into the inbox once, then acts on it. The answer says only
 * that it is kept; what could not be done at once, the next round does.
 *
 * @throws AppError invalid_input when the signature, the stamp or the body is not genuine.
 */
export async function receiveEvent(deps: Deps, request: { rawBody: unknown; signature: string | undefined }) {
  hit('F08')
  let announced: PaymentAnnouncement
  try {
    if (!Buffer.isBuffer(request.rawBody) || !request.signature) throw new Error('no body or signature')
    announced = deps.payments.readAnnouncement(request.rawBody, request.signature)
  } catch {
    throw new AppError('invalid_input', { detail: refusal('thisMessageIsNotSignedBy') })
  }
  hit('F09')
  const isNew = inTransaction(deps.db, tx => {
    const { changes } = tx
      .insert(paymentEvent)
      .values({
        eventId: announced.eventId,
        type: announced.type,
        facts: JSON.stringify(toFacts(announced)),
        receivedAt: deps.now(),
      })
      .onConflictDoNothing()
      .run()
    return changes === 1
  })
  hit('F10')
  if (isNew) await processEvent(deps, announced.eventId)
}

type Facts = { session: SessionState | null; paymentIntentId: string | null }

/** What is kept of an event: no name, no address. */
function toFacts(announced: PaymentAnnouncement): Facts {
  return {
    session: announced.session && { ...announced.session, url: null, metadata: {} },
    paymentIntentId: announced.paymentIntentId,
  }
}

/** Acts on one event of the inbox. A failure is noted and the event stays open for the next round. */
export async function processEvent(deps: Deps, eventId: string): Promise<void> {
  const row = deps.db.orm.select().from(paymentEvent).where(eq(paymentEvent.eventId, eventId)).get()
  if (!row || row.processedAt !== null) return
  try {
    const outcome = await act(deps, row.type, JSON.parse(row.facts) as Facts)
    finish(deps, eventId, outcome)
  } catch (error) {
    deps.log.error(
      { event: eventId, type: row.type, error: (error as Error).message },
      'event not processed yet',
    )
    inTransaction(deps.db, tx => {
      tx.update(paymentEvent)
        .set({ attempts: row.attempts + 1 })
        .where(eq(paymentEvent.eventId, eventId))
        .run()
    })
    if (row.attempts + 1 >= MAX_ATTEMPTS) finish(deps, eventId, `given up: ${(error as Error).message}`)
  }
}

async function act(deps: Deps, type: string, facts: Facts): Promise<string> {
  switch (type) {
    case 'checkout.session.completed':
    case 'checkout.session.async_payment_succeeded':
    case 'checkout.session.expired': {
      if (!facts.session) return 'no session in it'
      // Events come in any order; what the service says now is what counts once the order might go backwards.
      const state =
        type === 'checkout.session.expired'
          ? await deps.payments.getSession(facts.session.sessionId)
          : facts.session
      return applySession(deps, state)
    }
    default:
      if (facts.paymentIntentId && findSessionByIntent(deps.db.orm, facts.paymentIntentId))
        return `noted: ${type}`
      return 'not for us'
  }
}

function finish(deps: Deps, eventId: string, outcome: string) {
  inTransaction(deps.db, tx => {
    tx.update(paymentEvent)
      .set({ processedAt: deps.now(), outcome })
      .where(and(eq(paymentEvent.eventId, eventId), isNull(paymentEvent.processedAt)))
      .run()
  })
}

/** Acts on what the inbox still holds, oldest first; used after a restart and by the regular round. */
export async function processOpenEvents(deps: Deps, options: { olderThanMs: number }) {
  const open = deps.db.orm
    .select({ eventId: paymentEvent.eventId })
    .from(paymentEvent)
    .where(
      and(
        isNull(paymentEvent.processedAt),
        lt(paymentEvent.receivedAt, deps.now() - options.olderThanMs + 1),
      ),
    )
    .orderBy(asc(paymentEvent.receivedAt))
    .limit(200)
    .all()
  for (const { eventId } of open) await processEvent(deps, eventId)
}
