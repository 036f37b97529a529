import type { ButtonHTMLAttributes, ReactNode } from 'react'

type Look = 'primary' | 'plain' | 'danger' | 'quiet'

const looks: Record<Look, string> = {
  primary: 'bg-action text-on-action border-action font-display font-bold text-[1.15em] px-6 min-h-[3.4rem]',
  plain: 'bg-sheet text-ink border-ink font-semibold px-5 min-h-12 hover:bg-desk',
  danger: 'bg-sheet text-stamp border-stamp font-semibold px-5 min-h-12',
  quiet:
    'bg-transparent text-ink border-transparent underline underline-offset-4 font-semibold px-2 min-h-11',
}

export function buttonClass(look: Look, wide = false): string {
  return `inline-flex items-center justify-center gap-2 rounded-sm border-[1.5px] py-2 text-center leading-tight disabled:opacity-60 aria-busy:opacity-80 ${looks[look]} ${wide ? 'w-full' : ''}`
}

export function Button({
  look = 'plain',
  wide = false,
  className = '',
  type = 'button',
  ...rest
}: ButtonHTMLAttributes<HTMLButtonElement> & { look?: Look; wide?: boolean; children: ReactNode }) {
  return <button type={type} className={`${buttonClass(look, wide)} ${className}`} {...rest} />
}
