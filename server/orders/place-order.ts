import { createHash, randomBytes } from 'node:crypto'
import { AppError } from '#shared/errors.ts'
import { makeOrderNumber } from '#shared/ids.ts'
import { refusal } from '#shared/messages/refusals.ts'
import type { PlacedOrder, PlaceOrderInput } from '#shared/orders/contract.ts'
import { DEFAULT_ORDER_LIMITS } from '#shared/pricing/limits.ts'
import { priceOrder } from '#shared/pricing/order-total.ts'
import { logActivity } from '../activity/log-activity.ts'
import { keptCatalog } from '../catalogs/kept-catalog.ts'
import { inTransaction, type Tx } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { hit } from '../faults.ts'
import { newPublicId } from '../ids.ts'
import { findStore, type Store } from '../stores/queries.ts'
import { statusOf } from '../stores/store-view.ts'
import { insertOrder, type NewLine } from './insert-order.ts'
import { findOrderByKey, type OrderRow } from './queries.ts'
import { replaceOrder } from './replace-order.ts'
import { startOrderPayment } from './start-payment.ts'

type Placing = { token: string; key: string; input: PlaceOrderInput; requestId: string }

/** Orders being placed by this process right now, so that a second request with the key waits for the first. */
const underWay = new Map<string, { hash: string; answer: Promise<PlacedOrder> }>()

/**
 * Takes an order: decides its price, writes it down, and opens the payment service's page for it.
 *
 * The same key gives the same order, however often and from wherever it is asked again; the same key with
 * another content is refused. Nothing is placed at or after the close, judged by our clock under the lock.
 *
 * @throws AppError not_found, store_*, invalid_input, item_unavailable, total_changed, key_reused,
 *   in_progress, payments_stopped, payment_service_unreachable.
 */
export async function placeOrder(deps: Deps, placing: Placing): Promise<PlacedOrder> {
  hit('F01')
  const hash = createHash('sha256').update(JSON.stringify(placing.input)).digest('base64url')
  const flight = `${placing.token}\n${placing.key}`
  const current = underWay.get(flight)
  if (current) {
    if (current.hash !== hash) throw new AppError('key_reused')
    return current.answer
  }
  const answer = place(deps, placing, hash)
  underWay.set(flight, { hash, answer })
  try {
    return await answer
  } finally {
    underWay.delete(flight)
  }
}

async function place(deps: Deps, placing: Placing, hash: string): Promise<PlacedOrder> {
  const order = inTransaction(deps.db, tx => writeOrder(deps, tx, placing, hash))
  hit('F03')
  const session = await startOrderPayment(deps, order)
  hit('F06')
  if (placing.input.replaces) await replaceOrder(deps, { old: placing.input.replaces, by: order })
  return {
    orderNumber: order.number,
    totalCents: order.totalCents,
    payUrl: session.url,
    receiptUrl: `${deps.config.publicUrl}/r/${order.publicId}`,
  }
}

function writeOrder(deps: Deps, tx: Tx, placing: Placing, hash: string): OrderRow {
  const now = deps.now()
  const store = findStore(tx, placing.token)
  if (!store) throw new AppError('not_found')
  const known = findOrderByKey(tx, store.linkId, placing.key)
  if (known) {
    if (known.requestHash !== hash) throw new AppError('key_reused')
    return known
  }
  refuseUnlessOpen(store, now)
  const { priced, lines } = price(deps, store, placing.input, now)
  const row = insertOrder(tx, {
    order: {
      publicId: newPublicId(),
      number: makeOrderNumber(randomBytes(16)),
      driveId: store.driveId,
      termsId: store.termsId,
      linkId: store.linkId,
      idempotencyKey: placing.key,
      requestHash: hash,
      locale: placing.input.locale,
      currency: store.currency,
      itemCount: priced.itemCount,
      itemsCents: priced.itemsCents,
      giftCents: priced.giftCents,
      taxCents: priced.taxCents,
      coverCents: priced.coverCents,
      totalCents: priced.totalCents,
      feeCents: priced.feeCents,
      placedAt: now,
    },
    customer: placing.input.customer,
    lines,
  })
  logActivity(tx, {
    at: now,
    driveId: store.driveId,
    actor: 'customer',
    action: 'order_placed',
    subject: `order:${row.publicId}`,
    after: { status: row.status, totalCents: row.totalCents },
    requestId: placing.requestId,
  })
  return row
}

