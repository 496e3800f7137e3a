'use client'

import { toast } from '@/components/ui/toast'
import type { useArchivedLocations } from '@/hooks/use-locations'
import { callApi } from '@/lib/api-client'
import { faultSentence } from '@/lib/field-faults'
import type { LocationResponse } from '@/schemas/location'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { useAttempt } from '../ui/use-attempt'

const kindNames: Partial<Record<LocationResponse['kind'], string>> = {
  cabinet: 'cabinet',
  drawer: 'drawer',
  bin: 'bin',
  regrind: 'regrinding',
  inTransit: 'on the way',
}

export interface ArchivedPlacesProps {
  archived: ReturnType<typeof useArchivedLocations>
  onRestored: () => void
}

/** What was archived, each with the way back; nothing where nothing was. */
export function ArchivedPlaces({ archived: { data, error }, onRestored }: ArchivedPlacesProps) {
  const { fault, isBusy, attempt } = useAttempt()
  const places = (data ?? []).filter(({ kind }) => kind in kindNames)
  if (error) {
    return (
      <p className="px-4 pb-8 lg:px-6" role="status">
        The archived places could not be read. {faultSentence(error)}
      </p>
    )
  }
  if (places.length === 0) return null

  function restore({ id, version, code }: LocationResponse) {
    void attempt(async () => {
      await callApi('PATCH', `/api/locations/${id}`, { body: { version, archivedAt: null } })
      toast.success(`${code} is in use again.`)
      onRestored()
    })
  }

  return (
    <details className="px-4 pb-10 lg:px-6">
      <summary className="border-ink flex min-h-11 cursor-pointer items-center border-b text-lg font-semibold">
        Archived ({places.length})
      </summary>
      {fault ? (
        <Notice kind="collision" isAnnounced className="mt-3">
          {faultSentence(fault)}
        </Notice>
      ) : null}
      <ul>
        {places.map((place) => (
          <li
            key={place.id}
            className="border-hairline flex flex-wrap items-center justify-between gap-x-4 gap-y-1 border-b py-1.5"
          >
            <span>
              <span className="font-semibold">{place.code}</span>{' '}
              <span className="text-ink-soft">
                {[place.name, kindNames[place.kind], place.cribCode].filter(Boolean).join(' · ')}
              </span>
            </span>
            <Button size="compact" disabled={isBusy} onClick={() => restore(place)}>
              Bring back<span className="sr-only"> {place.code}</span>
            </Button>
          </li>
        ))}
      </ul>
    </details>
  )
}
