import { CircleCheck, CircleX, Info, TriangleAlert } from 'lucide-react'
import type { ReactNode } from 'react'
import { classNames } from './class-names'

const kinds = {
  collision: { look: 'border-collision bg-collision-wash text-collision', Mark: CircleX },
  caution: { look: 'border-caution bg-caution-wash text-caution', Mark: TriangleAlert },
  holds: { look: 'border-holds bg-holds-wash text-holds', Mark: CircleCheck },
  plain: { look: 'border-ink-soft bg-well text-ink', Mark: Info },
} as const

export interface NoticeProps {
  kind: keyof typeof kinds
  children: ReactNode
  className?: string
  /** Said aloud when it appears: for what a person's act just brought about. */
  isAnnounced?: boolean
}

/** A sentence that must be seen: a mark and words, the colour only beside them. */
export function Notice({ kind, children, className, isAnnounced }: NoticeProps) {
  const { look, Mark } = kinds[kind]
  return (
    <div
      className={classNames('flex gap-2.5 border-l-4 px-3 py-2', look, className)}
      role={isAnnounced ? (kind === 'collision' ? 'alert' : 'status') : undefined}
    >
      <Mark aria-hidden="true" className="mt-0.5 size-5 shrink-0" />
      <div className="text-ink min-w-0">{children}</div>
    </div>
  )
}
