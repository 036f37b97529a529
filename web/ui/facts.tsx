import type { ReactNode } from 'react'

/** Facts on ruled lines. */
export function Facts({ rows }: { rows: { name: string; value: ReactNode }[] }) {
  return (
    <dl className="grid content-start">
      {rows.map(row => (
        <div
          key={row.name}
          className="grid grid-cols-[6.6rem_1fr] gap-x-3 border-b border-rule py-2.5 sm:grid-cols-[8rem_1fr]"
        >
          <dt className="text-[0.88em] font-semibold text-ink-soft">{row.name}</dt>
          <dd className="font-semibold">{row.value}</dd>
        </div>
      ))}
    </dl>
  )
}
