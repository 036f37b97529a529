import { randomBytes } from 'node:crypto'
import { Agent } from 'node:http'
import { join } from 'node:path'
import Database from 'better-sqlite3'
import express from 'express'
import { send } from './load.ts'

/**
 * The bare equivalent: Express, prepared statements, nothing else. It reads and writes a copy of the same
 * database at the same durability and makes the same call to the payment stand-in.
 */
const db = new Database(join(process.env.DATA_DIR!, 'tallykin.sqlite'))
db.pragma('journal_mode = WAL')
db.pragma('synchronous = FULL')
db.pragma('foreign_keys = ON')
const agent = new Agent({ keepAlive: true })
const app = express()
app.disable('x-powered-by')

const linkRow = db.prepare(
  `select l.id as link_id, s.id as seller_id, p.first_name, p.last_name, g.name as group_name, o.name as organization, d.*, t.id as terms_id, t.*
   from store_link l join seller s on s.id = l.seller_id left join seller_person p on p.seller_id = s.id
   left join seller_group g on g.id = s.group_id join drive d on d.id = l.drive_id
   join organization o on o.id = d.organization_id join drive_terms t on t.drive_id = d.id where l.token = ?`,
)
const itemRows = db.prepare(
  `select i.*, x.name, x.pieces, x.serves, x.description, x.preparation, r.contains, r.contains_none, r.may_contain, r.storage,
     r.best_quality_min, r.best_quality_max
   from catalog_item i join catalog_item_text x on x.item_id = i.id and x.locale = 'en'
   join safety_revision r on r.code = i.code where i.version_id = ? order by i.position`,
)
const categoryRows = db.prepare(
  'select slug, name_en as name from catalog_category where version_id = ? order by position',
)

app.get('/api/stores/:token', (req, res) => {
  const row = linkRow.get(req.params.token) as Record<string, any>
  const iso = (at: number) => new Date(at).toISOString()
  res.json({
    seller: { displayName: `${row.first_name} ${row.last_name[0]}.` },
    group: { name: row.group_name },
    organization: { name: row.organization },
    drive: {
      status: 'open',
      opensAt: iso(row.opens_at),
      closesAt: iso(row.closes_at),
      timeZone: row.time_zone,
      deliveryFrom: row.delivery_from,
      deliveryTo: row.delivery_to,
      currency: row.currency,
      purpose: row.purpose,
      shareBp: row.share_bp,
      organizationBearsCardFees: row.organization_bears_card_fees === 1,
      cardFee: { rateBp: row.fee_rate_bp, fixedCents: row.fee_fixed_cents },
      tax: JSON.parse(row.tax),
      contact: { name: row.contact_name, email: row.contact_email },
      limits: {
        maxLineQuantity: 99,
        maxLines: 60,
        maxItems: 200,
        maxOrderCents: 500_000,
        minGiftCents: 100,
        maxGiftCents: 100_000,
      },
    },
    serverNow: iso(Date.now()),
    categories: categoryRows.all(row.catalog_version_id),
    items: (itemRows.all(row.catalog_version_id) as Record<string, any>[]).map(item => ({
      code: item.code,
      name: item.name,
      category: item.category,
      priceCents: item.price_cents,
      netWeightG: item.net_weight_g,
      printedWeight: item.printed_weight,
      pieces: item.pieces,
      serves: item.serves,
      description: item.description,
      preparation: item.preparation,
      taxCategory: item.tax_category,
      allergens: {
        contains: JSON.parse(item.contains),
        containsNone: item.contains_none === 1,
        mayContain: JSON.parse(item.may_contain),
      },
      storage: item.storage,
      bestQualityMonths:
        item.best_quality_min === null ? null : [item.best_quality_min, item.best_quality_max],
      dietary: JSON.parse(item.dietary),
      picture:
        item.picture_hash === null
          ? null
          : {
              small: `/pictures/${item.picture_hash}-480.webp`,
              large: `/pictures/${item.picture_hash}-960.webp`,
              width: 480,
              height: 400,
            },
      available: item.available === 1,
    })),
  })
})

