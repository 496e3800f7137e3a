import type { ReactNode } from 'react'

export interface PageHeadingProps {
  title: ReactNode
  /** One short line under the title. */
  note?: ReactNode
  /** What can be done here. */
  children?: ReactNode
}

/** The title line of a page: small, so that the thing itself comes first. */
export function PageHeading({ title, note, children }: PageHeadingProps) {
  return (
    <div className="flex flex-wrap items-end justify-between gap-x-6 gap-y-2 px-4 pt-4 pb-3 lg:px-6">
      <div className="min-w-0">
        <h1 className="text-2xl">{title}</h1>
        {note ? <p className="text-ink-soft max-w-[75ch] text-[0.9375rem]">{note}</p> : null}
      </div>
      {children ? <div className="flex flex-wrap items-center gap-2 print:hidden">{children}</div> : null}
    </div>
  )
}
