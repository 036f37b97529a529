import type { FamilyInvitationMail } from '../family-invitation.tsx'
import type { GuardianNotice } from '../guardian-notice.tsx'
import type { RefundNotice } from '../order-canceled.tsx'
import type { ReceiptLine, ReceiptMail } from '../receipt.tsx'
import type { TeamInvitationMail } from '../team-invitation.tsx'

/** Mails of the invented drive, for tests and for looking at. Every person and item is made up. */

const item = (
  itemCode: string,
  name: string,
  unitPriceCents: number,
  contains: string[],
  rest: Partial<ReceiptLine & { mayContain: string[] }> = {},
): ReceiptLine => {
  const { mayContain = [], quantity = 1, ...others } = rest
  return {
    itemCode,
    name,
    unitPriceCents,
    quantity,
    amountCents: quantity * unitPriceCents,
    recipientLabel: null,
    allergens: { contains, containsNone: contains.length === 0, mayContain },
    storage: 'frozen_ready',
    bestQualityMonths: null,
    ...others,
  }
}

export const chowder = item('1204', 'Sweet corn chowder', 1600, ['milk'], {
  quantity: 2,
  mayContain: ['wheat'],
  storage: 'frozen_to_cook',
})
export const dough = item('6521', 'Oat and cherry cookie dough', 2000, ['wheat', 'egg', 'milk'], {
  recipientLabel: 'Ana',
  mayContain: ['tree_nut:pecan'],
  storage: 'frozen_raw_dough',
  bestQualityMonths: [12, 12],
})
export const pretzels = item('4013', 'Soft salted pretzels', 1500, ['wheat'], {
  mayContain: ['milk', 'sesame'],
  bestQualityMonths: [9, 9],
})

export const tenLines: ReceiptLine[] = [
  chowder,
  item('1357', 'Harbor fish chowder', 1900, ['milk', 'fish:cod', 'fish:haddock'], {
    mayContain: ['crustacean:shrimp'],
    storage: 'frozen_to_cook',
  }),
  item('2318', 'Apple and cardamom hand pies', 1800, ['wheat'], {
    quantity: 3,
    mayContain: ['tree_nut:pecan'],
    bestQualityMonths: [8, 8],
  }),
  item('2790', 'Pecan and maple hand pies', 1950, ['tree_nut:pecan', 'wheat', 'egg', 'milk'], {
    bestQualityMonths: [1, 2],
  }),
  item('3265', 'Shrimp and chive dumplings', 1700, ['wheat', 'soy', 'sesame', 'crustacean:shrimp'], {
    recipientLabel: 'the Okafors next door',
    storage: 'frozen_to_cook',
    bestQualityMonths: [12, 12],
  }),
  pretzels,
  item('4391', 'Butter knot rolls', 1400, ['wheat', 'milk'], { bestQualityMonths: [3, 5] }),
  item('5127', 'Buckwheat and honey waffles', 1450, ['egg', 'milk'], { bestQualityMonths: [3, 3] }),
  dough,
  item('6835', 'Lemon ice', 1300, [], { quantity: 2, bestQualityMonths: [9, 9] }),
]

/** A receipt whose sums fit its lines. */
export function aReceipt(changes: Partial<ReceiptMail> = {}): ReceiptMail {
  const lines = changes.lines ?? tenLines
  const itemsCents = lines.reduce((sum, line) => sum + line.amountCents, 0)
  const { giftCents = 500, taxCents = 0, coverCents = 742 } = changes
  return {
    locale: 'en',
    orderNumber: '4K7A-2MX9',
    customerName: 'Ruth Lindqvist',
    creditedTo: 'Maya L.',
    organizationName: 'Saltmarsh High Robotics',
    organizationShareBp: 4000,
    itemsCents,
    totalCents: itemsCents + giftCents + taxCents + coverCents,
    currency: 'usd',
    paidAt: Date.parse('2026-11-13T02:12:00Z'),
    timeZone: 'America/New_York',
    deliveryFrom: '2026-12-17',
    deliveryTo: '2026-12-18',
    receiptUrl: 'https://tallykin.example/r/q3Jx0ZrT9mWfKc2vLhB8Yg',
    contact: { name: 'Ms. Abara', email: 'abara@saltmarsh.example' },
    ...changes,
    lines,
    giftCents,
    taxCents,
    coverCents,
  }
}

export function aGuardianNotice(changes: Partial<GuardianNotice> = {}): GuardianNotice {
  return {
    locale: 'en',
    sellerFullName: 'Maya Lindqvist',
    sellerFirstName: 'Maya',
    customerName: 'Grandma Ruth',
    relationship: 'grandparent',
    lines: [
      { name: 'Sweet corn chowder', quantity: 2 },
      { name: 'Oat and cherry cookie dough', quantity: 1 },
    ],
    itemCount: 3,
    tallyNow: 13,
    prizeEvery: 10,
    itemsToNextPrize: 7,
    orderUrl: 'https://tallykin.example/family/sellers/Vt5#order-q3J',
    unknownPersonUrl: 'https://tallykin.example/family/sellers/Vt5#unknown-q3J',
    organizationName: 'Saltmarsh High Robotics',
    timeZone: 'America/New_York',
    placedAt: Date.parse('2026-11-13T02:09:00Z'),
    ...changes,
  }
}

export function aRefundNotice(changes: Partial<RefundNotice> = {}): RefundNotice {
  return {
    locale: 'en',
    orderNumber: '4K7A-2MX9',
    customerName: 'Ruth Lindqvist',
    refundedCents: 3200,
    currency: 'usd',
    lines: [{ name: 'Sweet corn chowder', quantity: 2 }],
    whole: false,
    remainingTotalCents: 2500,
    receiptUrl: 'https://tallykin.example/r/q3Jx0ZrT9mWfKc2vLhB8Yg',
    contact: { name: 'Ms. Abara', email: 'abara@saltmarsh.example' },
    ...changes,
  }
}

export function aFamilyInvitation(changes: Partial<FamilyInvitationMail> = {}): FamilyInvitationMail {
  return {
    locale: 'en',
    sellerFullName: 'Maya Lindqvist',
    organizationName: 'Saltmarsh High Robotics',
    inviterName: 'Ms. Abara',
    url: 'https://tallykin.example/invitation#8sWq',
    days: 14,
    ...changes,
  }
}

export function aTeamInvitation(changes: Partial<TeamInvitationMail> = {}): TeamInvitationMail {
  return {
    locale: 'en',
    role: 'treasurer',
    driveName: 'Winter Larder',
    organizationName: 'Saltmarsh High Robotics',
    inviterName: 'Ms. Abara',
    url: 'https://tallykin.example/invitation#8sWq',
    days: 7,
    ...changes,
  }
}
