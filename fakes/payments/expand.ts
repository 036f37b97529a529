import { invalidRequest } from './api-error.ts'
import type { Kind } from './books.ts'
import type { Fake } from './fake.ts'

const REFERENCES: Record<string, Kind> = {
  payment_intent: 'payment_intent',
  latest_charge: 'charge',
  charge: 'charge',
}

/** Puts whole objects where the answer has only ids, along paths such as `payment_intent.latest_charge`. */
export function expand(fake: Fake, answer: unknown, paths: string[]): unknown {
  const copy = structuredClone(answer) as Record<string, unknown>
  for (const path of paths) follow(fake, copy, { steps: path.split('.'), path })
  return copy
}

function follow(fake: Fake, object: Record<string, unknown>, way: { steps: string[]; path: string }): void {
  const [field, ...steps] = way.steps
  if (field === undefined) return
  if (field === 'data' && object.object === 'list') {
    for (const entry of object.data as Record<string, unknown>[]) follow(fake, entry, { ...way, steps })
    return
  }
  if (field === 'line_items' && object.object === 'checkout.session') {
    const data = fake.books.asideOf(String(object.id)).lines
    const url = `/v1/checkout/sessions/${object.id}/line_items`
    object.line_items = { object: 'list', data, has_more: false, url }
    return
  }
  const kind = REFERENCES[field]
  if (!kind || !(field in object)) throw invalidRequest(`This property cannot be expanded (${way.path}).`)
  if (typeof object[field] === 'string') object[field] = fake.books.find(kind, object[field])
  if (object[field]) follow(fake, object[field] as Record<string, unknown>, { ...way, steps })
}
