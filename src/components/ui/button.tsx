import Link from 'next/link'
import type { ComponentProps } from 'react'
import { classNames } from './class-names'

const base =
  'inline-flex items-center justify-center gap-2 rounded-[3px] font-semibold whitespace-nowrap select-none disabled:opacity-50 disabled:cursor-not-allowed'

const variants = {
  primary: 'bg-accent text-on-accent hover:bg-accent-strong',
  secondary: 'border border-accent text-accent bg-sheet hover:bg-accent-wash',
  quiet: 'text-accent hover:bg-accent-wash',
  danger: 'border border-collision text-collision bg-sheet hover:bg-collision-wash',
} as const

const sizes = {
  /** 44 px high: the least for a finger. */
  standard: 'min-h-11 px-4 text-base',
  /** Dense tool bars on a desk; still 44 px high where the pointer is a finger. */
  compact: 'min-h-9 px-3 text-[0.9375rem] pointer-coarse:min-h-11',
  /** Gloves, at the counter and at the machine. */
  counter: 'min-h-16 px-6 text-lg',
} as const

export interface ButtonLook {
  variant?: keyof typeof variants
  size?: keyof typeof sizes
}

export function buttonClass(
  { variant = 'secondary', size = 'standard' }: ButtonLook,
  extra?: string,
): string {
  return classNames(base, variants[variant], sizes[size], extra)
}

export function Button({
  variant,
  size,
  className,
  type = 'button',
  ...rest
}: ButtonLook & ComponentProps<'button'>) {
  return <button type={type} className={buttonClass({ variant, size }, className)} {...rest} />
}

export function ButtonLink({ variant, size, className, ...rest }: ButtonLook & ComponentProps<typeof Link>) {
  return <Link className={buttonClass({ variant, size }, className)} {...rest} />
}