const byKey = db.prepare('select id from customer_order where link_id = ? and idempotency_key = ?')
const insertOrder = db.prepare(
  `insert into customer_order (public_id, number, drive_id, terms_id, link_id, status, idempotency_key, request_hash, locale, currency,
     item_count, items_cents, gift_cents, tax_cents, cover_cents, total_cents, fee_cents, placed_at)
   values (?, ?, ?, ?, ?, 'awaiting_payment', ?, ?, 'en', 'usd', ?, ?, 0, 0, 0, ?, 0, ?)`,
)
const insertCustomer = db.prepare(
  'insert into order_customer (order_id, name, email, relationship) values (?, ?, ?, ?)',
)
const insertRecipient = db.prepare(
  "insert into order_recipient (order_id, label, handover) values (?, null, 'seller_family')",
)
const insertLine = db.prepare(
  `insert into order_line (order_id, position, recipient_id, seller_id, item_id, code, name, unit_price_cents, quantity, amount_cents,
     tax_cents, tally_marks, contains, contains_none, may_contain, storage)
   values (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, 0, 1, ?, ?, ?, ?)`,
)
const insertActivity = db.prepare(
  "insert into activity (at, drive_id, actor, action, subject) values (?, ?, 'customer', 'order_placed', ?)",
)
const insertSession = db.prepare(
  'insert into payment_session (order_id, session_id, url, expires_at, payment_intent_id, created_at) values (?, ?, ?, ?, null, ?)',
)

app.post('/api/stores/:token/orders', express.json(), async (req, res) => {
  const key = String(req.headers['idempotency-key'])
  const body = req.body as {
    lines: { itemCode: string; quantity: number }[]
    customer: Record<string, string>
  }
  const now = Date.now()
  const publicId = randomBytes(16).toString('base64url')
  const place = db.transaction(() => {
    const row = linkRow.get(req.params.token) as Record<string, any>
    if (byKey.get(row.link_id, key)) throw new Error('known')
    const items = itemRows.all(row.catalog_version_id) as Record<string, any>[]
    const lines = body.lines.map(line => ({
      ...line,
      item: items.find(item => item.code === line.itemCode)!,
    }))
    const cents = lines.reduce((sum, line) => sum + line.quantity * line.item.price_cents, 0)
    const count = lines.reduce((sum, line) => sum + line.quantity, 0)
    const number = randomBytes(5).toString('hex')
    const id = Number(
      insertOrder.run(
        publicId,
        number,
        row.drive_id,
        row.terms_id,
        row.link_id,
        key,
        key,
        count,
        cents,
        cents,
        now,
      ).lastInsertRowid,
    )
    insertCustomer.run(id, body.customer.name, body.customer.email, body.customer.relationship)
    const recipient = insertRecipient.run(id).lastInsertRowid
    lines.forEach(({ item, quantity }, at) => {
      insertLine.run(
        id,
        at + 1,
        recipient,
        row.seller_id,
        item.id,
        item.code,
        item.name,
        item.price_cents,
        quantity,
        quantity * item.price_cents,
        item.contains,
        item.contains_none,
        item.may_contain,
        item.storage,
      )
    })
    insertActivity.run(now, row.drive_id, `order:${publicId}`)
    return { id, number, cents, lines }
  })
  const order = place.immediate()
  const form = new URLSearchParams({
    mode: 'payment',
    client_reference_id: publicId,
    customer_email: body.customer.email!,
    success_url: `http://localhost/r/${publicId}`,
    cancel_url: 'http://localhost/s/x',
    expires_at: String(Math.floor(now / 1000) + 31 * 60),
    'metadata[order]': publicId,
  })
  order.lines.forEach((line, at) => {
    form.set(`line_items[${at}][quantity]`, String(line.quantity))
    form.set(`line_items[${at}][price_data][currency]`, 'usd')
    form.set(`line_items[${at}][price_data][unit_amount]`, String(line.item.price_cents))
    form.set(`line_items[${at}][price_data][product_data][name]`, line.item.name)
  })
  const answer = await send(agent, new URL('/v1/checkout/sessions', process.env.STRIPE_API_BASE), {
    method: 'POST',
    headers: {
      Authorization: `Bearer ${process.env.STRIPE_SECRET_KEY}`,
      'Content-Type': 'application/x-www-form-urlencoded',
      'Idempotency-Key': `order_${publicId}`,
    },
    body: form.toString(),
  })
  const session = JSON.parse(answer.body) as { id: string; url: string; expires_at: number }
  db.transaction(() =>
    insertSession.run(order.id, session.id, session.url, session.expires_at * 1000, now),
  ).immediate()
  res.status(201).json({
    orderNumber: order.number,
    totalCents: order.cents,
    payUrl: session.url,
    receiptUrl: `http://localhost/r/${publicId}`,
  })
})

app.listen(Number(process.env.PORT), '127.0.0.1', () => process.send?.({ ready: true }))
