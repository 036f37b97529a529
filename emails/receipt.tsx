import { render } from '@react-email/render'
import type { Locale } from '#shared/wire.ts'
import type { FoodLine } from './food-facts.ts'
import { literalFacts } from './parts/literal.ts'
import type { Mail } from './parts/words.ts'
import { receiptFacts } from './receipt-facts.ts'
import { ReceiptInFull, ReceiptInShort } from './receipt-sheet.tsx'
import { receiptText } from './receipt-text.ts'

export type ReceiptLine = FoodLine & {
  quantity: number
  unitPriceCents: number
  amountCents: number
  recipientLabel: string | null
}

export type ReceiptMail = {
  locale: Locale
  orderNumber: string
  customerName: string
  /** The public name of who is credited: a seller, a group or the organization. */
  creditedTo: string
  organizationName: string
  /** Share of the price that the organization gets, in basis points. */
  organizationShareBp: number
  /** Whether card fees come off that share; they do unless said otherwise. */
  organizationBearsCardFees?: boolean
  lines: ReceiptLine[]
  itemsCents: number
  giftCents: number
  taxCents: number
  coverCents: number
  totalCents: number
  currency: string
  /** Milliseconds since 1970, and the zone of the drive. */
  paidAt: number
  timeZone: string
  deliveryFrom: string
  deliveryTo: string
  /** Who hands the food over: the seller's family, or the school for a group's store. */
  handover?: 'seller_family' | 'school'
  receiptUrl: string
  contact: { name: string; email: string }
}

/** Mail programs clip a message beyond about 102 kB, and what is clipped is the end: the storage statements. */
const MOST_BYTES = 100_000

/**
 * The one mail a customer gets on paying. A receipt too long for mail programs keeps totals, storage and the
 * address in its HTML and says where the rest is; its text part is always whole.
 */
export async function renderReceipt(props: ReceiptMail): Promise<Mail> {
  const mail = literalFacts(props)
  const facts = receiptFacts(mail)
  const whole = await render(<ReceiptInFull mail={mail} facts={facts} />)
  const fits = new TextEncoder().encode(whole).length < MOST_BYTES
  return {
    subject: facts.subject,
    html: fits ? whole : await render(<ReceiptInShort mail={mail} facts={facts} />),
    text: receiptText(mail, facts),
  }
}
