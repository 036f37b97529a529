import type { ReactNode, Ref } from 'react'

const looks = {
  calm: 'border-frost',
  problem: 'border-stamp',
  good: 'border-paid',
}

/** A few words about what happened, what was kept and what to do. `problem` is announced at once. */
export function Notice(props: {
  look?: keyof typeof looks
  title?: string | undefined
  children?: ReactNode
  ref?: Ref<HTMLDivElement>
}) {
  const look = props.look ?? 'calm'
  return (
    <div
      ref={props.ref}
      tabIndex={-1}
      role={look === 'problem' ? 'alert' : 'status'}
      className={`rounded-sm border-2 border-l-8 bg-sheet px-4 py-3 ${looks[look]}`}
    >
      {props.title && <p className="font-bold">{props.title}</p>}
      {props.children && <div className="grid gap-2">{props.children}</div>}
    </div>
  )
}
