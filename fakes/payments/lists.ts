import { invalidRequest } from './api-error.ts'
import type { Filter, Kind } from './books.ts'
import { type Fake, seconds } from './fake.ts'
import type { Params } from './params.ts'

const ADDRESS: Record<string, string> = {
  'checkout.session': '/v1/checkout/sessions',
  payment_intent: '/v1/payment_intents',
  refund: '/v1/refunds',
  event: '/v1/events',
}
/** Events can be listed for thirty days; what happened before is known from the objects themselves only. */
const EVENTS_KEPT_S = 30 * 24 * 60 * 60

/** One page of a list, newest first: `limit` to 100, `starting_after` for the next page. */
export function listPage(fake: Fake, kind: Kind, params: Params) {
  const limit = params.integer('limit', { min: 1, max: 100 }) ?? 10
  const after = params.text('starting_after')
  if (after !== null && fake.books.find(kind, after) === null)
    throw invalidRequest(`No such ${kind}: '${after}'`, { code: 'resource_missing', param: 'starting_after' })
  const filter = { ...createdRange(params), ...filterFor(kind, params), ...(after !== null && { after }) }
  if (kind === 'event') filter.createdFrom = Math.max(filter.createdFrom ?? 0, seconds(fake) - EVENTS_KEPT_S)
  params.refuseUnread()
  const found = fake.books.list(kind, { ...filter, limit: limit + 1 })
  return { object: 'list', data: found.slice(0, limit), has_more: found.length > limit, url: ADDRESS[kind] }
}

function createdRange(params: Params): Filter {
  const exactly = params.integer('created')
  if (exactly !== null) return { createdFrom: exactly, createdTo: exactly }
  const created = params.within('created')
  const above = created.integer('gt')
  const below = created.integer('lt')
  const from = created.integer('gte') ?? (above === null ? null : above + 1)
  const to = created.integer('lte') ?? (below === null ? null : below - 1)
  return { ...(from !== null && { createdFrom: from }), ...(to !== null && { createdTo: to }) }
}

function filterFor(kind: Kind, params: Params): Filter {
  const filter: Filter = {}
  const set = <K extends keyof Filter>(name: K, value: Filter[K] | null) => {
    if (value !== null) filter[name] = value
  }
  if (kind === 'checkout.session') {
    set('paymentIntent', params.text('payment_intent'))
    set('status', params.oneOf('status', ['open', 'complete', 'expired']))
    set('email', params.within('customer_details').text('email'))
  }
  if (kind === 'refund') {
    set('paymentIntent', params.text('payment_intent'))
    set('charge', params.text('charge'))
  }
  if (kind === 'event') {
    const one = params.text('type')
    const several = params.list('types')
    if (one !== null || several.length > 0) filter.types = one === null ? several : [one]
  }
  return filter
}
