import { randomBytes } from 'node:crypto'
import express, { type Request, type Response, Router } from 'express'
import type Stripe from 'stripe'
import { ApiError } from './api-error.ts'
import { cardOf, type DeclineReason, mayBeShownAgain } from './cards.ts'
import type { Fake } from './fake.ts'
import { paySession } from './pay.ts'
import { cardFormPage, closedPage, type Problems, type Typed } from './pay-page.ts'
import type { Field, Language } from './pay-texts.ts'
import { getSession } from './sessions.ts'

const EMPTY: Typed = { number: '', expiry: '', code: '', name: '' }

/** The page where the customer pays, at `/pay/{session id}`. */
export function payRoutes(fake: Fake): Router {
  const router = Router()
  router.use(express.urlencoded({ extended: false, limit: '10kb' }))

  router.get('/:id', (req, res) => {
    showSession(fake, { req, res, typed: EMPTY, problems: {} })
  })

  router.post('/:id', (req, res) => {
    const typed = typedIn(req)
    const session = findSession(fake, req)
    // Pressing Pay twice leads where pressing it once leads.
    if (session?.status === 'complete') return res.redirect(303, afterPayment(session))
    const problems = problemsOf(typed, fake.clock.now())
    if (session?.status !== 'open' || Object.keys(problems).length > 0)
      return showSession(fake, { req, res, typed, problems })

    const card = cardOf(typed.number)
    try {
      const paid = paySession(fake, { sessionId: session.id, card, name: typed.name })
      return res.redirect(303, afterPayment(paid))
    } catch (error) {
      if (!(error instanceof ApiError) || !card.decline) throw error
      showSession(fake, {
        req,
        res,
        typed,
        problems: { [PLACE_OF[card.decline.reason]]: card.decline.reason },
      })
    }
  })
  return router
}

const PLACE_OF: Record<DeclineReason, Field | 'whole'> = {
  declined: 'whole',
  insufficient_funds: 'whole',
  processing_error: 'whole',
  expired_card: 'expiry',
  incorrect_cvc: 'code',
  not_a_number: 'number',
  not_a_test_card: 'number',
}

function showSession(
  fake: Fake,
  show: { req: Request; res: Response; typed: Typed; problems: Problems },
): void {
  const { req, res, problems } = show
  const session = findSession(fake, req)
  const language = languageOf(session, req)
  const nonce = randomBytes(16).toString('base64')
  secure(res, { nonce, session })
  if (session?.status !== 'open') {
    const kind = !session ? 'unknown' : session.status === 'complete' ? 'paid' : 'expired'
    const linkTo = !session
      ? null
      : kind === 'paid'
        ? afterPayment(session)
        : (session.cancel_url ?? session.success_url)
    res.status(session ? 200 : 404).send(closedPage({ kind, language, nonce, linkTo }))
    return
  }
  // A number that could be somebody's card is not written into a page, and its code neither.
  const typed = mayBeShownAgain(show.typed.number) ? show.typed : { ...show.typed, number: '', code: '' }
  const minutesLeft = Math.max(1, Math.ceil((session.expires_at * 1_000 - fake.clock.now()) / 60_000))
  const { lines } = fake.books.asideOf(session.id)
  const status = Object.keys(problems).length === 0 ? 200 : problems.whole ? 402 : 422
  res.status(status).send(cardFormPage({ session, lines, language, nonce, minutesLeft, typed, problems }))
}

function findSession(fake: Fake, req: Request): Stripe.Checkout.Session | null {
  try {
    return getSession(fake, String(req.params.id))
  } catch (error) {
    if (error instanceof ApiError) return null
    throw error
  }
}

function secure(res: Response, page: { nonce: string; session: Stripe.Checkout.Session | null }): void {
  // A browser holds a form's whole way against form-action, the redirect after it included.
  const after = page.session?.success_url ? new URL(page.session.success_url).origin : ''
  res.set({
    'content-security-policy': `default-src 'none'; style-src 'nonce-${page.nonce}'; img-src data:; form-action 'self' ${after}; frame-ancestors 'none'; base-uri 'none'`,
    'referrer-policy': 'same-origin',
    'x-content-type-options': 'nosniff',
    'cache-control': 'private, no-store',
  })
}

function afterPayment(session: Stripe.Checkout.Session): string {
  return (session.success_url ?? '/').replaceAll('{CHECKOUT_SESSION_ID}', session.id)
}

function languageOf(session: Stripe.Checkout.Session | null, req: Request): Language {
  const locale = session?.locale ?? 'auto'
  const wanted = locale === 'auto' ? req.acceptsLanguages('en', 'es') : locale
  return String(wanted).startsWith('es') ? 'es' : 'en'
}

function typedIn(req: Request): Typed {
  const body = (req.body ?? {}) as Record<string, unknown>
  const text = (name: Field) => (typeof body[name] === 'string' ? body[name].trim().slice(0, 120) : '')
  return { number: text('number'), expiry: text('expiry'), code: text('code'), name: text('name') }
}

function problemsOf(typed: Typed, now: number): Problems {
  const problems: Problems = {}
  const reason = typed.number === '' ? null : cardOf(typed.number).decline?.reason
  if (reason === null) problems.number = 'number_missing'
  else if (reason === 'not_a_number' || reason === 'not_a_test_card') problems.number = reason
  const expiry = /^(0?[1-9]|1[0-2])\s*[/.-]?\s*(\d{2}|20\d{2})$/.exec(typed.expiry)
  if (!expiry) problems.expiry = 'expiry_form'
  // A card is good to the end of the month printed on it.
  else if (Date.UTC(2000 + (Number(expiry[2]) % 100), Number(expiry[1]), 1) <= now)
    problems.expiry = 'expiry_past'
  if (!/^\d{3,4}$/.test(typed.code)) problems.code = 'code_form'
  if (typed.name === '') problems.name = 'name_missing'
  return problems
}
