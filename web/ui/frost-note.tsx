import type { ReactNode } from 'react'

/** Six arms of frost; the words come first and say the same. */
export function FrostMark() {
  return (
    <svg
      className="mt-[0.2em] size-[1.1em] shrink-0 stroke-frost"
      viewBox="0 0 20 20"
      fill="none"
      strokeWidth="2"
      strokeLinecap="round"
      aria-hidden="true"
    >
      <path d="M10 1.8v16.4M3 5.9l14 8.2M17 5.9 3 14.1M8.2 3.4 10 5l1.8-1.6M8.2 16.6 10 15l1.8 1.6" />
    </svg>
  )
}

/** Storage and allergen statements in a line, as on an item. */
export function FrostLine({ children }: { children: ReactNode }) {
  return (
    <p className="flex gap-2 text-[0.92em] leading-snug text-frost">
      <span>{children}</span>
      <FrostMark />
    </p>
  )
}

/** The same facts in a box of their own, as on the order and the receipt. */
export function FrostNote({
  title,
  children,
  level = 2,
}: {
  title: string
  children: ReactNode
  level?: 2 | 3
}) {
  const Heading = level === 2 ? 'h2' : 'h3'
  return (
    <section className="rounded-sm border-2 border-frost p-4 sm:p-5">
      <Heading className="flex items-start gap-2 text-xl text-frost">
        {title}
        <FrostMark />
      </Heading>
      <div className="mt-2 grid gap-2">{children}</div>
    </section>
  )
}