function refuseUnlessOpen(store: Store, now: number) {
  const status = statusOf(store, now)
  if (status === 'not_open') throw new AppError('store_not_open')
  if (status === 'paused') throw new AppError('store_paused')
  if (status === 'closed') throw new AppError('store_closed')
  if (store.paymentsStoppedAt !== null) throw new AppError('payments_stopped')
}

function price(deps: Deps, store: Store, input: PlaceOrderInput, now: number) {
  const catalog = keptCatalog(
    deps.db,
    { versionId: store.catalogVersionId, catalogId: store.catalogId, locale: 'en' },
    now,
  )
  const gone: { path: string; message: string }[] = []
  const lines = input.lines.flatMap((line, index) => {
    const item = catalog.byCode.get(line.itemCode)
    if (item?.available) return [{ line, item }]
    gone.push({
      path: `lines.${index}.itemCode`,
      message: refusal('itemNoLongerAvailable', { code: line.itemCode }),
    })
    return []
  })
  if (gone.length > 0) throw new AppError('item_unavailable', { errors: gone })

  const result = priceOrder({
    lines: lines.map(({ line, item }) => ({
      itemCode: line.itemCode,
      quantity: line.quantity,
      unitPriceCents: item.priceCents,
      taxCategory: item.taxCategory,
    })),
    giftCents: input.giftCents,
    coverFee: input.coverFee,
    tax: JSON.parse(store.tax),
    fee: { rateBp: store.feeRateBp, fixedCents: store.feeFixedCents },
    limits: DEFAULT_ORDER_LIMITS,
  })
  if (!result.ok)
    throw new AppError('invalid_input', {
      errors: result.problems.map(problem => ({ path: problem.path, message: limitSentence(problem.code) })),
    })
  if (result.order.totalCents !== input.quotedTotalCents)
    throw new AppError('total_changed', { totalCents: result.order.totalCents })

  const newLines: NewLine[] = lines.map(({ line, item }, index) => {
    const pricedLine = result.order.lines[index]!
    return {
      sellerId: store.sellerId,
      itemId: item.id,
      code: item.code,
      name: item.text.name,
      unitPriceCents: item.priceCents,
      quantity: line.quantity,
      amountCents: pricedLine.amountCents,
      taxCents: pricedLine.taxCents,
      tallyMarks: item.tallyMarks,
      contains: JSON.stringify(item.safety.contains),
      containsNone: item.safety.containsNone,
      mayContain: JSON.stringify(item.safety.mayContain),
      storage: item.safety.storage,
      bestQualityMin: item.safety.bestQualityMonths?.[0] ?? null,
      bestQualityMax: item.safety.bestQualityMonths?.[1] ?? null,
      recipientLabel: line.recipientLabel ?? null,
    }
  })
  return { priced: result.order, lines: newLines }
}

function limitSentence(code: string): string {
  const sentences: Record<string, string> = {
    empty_order: refusal('chooseAtLeastOneItemOr'),
    too_many_lines: refusal('anOrderHasAtMost60'),
    too_many_items: refusal('anOrderHasAtMost200'),
    quantity_out_of_range: refusal('aQuantityIsAWholeNumber'),
    order_too_large: refusal('anOrderIsAtMost500000'),
    gift_out_of_range: refusal('aGiftIsFrom100To'),
  }
  return sentences[code] ?? refusal('pleaseCheckThis')
}
