/** A four-digit code in boxes, as on a form, so that no digit is misread. */
export function ItemCode({ code, className = '' }: { code: string; className?: string }) {
  return (
    <span className={`inline-flex rounded-[2px] border border-ink align-[0.12em] ${className}`}>
      <span className="sr-only">{code}</span>
      {[...code].map((digit, place) => (
        <span
          key={place}
          aria-hidden="true"
          className="tabular grid h-[1.45em] w-[1.15em] place-items-center border-r border-rule text-[0.84em] font-semibold leading-none last:border-r-0"
        >
          {digit}
        </span>
      ))}
    </span>
  )
}
