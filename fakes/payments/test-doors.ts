import express, { type Request, Router } from 'express'
import { invalidRequest, notFound } from './api-error.ts'
import { cardOf } from './cards.ts'
import type { Fake } from './fake.ts'
import { importSessions } from './import-sessions.ts'
import { paySession } from './pay.ts'
import { failRefund } from './refunds.ts'
import { expireOverdue, expireSession } from './sessions.ts'
import type { WebhookSender } from './webhook-sender.ts'

/** What a real payment service has no doors for: JSON in and out, under `/_test`. */
export function testDoors(fake: Fake, sender: WebhookSender): Router {
  const router = Router()
  router.use(express.json({ limit: '64mb', type: () => true }))

  router.post('/sessions/:id/pay', (req, res) => {
    const { card, name } = bodyOf(req)
    if (typeof card !== 'string')
      throw invalidRequest('Send {"card": "4242424242424242"}.', { param: 'card' })
    const payer = typeof name === 'string' ? name : null
    res.json(paySession(fake, { sessionId: req.params.id, card: cardOf(card), name: payer }))
  })
  router.post('/sessions/:id/expire', (req, res) => {
    res.json(expireSession(fake, req.params.id))
  })
  router.get('/sessions', (_req, res) => {
    expireOverdue(fake)
    res.json(fake.books.list('checkout.session'))
  })
  router.get('/refunds', (_req, res) => {
    res.json(fake.books.list('refund'))
  })
  router.post('/refunds/:id/fail', (req, res) => {
    res.json(failRefund(fake, req.params.id))
  })

  router.get('/events', (_req, res) => {
    const events = fake.books.list('event')
    res.json(events.map(event => ({ ...event, deliveries: sender.deliveriesOf(event.id) })))
  })
  router.post('/events/:id/resend', async (req, res) => {
    if (!fake.books.find('event', req.params.id)) throw notFound('event', req.params.id)
    res.json({ id: req.params.id, ...(await sender.resend(req.params.id)) })
  })
  // Any event at all: of an unknown type, a later API version, somebody else's account.
  router.post('/events', (req, res) => {
    const { type, object, account, apiVersion } = bodyOf(req)
    if (typeof type !== 'string' || typeof object !== 'object' || object === null)
      throw invalidRequest('Send {"type": "...", "object": {...}}.')
    const more = {
      ...(typeof account === 'string' && { account }),
      ...(typeof apiVersion === 'string' && { apiVersion }),
    }
    res.json(fake.books.transaction(() => fake.announce(type, object, more)))
  })

  router.get('/behaviour', (_req, res) => {
    res.json(fake.behaviour.current)
  })
  router.post('/behaviour', (req, res) => {
    try {
      fake.behaviour.change(req.body)
    } catch (error) {
      throw error instanceof RangeError ? invalidRequest(error.message) : error
    }
    sender.wake()
    res.json(fake.behaviour.current)
  })
  router.get('/clock', (_req, res) => {
    res.json({ now: new Date(fake.clock.now()).toISOString() })
  })
  router.post('/clock', (req, res) => {
    const instant = Date.parse(String(bodyOf(req).now))
    if (Number.isNaN(instant)) throw invalidRequest('Send {"now": an ISO instant}.', { param: 'now' })
    fake.clock.set(instant)
    expireOverdue(fake)
    res.json({ now: new Date(fake.clock.now()).toISOString() })
  })
  router.post('/import', (req, res) => {
    res.json({ imported: importSessions(fake, bodyOf(req).sessions) })
  })
  // The books stay unless asked for: whoever keeps accounts against them would find every payment gone.
  router.post('/reset', (req, res) => {
    fake.behaviour.restore()
    fake.clock.restore()
    const emptied = bodyOf(req).books === true
    if (emptied) fake.books.empty()
    sender.wake()
    res.json({ emptied })
  })
  return router
}

function bodyOf(req: Request): Record<string, unknown> {
  return typeof req.body === 'object' && req.body !== null ? (req.body as Record<string, unknown>) : {}
}
