/** A name in the boxes of a form: one letter each, a hatched gap for a space. */
export function LetterBoxes({ text }: { text: string }) {
  const letters = [...text.toUpperCase().replace(/\.$/, '')]
  return (
    <span
      role="img"
      aria-label={text}
      className="inline-flex max-w-full flex-wrap rounded-[2px] border-[1.5px] border-ink"
    >
      {letters.map((letter, place) =>
        letter === ' ' ? (
          <span key={place} aria-hidden="true" className="hatched w-3.5 border-r border-rule sm:w-5" />
        ) : (
          <span
            key={place}
            aria-hidden="true"
            className="tabular grid h-11 w-[2.1rem] place-items-center border-r border-rule text-2xl font-semibold last:border-r-0 sm:h-[3.25rem] sm:w-11 sm:text-3xl"
          >
            {letter}
          </span>
        ),
      )}
    </span>
  )
}
