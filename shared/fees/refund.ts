import { shareCents } from '../money.ts'

export type RefundableOrder = {
  lines: {
    id: number
    quantity: number
    unitPriceCents: number
    taxCents: number
    refundedQuantity: number
    /** Price and tax already given back for this line. */
    refundedCents: number
  }[]
  giftCents: number
  coverCents: number
  totalCents: number
  refundedCents: number
}

export type DecidedRefund = {
  ok: true
  lines: { id: number; quantity: number; amountCents: number; taxCents: number }[]
  giftCents: number
  coverCents: number
  amountCents: number
}

/**
 * What giving back so many of certain lines returns: their price and their share of the tax. Only when nothing
 * of the order is left do the gift and the fee cover go back as well. `ok` is false when more is asked for than
 * is left, or nothing at all, or when `everything` is said but a piece is left out.
 */
export function refundAmount(request: {
  order: RefundableOrder
  wanted: readonly { lineId: number; quantity: number }[]
  everything: boolean
}): DecidedRefund | { ok: false } {
  const { order, wanted, everything } = request
  const lines: DecidedRefund['lines'] = []
  for (const { lineId, quantity } of wanted) {
    const line = order.lines.find(candidate => candidate.id === lineId)
    if (!line || quantity <= 0 || !Number.isInteger(quantity)) return { ok: false }
    if (lines.some(chosen => chosen.id === lineId)) return { ok: false }
    if (line.refundedQuantity + quantity > line.quantity) return { ok: false }
    const amountCents = quantity * line.unitPriceCents
    const taxCents = taxOfPieces(line, quantity)
    const paidCents = line.quantity * line.unitPriceCents + line.taxCents
    if (line.refundedCents + amountCents + taxCents > paidCents) return { ok: false }
    lines.push({ id: lineId, quantity, amountCents, taxCents })
  }
  const everyPiece = order.lines.every(line => {
    const now = lines.find(chosen => chosen.id === line.id)?.quantity ?? 0
    return line.refundedQuantity + now === line.quantity
  })
  if (everything && !everyPiece) return { ok: false }
  const leavesNothing = everyPiece && (everything || order.giftCents === 0)
  const giftCents = everything ? order.giftCents : 0
  const coverCents = leavesNothing ? order.coverCents : 0
  const amountCents =
    lines.reduce((sum, line) => sum + line.amountCents + line.taxCents, 0) + giftCents + coverCents
  if (amountCents <= 0 || order.refundedCents + amountCents > order.totalCents) return { ok: false }
  return { ok: true, lines, giftCents, coverCents, amountCents }
}

/** The tax of the next pieces of a line: piece by piece it adds up to the line's tax exactly. */
function taxOfPieces(line: RefundableOrder['lines'][number], quantity: number): number {
  const pieces = shareCents(
    line.taxCents,
    Array.from({ length: line.quantity }, () => 1),
  )
  return pieces
    .slice(line.refundedQuantity, line.refundedQuantity + quantity)
    .reduce((sum, cents) => sum + cents, 0)
}
