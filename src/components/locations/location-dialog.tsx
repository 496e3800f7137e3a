'use client'

import Link from 'next/link'
import type { FormEvent } from 'react'
import { useLocationContents } from '@/hooks/use-locations'
import { callApi } from '@/lib/api-client'
import { itemPagePath } from '@/lib/catalogue-paths'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import type { LocationResponse } from '@/schemas/location'
import { useCan } from '../layout/shop-context'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { TextField } from '../ui/text-field'
import { useAttempt } from '../ui/use-attempt'

export interface LocationDialogProps {
  location: LocationResponse
  onClose: () => void
  onChanged: () => void
}

const keptKinds = ['crib', 'cabinet', 'drawer', 'bin', 'regrind', 'inTransit']

/** What lies in a place; for those who keep the crib also its name, and its end. */
export function LocationDialog({ location, onClose, onChanged }: LocationDialogProps) {
  const mayKeep = useCan('keepCrib') && keptKinds.includes(location.kind)
  const title = location.kind === 'person' ? location.name : location.code
  return (
    <Dialog isOpen onOpenChange={onClose} title={title} description={location.name} shape="side">
      <div className="flex flex-col gap-8">
        <Contents location={location} />
        {mayKeep ? <LocationForm location={location} onChanged={onChanged} /> : null}
      </div>
    </Dialog>
  )
}

function Contents({ location }: { location: LocationResponse }) {
  const { data, error } = useLocationContents(location.id)
  if (error) return <Notice kind="collision">{faultSentence(error)}</Notice>
  if (!data) return <p role="status">Looking in …</p>
  if (data.rows.length === 0) return <p>Nothing lies in it.</p>
  return (
    <table className="w-full text-left text-[0.9375rem]">
      <caption className="sr-only">What lies in {location.code}</caption>
      <thead className="border-ink border-b">
        <tr className="[&>th]:py-1.5 [&>th]:pr-3">
          <th scope="col">Item</th>
          {location.kind === 'bin' ? null : <th scope="col">Bin</th>}
          <th scope="col">Condition</th>
          <th scope="col" className="text-right">
            Pieces
          </th>
        </tr>
      </thead>
      <tbody>
        {data.rows.map((row) => (
          <tr
            key={`${row.locationId} ${row.itemId} ${row.condition}`}
            className="border-hairline border-b align-top [&>td]:py-1.5 [&>td]:pr-3"
          >
            <td>
              <Link
                href={itemPagePath(row.itemKind, row.itemId)}
                className="text-accent font-semibold hover:underline"
              >
                {row.code}
              </Link>
              <span className="text-ink-soft block text-sm">{row.description}</span>
            </td>
            {location.kind === 'bin' ? null : (
              <td>{row.locationId === location.id ? '' : row.locationCode}</td>
            )}
            <td>{row.condition}</td>
            <td className="text-right">{row.quantity}</td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}

function LocationForm({ location, onChanged }: { location: LocationResponse; onChanged: () => void }) {
  const { fault, isBusy, attempt } = useAttempt()
  const faults = fieldFaults(fault)

  function change(act: () => Promise<unknown>) {
    void attempt(async () => {
      await act()
      onChanged()
    })
  }

  function handleSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    const values = new FormData(event.currentTarget)
    const body = { version: location.version, code: values.get('code'), name: values.get('name') }
    change(() => callApi('PATCH', `/api/locations/${location.id}`, { body }))
  }

  return (
    <form onSubmit={handleSubmit} noValidate className="flex flex-col gap-4">
      <h3 className="border-ink border-b pb-1 text-lg">Its name</h3>
      {fault ? (
        <Notice kind="collision" isAnnounced>
          {faultSentence(fault)}
        </Notice>
      ) : null}
      <TextField label="Code" name="code" defaultValue={location.code} error={faults.code} isRequired />
      <TextField label="Name" name="name" defaultValue={location.name} error={faults.name} isRequired />
      <div className="flex flex-wrap gap-2">
        <Button type="submit" variant="primary" disabled={isBusy}>
          Save
        </Button>
        {location.kind === 'crib' ? null : (
          <Button
            variant="danger"
            disabled={isBusy}
            onClick={() => change(() => callApi('DELETE', `/api/locations/${location.id}`))}
          >
            Archive
          </Button>
        )}
      </div>
      <p className="text-ink-soft text-sm">
        A place that holds anything stays until it is empty. What is archived can be brought back, at the end
        of the locations.
      </p>
    </form>
  )
}
