const inks = { stamp: 'border-stamp text-stamp', paid: 'border-paid text-paid' }

/** A rubber stamp. Decoration: the fact stands beside it in plain text. */
export function Stamp({ word, ink }: { word: string; ink: keyof typeof inks }) {
  return (
    <span
      aria-hidden="true"
      className={`stamping stamp-turn inline-block rounded-[4px] border-[3px] px-3 py-0.5 font-display text-xl font-extrabold uppercase tracking-[0.06em] ${inks[ink]}`}
    >
      {word}
    </span>
  )
}
