type Cell = string | number | { cents: number }

/** First characters by which a spreadsheet takes a text for a formula, the full-width forms included. */
const FORMULA = /^[=+\-@\t\r\n\0＝＋－＠]/

/**
 * One row as RFC 4180 has it: quoted where needed, ended by CR LF. A text that a spreadsheet would run as a
 * formula gets an apostrophe in front; numbers stay numbers.
 */
export function csvLine(cells: Cell[]): string {
  return `${cells.map(toCell).join(',')}\r\n`
}

function toCell(cell: Cell): string {
  if (typeof cell === 'number') return String(cell)
  if (typeof cell === 'object')
    return `${Math.trunc(cell.cents / 100)}.${String(cell.cents % 100).padStart(2, '0')}`
  const safe = FORMULA.test(cell) ? `'${cell}` : cell
  return /[",\r\n]/.test(safe) || safe !== cell ? `"${safe.replaceAll('"', '""')}"` : safe
}
