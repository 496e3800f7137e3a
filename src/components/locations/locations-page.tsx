'use client'

import { useState } from 'react'
import { useArchivedLocations, useLocations } from '@/hooks/use-locations'
import { faultSentence } from '@/lib/field-faults'
import type { LocationResponse } from '@/schemas/location'
import { PageHeading } from '../layout/page-heading'
import { useCan } from '../layout/shop-context'
import { Button } from '../ui/button'
import { StateSentence } from '../ui/state-sentence'
import { AddLocationDialog } from './add-location-dialog'
import { ArchivedPlaces } from './archived-places'
import { CabinetElevation, PlaceButton } from './cabinet-elevation'
import { LocationDialog } from './location-dialog'
import { type LocationNode, locationTree } from './location-tree'
import { PatternDialog } from './pattern-dialog'

/** The shop's places as one would see them standing before the cabinets. */
export function LocationsPage() {
  const { data, error, refresh } = useLocations()
  const [opened, setOpened] = useState<LocationResponse | null>(null)
  const [parent, setParent] = useState<LocationResponse | 'crib' | null>(null)
  const [isPattern, setIsPattern] = useState(false)
  const mayKeep = useCan('keepCrib')
  const archived = useArchivedLocations(mayKeep)
  const tree = data ? locationTree(data) : null

  function handleChanged() {
    setOpened(null)
    setParent(null)
    setIsPattern(false)
    void refresh()
    void archived.refresh()
  }

  return (
    <>
      <PageHeading title="Locations" note="Every cabinet as it stands: its drawers, and the bins in each.">
        {mayKeep ? (
          <>
            <Button onClick={() => setIsPattern(true)}>Bins by a pattern</Button>
            <Button onClick={() => setParent('crib')}>Add a crib</Button>
          </>
        ) : null}
      </PageHeading>
      {error ? (
        <StateSentence sentence={faultSentence(error)}>
          <Button onClick={() => void refresh()}>Try again</Button>
        </StateSentence>
      ) : null}
      {!data && !error ? <StateSentence sentence="Reading the locations …" /> : null}
      {tree?.cribs.map((crib) => (
        <Crib key={crib.location.id} crib={crib} onOpen={setOpened} onAdd={mayKeep ? setParent : null} />
      ))}
      {tree && tree.cribs.length === 0 ? (
        <StateSentence sentence="There is no crib yet. Bins stand in a crib, so that comes first." />
      ) : null}
      {tree && tree.others.length > 0 ? <Elsewhere places={tree.others} onOpen={setOpened} /> : null}
      {mayKeep && tree ? <ArchivedPlaces archived={archived} onRestored={handleChanged} /> : null}
      {opened ? (
        <LocationDialog location={opened} onClose={() => setOpened(null)} onChanged={handleChanged} />
      ) : null}
      {isPattern ? <PatternDialog onClose={() => setIsPattern(false)} onAdded={handleChanged} /> : null}
      {parent ? (
        <AddLocationDialog parent={parent} onClose={() => setParent(null)} onAdded={handleChanged} />
      ) : null}
    </>
  )
}

interface CribProps {
  crib: LocationNode
  onOpen: (location: LocationResponse) => void
  onAdd: ((parent: LocationResponse) => void) | null
}

function Crib({ crib, onOpen, onAdd }: CribProps) {
  const { location, children } = crib
  const loose = children.filter((child) => child.location.kind !== 'cabinet')
  return (
    <section aria-labelledby={`crib-${location.id}`} className="px-4 pb-8 lg:px-6">
      <div className="border-ink mb-4 flex flex-wrap items-center justify-between gap-2 border-b pb-1">
        <h2 id={`crib-${location.id}`} className="text-lg">
          {location.code} <span className="text-ink-soft font-normal">{location.name}</span>
        </h2>
        <span className="flex gap-1">
          <Button variant="quiet" size="compact" onClick={() => onOpen(location)}>
            All that lies in it
          </Button>
          {onAdd ? (
            <Button variant="quiet" size="compact" onClick={() => onAdd(location)}>
              Add to {location.code}
            </Button>
          ) : null}
        </span>
      </div>
      <div className="grid items-start gap-6 lg:grid-cols-2">
        {children
          .filter((child) => child.location.kind === 'cabinet')
          .map((cabinet) => (
            <CabinetElevation key={cabinet.location.id} cabinet={cabinet} onOpen={onOpen} onAdd={onAdd} />
          ))}
        {loose.length > 0 ? (
          <CabinetElevation
            cabinet={{ location: { ...location, name: 'In no cabinet' }, children: loose }}
            onOpen={onOpen}
            onAdd={onAdd}
          />
        ) : null}
      </div>
      {children.length === 0 ? (
        <p className="text-ink-soft">
          Nothing stands in it yet{onAdd ? ': add a cabinet, a drawer or a bin.' : '.'}
        </p>
      ) : null}
    </section>
  )
}

const elsewhereKinds = [
  ['machine', 'On machines'],
  ['person', 'In hands'],
  ['regrind', 'Out for regrinding'],
  ['inTransit', 'On the way'],
] as const

function Elsewhere({
  places,
  onOpen,
}: {
  places: LocationResponse[]
  onOpen: (place: LocationResponse) => void
}) {
  return (
    <section aria-label="In no crib" className="px-4 pb-10 lg:px-6">
      <h2 className="border-ink mb-3 border-b pb-1 text-lg">In no crib</h2>
      <dl className="grid gap-x-8 gap-y-4 sm:grid-cols-2 xl:grid-cols-4">
        {elsewhereKinds.map(([kind, label]) => {
          const found = places.filter((place) => place.kind === kind)
          if (found.length === 0) return null
          return (
            <div key={kind}>
              <dt className="text-ink-soft text-sm">{label}</dt>
              {found.map((place) => (
                <dd key={place.id}>
                  <PlaceButton onClick={() => onOpen(place)}>
                    {kind === 'person' ? place.name : `${place.code} · ${place.name}`}
                  </PlaceButton>
                </dd>
              ))}
            </div>
          )
        })}
      </dl>
    </section>
  )
}
