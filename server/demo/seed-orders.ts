import { makeOrderNumber } from '#shared/ids.ts'
import { DEFAULT_ORDER_LIMITS } from '#shared/pricing/limits.ts'
import { priceOrder } from '#shared/pricing/order-total.ts'
import { keptCatalog } from '../catalogs/kept-catalog.ts'
import type { Tx } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { insertOrder, type NewLine } from '../orders/insert-order.ts'
import { listLines } from '../orders/queries.ts'
import { applyRefund, reserveRefund } from '../orders/refund-order.ts'
import { settlePayment } from '../orders/settle-payment.ts'
import { rememberSession } from '../orders/start-payment.ts'
import { demoId, demoRandom } from './demo-ids.ts'
import { customers } from './people.ts'
import type { SeededDrive } from './seed-drive.ts'

const DAY_MS = 86_400_000

type DemoOrder = { sellerId: number; linkId: number; at: number; serial: number }

/** Orders of a drive from its opening until `until`, by the product's own deeds, some of them given back. */
export function seedOrders(
  deps: Deps,
  tx: Tx,
  drive: SeededDrive,
  options: { catalogId: number; until: number; perSeller: number; seed: number },
) {
  const random = demoRandom(options.seed)
  const days = Math.max(1, Math.floor((options.until - drive.opensAt) / DAY_MS))
  const orders: DemoOrder[] = []
  let serial = 0
  for (const seller of [...drive.sellers, ...drive.houses]) {
    const count = random.below(options.perSeller * 2 + 1)
    for (let n = 0; n < count; n++) {
      serial += 1
      // In the waking hours of a day, and never later than now.
      const at = drive.opensAt + random.below(days) * DAY_MS + random.below(13 * 60) * 60_000
      orders.push({
        sellerId: seller.id,
        linkId: seller.link.id,
        at: Math.min(at, options.until - 60_000),
        serial,
      })
    }
  }
  orders.sort((a, b) => a.at - b.at)
  for (const order of orders) seedOrder(deps, tx, drive, { ...options, ...order, random })
}

type Random = ReturnType<typeof demoRandom>

function seedOrder(
  deps: Deps,
  tx: Tx,
  drive: SeededDrive,
  order: DemoOrder & { catalogId: number; seed: number; random: Random },
) {
  const { random, at } = order
  const key = `${order.seed}-${order.serial}`
  const then: Deps = { ...deps, now: () => at }
  const catalog = keptCatalog(
    deps.db,
    { versionId: drive.catalogVersionId, catalogId: order.catalogId, locale: 'en' },
    at,
  )
  const customer = customers[random.below(customers.length)]!
  const chosen = new Map<string, number>()
  for (let n = random.below(3) + 1; n > 0; n--)
    chosen.set(catalog.items[random.below(catalog.items.length)]!.code, random.below(3) + 1)
  const giftCents = random.below(6) === 0 ? 500 * (1 + random.below(4)) : 0
  const items = [...chosen].map(([code, quantity]) => ({ item: catalog.byCode.get(code)!, quantity }))
  const priced = priceOrder({
    lines: items.map(({ item, quantity }) => ({
      itemCode: item.code,
      quantity,
      unitPriceCents: item.priceCents,
      taxCategory: item.taxCategory,
    })),
    giftCents,
    coverFee: random.below(3) === 0,
    tax: { mode: 'none' },
    fee: { rateBp: drive.terms.feeRateBp, fixedCents: drive.terms.feeFixedCents },
    limits: DEFAULT_ORDER_LIMITS,
  })
  if (!priced.ok) throw new Error('a demonstration order cannot be priced')
  const lines: NewLine[] = items.map(({ item, quantity }, place) => ({
    sellerId: order.sellerId,
    itemId: item.id,
    code: item.code,
    name: item.text.name,
    unitPriceCents: item.priceCents,
    quantity,
    amountCents: priced.order.lines[place]!.amountCents,
    taxCents: 0,
    tallyMarks: item.tallyMarks,
    contains: JSON.stringify(item.safety.contains),
    containsNone: item.safety.containsNone,
    mayContain: JSON.stringify(item.safety.mayContain),
    storage: item.safety.storage,
    bestQualityMin: item.safety.bestQualityMonths?.[0] ?? null,
    bestQualityMax: item.safety.bestQualityMonths?.[1] ?? null,
    recipientLabel: null,
  }))
  const row = insertOrder(tx, {
    order: {
      publicId: demoId(`order ${key}`),
      number: makeOrderNumber(random.bytes(8)),
      driveId: drive.id,
      termsId: drive.termsId,
      linkId: order.linkId,
      idempotencyKey: `demonstration-${key}`,
      requestHash: key,
      locale: 'en',
      currency: 'usd',
      itemCount: priced.order.itemCount,
      itemsCents: priced.order.itemsCents,
      giftCents: priced.order.giftCents,
      taxCents: 0,
      coverCents: priced.order.coverCents,
      totalCents: priced.order.totalCents,
      feeCents: priced.order.feeCents,
      placedAt: at,
    },
    customer,
    lines,
  })
  const session = {
    sessionId: `cs_test_${demoId(`session ${key}`)}`,
    url: null,
    status: 'complete' as const,
    paid: true,
    amountTotalCents: row.totalCents,
    currency: 'usd',
    expiresAt: at + 1_800_000,
    paymentIntentId: `pi_${demoId(`payment ${key}`).replaceAll(/[-_]/g, 'x')}`,
    orderPublicId: row.publicId,
    metadata: {},
  }
  rememberSession(tx, row.id, session, at)
  settlePayment(tx, then, row, session)
  if (order.serial % 23 === 0) seedRefund(then, tx, row, { whole: order.serial % 46 === 0 })
}

/** Every so often an order, or a line of one, was given back two hours later. */
function seedRefund(then: Deps, tx: Tx, row: { id: number; publicId: string }, options: { whole: boolean }) {
  const later: Deps = { ...then, now: () => then.now() + 60_000 }
  const first = listLines(tx, row.id)[0]!
  const reserved = reserveRefund(later, tx, {
    orderPublicId: row.publicId,
    what: options.whole ? 'everything' : [{ lineId: first.id, quantity: 1 }],
    reason: options.whole ? 'Ordered twice by mistake' : 'One too many',
    actor: null,
  })
  applyRefund(later, tx, reserved, `re_${row.publicId.replaceAll(/[-_]/g, 'x')}`)
}
