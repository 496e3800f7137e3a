import type { ReactNode } from 'react'
import type { LocationResponse } from '@/schemas/location'
import { Button } from '../ui/button'
import { type LocationNode, shortCode } from './location-tree'

export interface CabinetElevationProps {
  cabinet: LocationNode
  onOpen: (location: LocationResponse) => void
  /** Null for those who may not add. */
  onAdd: ((parent: LocationResponse) => void) | null
}

/** A cabinet from the front: drawers above each other, the bins of each side by side. */
export function CabinetElevation({ cabinet, onOpen, onAdd }: CabinetElevationProps) {
  const { location, children } = cabinet
  const drawers = children.filter((child) => child.location.kind === 'drawer')
  const bins = children.filter((child) => child.location.kind === 'bin')
  return (
    <article className="border-ink bg-sheet border-2" aria-label={`${location.code} ${location.name}`}>
      <header className="border-ink flex items-center justify-between gap-2 border-b px-3 py-1">
        <PlaceButton onClick={() => onOpen(location)}>
          <span className="text-lg">{location.code}</span>
          <span className="text-ink-soft ml-2 font-normal">{location.name}</span>
        </PlaceButton>
        {onAdd ? (
          <Button
            variant="quiet"
            size="compact"
            onClick={() => onAdd(location)}
            aria-label={`Add to ${location.code}`}
          >
            Add
          </Button>
        ) : null}
      </header>
      {bins.length > 0 ? <Bins bins={bins} parentCode={location.code} onOpen={onOpen} /> : null}
      {drawers.map((drawer) => (
        <div key={drawer.location.id} className="border-hairline flex border-b last:border-b-0">
          <div className="border-hairline flex w-16 shrink-0 flex-col items-start justify-center border-r px-3">
            <PlaceButton onClick={() => onOpen(drawer.location)}>{drawer.location.code}</PlaceButton>
          </div>
          <Bins bins={drawer.children} parentCode={drawer.location.code} onOpen={onOpen} />
          {onAdd ? (
            <button
              type="button"
              className="text-accent hover:bg-accent-wash ml-auto w-11 shrink-0 text-xl"
              aria-label={`Add a bin to ${drawer.location.code}`}
              onClick={() => onAdd(drawer.location)}
            >
              +
            </button>
          ) : null}
        </div>
      ))}
      {children.length === 0 ? <p className="text-ink-soft px-3 py-2 text-sm">Empty</p> : null}
    </article>
  )
}

function Bins({
  bins,
  parentCode,
  onOpen,
}: {
  bins: LocationNode[]
  parentCode: string
  onOpen: (location: LocationResponse) => void
}) {
  if (bins.length === 0) return <p className="text-ink-soft px-3 py-2 text-sm">No bins yet</p>
  return (
    <ul className="grid min-w-0 flex-1 grid-cols-6 sm:grid-cols-12">
      {bins.map(({ location }) => (
        <li key={location.id}>
          <button
            type="button"
            className="border-hairline text-accent hover:bg-accent-wash -mb-px h-9 w-full truncate border-r border-b px-0.5 text-sm pointer-coarse:h-11"
            aria-label={`Bin ${location.code}`}
            onClick={() => onOpen(location)}
          >
            {shortCode(location.code, parentCode)}
          </button>
        </li>
      ))}
    </ul>
  )
}

/** The name of a place, to be opened. */
export function PlaceButton({ onClick, children }: { onClick: () => void; children: ReactNode }) {
  return (
    <button
      type="button"
      className="text-accent min-h-9 text-left font-semibold hover:underline pointer-coarse:min-h-11"
      onClick={onClick}
    >
      {children}
    </button>
  )
}
