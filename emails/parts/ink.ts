/** Colors and faces of the order pad, as far as every mail program has them. Nothing is fetched. */
export const colors = {
  ink: '#16245A',
  inkSoft: '#4A5780',
  desk: '#E6EDF4',
  sheet: '#FFFFFF',
  rule: '#B7C5D9',
  field: '#6E7FA3',
  stamp: '#B3261E',
  frost: '#0A6470',
  paid: '#1B6B3C',
} as const

export const plies = {
  white: '#FFFFFF',
  canary: '#FFE27A',
  pink: '#FFC9D4',
  goldenrod: '#F4B740',
} as const
export type Ply = keyof typeof plies

/** Unquoted on purpose: quotation marks in a style attribute are written as six characters each. */
export const faces = {
  serif: 'Besley, Rockwell, Georgia, serif',
  sans: 'Atkinson Hyperlegible Next, Atkinson Hyperlegible, -apple-system, Segoe UI, Roboto, Helvetica, Arial, sans-serif',
  mono: 'Atkinson Hyperlegible Mono, Consolas, Menlo, monospace',
} as const
