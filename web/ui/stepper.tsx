import { useEffect, useState } from 'react'

type StepperProps = {
  value: number
  max: number
  onChange: (value: number) => void
  labels: { group: string; less: string; more: string; amount: string }
}

/** A quantity by its two buttons or by typing. What is typed counts once it is a whole number in range. */
export function Stepper({ value, max, onChange, labels }: StepperProps) {
  const [typed, setTyped] = useState(String(value))
  useEffect(() => setTyped(String(value)), [value])
  const button =
    'grid size-[2.9rem] place-items-center text-2xl font-semibold leading-none hover:bg-desk disabled:opacity-40'
  return (
    <fieldset className="inline-flex overflow-hidden rounded-sm border-[1.5px] border-ink bg-sheet">
      <legend className="sr-only">{labels.group}</legend>
      <button type="button" className={button} aria-label={labels.less} onClick={() => onChange(value - 1)}>
        −
      </button>
      <input
        className="tabular w-[2.9rem] border-x border-rule bg-sheet text-center text-xl font-semibold"
        aria-label={labels.amount}
        inputMode="numeric"
        autoComplete="off"
        value={typed}
        onChange={event => {
          const text = event.target.value
          setTyped(text)
          if (/^\d{1,2}$/.test(text) && Number(text) >= 1 && Number(text) <= max) onChange(Number(text))
        }}
        onBlur={() => {
          if (/^0+$/.test(typed)) onChange(0)
          setTyped(String(value))
        }}
      />
      <button
        type="button"
        className={button}
        aria-label={labels.more}
        disabled={value >= max}
        onClick={() => onChange(value + 1)}
      >
        +
      </button>
    </fieldset>
  )
}
