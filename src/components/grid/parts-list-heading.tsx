import type { CustomInnerHeaderProps } from 'ag-grid-react'

export interface PartsListHeadingProps extends CustomInnerHeaderProps {
  /** The unit under the heading, softer; empty where there is none. */
  unitText: string
  fullName: string
}

/** Over a column: the symbol, its unit under it, and its name for those who hear the table. */
export function PartsListHeading({ displayName, unitText, fullName }: PartsListHeadingProps) {
  return (
    <span className="leading-tight">
      {displayName === fullName ? (
        <span>{displayName}</span>
      ) : (
        <>
          <span aria-hidden="true" className="parts-list-symbol">
            {displayName}
          </span>
          <span className="parts-list-name sr-only">{fullName}</span>
        </>
      )}
      {unitText ? <span className="text-ink-soft block text-xs font-normal">{unitText}</span> : null}
    </span>
  )
}
