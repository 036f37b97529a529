import type { ReactNode } from 'react'

export type Ply = 'white' | 'canary' | 'pink' | 'goldenrod'

const bands: Record<Ply, string> = {
  white: 'bg-sheet text-ink double-rule',
  canary: 'bg-canary text-on-ply',
  pink: 'bg-pink text-on-ply',
  goldenrod: 'bg-goldenrod text-on-ply',
}
const edges: Record<Ply, string> = {
  white: 'border-t-[12px] border-ink',
  canary: 'border-t-[12px] border-canary',
  pink: 'border-t-[12px] border-pink',
  goldenrod: 'border-t-[12px] border-goldenrod',
}

/** A sheet of the pad. With `ply` it carries that ply's edge on top. */
export function Sheet(props: {
  ply?: Ply
  className?: string
  children: ReactNode
  as?: 'section' | 'div' | 'article'
  labelledBy?: string
}) {
  const Tag = props.as ?? 'div'
  return (
    <Tag
      aria-labelledby={props.labelledBy}
      className={`rounded-sm bg-sheet shadow-sheet ${props.ply ? edges[props.ply] : ''} ${props.className ?? ''}`}
    >
      {props.children}
    </Tag>
  )
}

/** The band that names a workspace or one of its sheets. */
export function Band(props: { ply: Ply; children: ReactNode; aside?: ReactNode }) {
  return (
    <div
      className={`flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1 px-5 py-3 ${bands[props.ply]}`}
    >
      {props.children}
      {props.aside && <span className="text-[0.95rem] font-semibold">{props.aside}</span>}
    </div>
  )
}
