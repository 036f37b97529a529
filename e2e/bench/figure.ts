/** One row of the bench: ours against the bare equivalent of the same run. */
export type Row = {
  name: string
  unit: string
  value: number
  limit: number
  ratio: number
  /** A sign and a number, such as ">=0.5". */
  goal: string
  pass: boolean
}

export type Figure = {
  name: string
  unit: string
  goal: string
  measure: () => Promise<{ ours: number; bare: number }>
}

/** Whether a ratio holds a goal such as ">=0.5" or "<=1.15". */
export function holds(ratio: number, goal: string): boolean {
  const match = /^(>=|<=)([\d.]+)$/.exec(goal)
  if (!match) throw new Error(`${goal} is no goal`)
  return match[1] === '>=' ? ratio >= Number(match[2]) : ratio <= Number(match[2])
}

export async function toRow(figure: Figure): Promise<Row> {
  const { ours, bare } = await figure.measure()
  const ratio = ours / bare
  const rounded = (n: number) => Math.round(n * 1000) / 1000
  return {
    name: figure.name,
    unit: figure.unit,
    value: rounded(ours),
    limit: rounded(bare),
    ratio: rounded(ratio),
    goal: figure.goal,
    pass: holds(ratio, figure.goal),
  }
}

export function median(numbers: number[]): number {
  const sorted = [...numbers].sort((a, b) => a - b)
  return sorted[Math.floor(sorted.length / 2)]!
}
