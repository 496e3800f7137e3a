'use client'

import { type ReactNode, useState } from 'react'

export interface FieldsFoldProps {
  summary: ReactNode
  /** Whether it stands open at first; afterwards the person decides. */
  isOpenAtFirst: boolean
  /** A fault inside is never folded away. */
  hasFault: boolean
  className?: string
  children: ReactNode
}

/** Fields that most checks don't need, a click away. */
export function FieldsFold({ summary, isOpenAtFirst, hasFault, className = '', children }: FieldsFoldProps) {
  const [isOpen, setIsOpen] = useState(isOpenAtFirst)
  return (
    <details open={isOpen || hasFault} onToggle={(event) => setIsOpen(event.currentTarget.open)}>
      <summary className="text-accent flex min-h-9 cursor-pointer items-center font-semibold pointer-coarse:min-h-11">
        {summary}
      </summary>
      <div className={`pt-2 ${className}`}>{children}</div>
    </details>
  )
}
