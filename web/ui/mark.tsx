/** The sign of the house: four strokes and a slash. */
export function Mark({ className = '' }: { className?: string }) {
  return (
    <svg
      className={className}
      width="36"
      height="28"
      viewBox="0 0 36 28"
      fill="none"
      strokeWidth="3.2"
      strokeLinecap="round"
      aria-hidden="true"
    >
      <path className="stroke-ink" d="M7 4.2v19.6M14 3.6v20.6M21 4v20M28 3.8v19.8" />
      <path className="stroke-stamp" d="M2 20.5 34 7" />
    </svg>
  )
}
