import { type InputHTMLAttributes, type ReactNode, type SelectHTMLAttributes, useId } from 'react'

const box =
  'w-full min-h-12 rounded-sm border-[1.5px] border-field bg-sheet px-3 py-2 text-ink aria-invalid:border-stamp aria-invalid:border-2'

type Shared = { label: string; hint?: ReactNode | undefined; problem?: string | undefined }

/** A label above, a hint and a problem below, all tied to the field. */
function Field(props: Shared & { id: string; children: ReactNode }) {
  return (
    <div className="grid gap-1">
      <label htmlFor={props.id} className="font-semibold">
        {props.label}
      </label>
      {props.children}
      {props.hint && (
        <p id={`${props.id}-hint`} className="text-[0.9em] text-ink-soft">
          {props.hint}
        </p>
      )}
      {props.problem && (
        <p id={`${props.id}-problem`} className="flex gap-2 font-semibold text-stamp">
          <span aria-hidden="true">▲</span>
          {props.problem}
        </p>
      )}
    </div>
  )
}

function describedBy(id: string, props: Shared): string | undefined {
  const ids = [props.hint && `${id}-hint`, props.problem && `${id}-problem`].filter(Boolean)
  return ids.length > 0 ? ids.join(' ') : undefined
}

export function TextField({ label, hint, problem, ...rest }: Shared & InputHTMLAttributes<HTMLInputElement>) {
  const own = useId()
  const id = rest.id ?? own
  return (
    <Field id={id} label={label} hint={hint} problem={problem}>
      <input
        {...rest}
        id={id}
        className={box}
        aria-invalid={problem ? true : undefined}
        aria-describedby={describedBy(id, { label, hint, problem })}
      />
    </Field>
  )
}

export function SelectField({
  label,
  hint,
  problem,
  children,
  ...rest
}: Shared & SelectHTMLAttributes<HTMLSelectElement> & { children: ReactNode }) {
  const own = useId()
  const id = rest.id ?? own
  return (
    <Field id={id} label={label} hint={hint} problem={problem}>
      <select
        {...rest}
        id={id}
        className={box}
        aria-invalid={problem ? true : undefined}
        aria-describedby={describedBy(id, { label, hint, problem })}
      >
        {children}
      </select>
    </Field>
  )
}

export function CheckField({
  label,
  hint,
  ...rest
}: { label: ReactNode; hint?: ReactNode } & InputHTMLAttributes<HTMLInputElement>) {
  const id = useId()
  return (
    <div className="grid grid-cols-[auto_1fr] gap-x-3">
      <input
        {...rest}
        id={id}
        type="checkbox"
        className="mt-1 size-6 accent-action"
        aria-describedby={hint ? `${id}-hint` : undefined}
      />
      <label htmlFor={id} className="min-h-11 py-0.5 font-semibold">
        {label}
      </label>
      {hint && (
        <p id={`${id}-hint`} className="col-start-2 text-[0.9em] text-ink-soft">
          {hint}
        </p>
      )}
    </div>
  )
}
