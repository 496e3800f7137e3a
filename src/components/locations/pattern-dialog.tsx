'use client'

import { type FormEvent, useState } from 'react'
import { toast } from '@/components/ui/toast'
import { CoreInputError } from '@/core/core-input-error'
import { binCodes } from '@/core/stock/bin-codes'
import { useLocations } from '@/hooks/use-locations'
import { callApi } from '@/lib/api-client'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import type { LocationPatternResponse, LocationResponse } from '@/schemas/location'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { SelectField } from '../ui/select-field'
import { TextField } from '../ui/text-field'
import { useAttempt } from '../ui/use-attempt'

export interface PatternDialogProps {
  onClose: () => void
  onAdded: () => void
}

type Preview = { codes: string[] } | { path: string; message: string } | null

/** Many bins at once from the first code and the last, all of them seen before they are made. */
export function PatternDialog({ onClose, onAdded }: PatternDialogProps) {
  const { data, error, refresh } = useLocations()
  const { fault, isBusy, attempt } = useAttempt()
  const [texts, setTexts] = useState({ parentId: '', first: '', last: '' })
  const parents = (data ?? []).filter(({ kind }) => ['crib', 'cabinet', 'drawer'].includes(kind))
  const parent = parents.find(({ id }) => id === texts.parentId) ?? parents[0]
  const preview = previewOf(texts.first, texts.last)
  const codes = preview && 'codes' in preview ? preview.codes : []
  const taken = takenOf(data ?? [], parent, codes)
  const faults: Record<string, string | undefined> = {
    ...fieldFaults(fault),
    ...(preview && 'path' in preview ? { [preview.path]: preview.message } : {}),
  }

  function handleSubmit(event: FormEvent) {
    event.preventDefault()
    if (!parent || codes.length === 0) return
    void attempt(async () => {
      const { added } = await callApi<LocationPatternResponse>('POST', '/api/locations/pattern', {
        body: { parentId: parent.id, first: texts.first, last: texts.last },
      })
      await refresh()
      toast.success(`${added} ${added === 1 ? 'bin stands' : 'bins stand'} in ${parent.code} now.`)
      onAdded()
    })
  }

  const set = (name: keyof typeof texts) => (event: { target: { value: string } }) =>
    setTexts((held) => ({ ...held, [name]: event.target.value }))

  return (
    <Dialog isOpen onOpenChange={onClose} title="Bins by a pattern">
      <form onSubmit={handleSubmit} noValidate className="flex flex-col gap-4">
        {fault || error ? (
          <Notice kind="collision" isAnnounced>
            {faultSentence(fault ?? error)}
          </Notice>
        ) : null}
        {data && parents.length === 0 ? (
          <Notice kind="caution">There is no crib yet. Bins stand in a crib, so that comes first.</Notice>
        ) : null}
        <SelectField
          label="They stand in"
          value={parent?.id ?? ''}
          onChange={set('parentId')}
          error={faults.parentId}
          options={parents.map((place) => ({ value: place.id, label: placeLabel(place) }))}
        />
        <div className="grid grid-cols-2 gap-4">
          <TextField
            label="First code"
            value={texts.first}
            onChange={set('first')}
            error={faults.first}
            placeholder="A1"
            autoComplete="off"
            spellCheck={false}
            isRequired
          />
          <TextField
            label="Last code"
            value={texts.last}
            onChange={set('last')}
            error={faults.last}
            placeholder="F12"
            autoComplete="off"
            spellCheck={false}
            isRequired
          />
        </div>
        <PatternPreview codes={codes} taken={taken} />
        <div>
          <Button
            type="submit"
            variant="primary"
            disabled={isBusy || codes.length === 0 || taken.length > 0 || !parent}
          >
            {codes.length === 0
              ? 'Add the bins'
              : `Add ${codes.length} ${codes.length === 1 ? 'bin' : 'bins'}`}
          </Button>
        </div>
      </form>
    </Dialog>
  )
}

function placeLabel({ code, cribCode, kind, name }: LocationResponse): string {
  return kind === 'crib' ? `${code} · ${name}` : `${cribCode} · ${code} · ${name}`
}

function previewOf(first: string, last: string): Preview {
  if (first.trim() === '' || last.trim() === '') return null
  try {
    return { codes: binCodes(first, last) }
  } catch (error) {
    if (!(error instanceof CoreInputError)) throw error
    return { path: error.path, message: error.message }
  }
}

function takenOf(
  places: LocationResponse[],
  parent: LocationResponse | undefined,
  codes: string[],
): string[] {
  const held = new Set(
    places.filter(({ cribId }) => cribId === parent?.cribId).map(({ code }) => code.toLowerCase()),
  )
  return codes.filter((code) => held.has(code.toLowerCase()))
}

const shownAtMost = 120

function PatternPreview({ codes, taken }: { codes: string[]; taken: string[] }) {
  if (codes.length === 0) {
    return <p className="text-ink-soft">Type the first and the last code; what would be made shows here.</p>
  }
  const isTaken = new Set(taken)
  // Those in the way are shown whatever is left out.
  const shown = [...taken, ...codes.filter((code) => !isTaken.has(code))].slice(0, shownAtMost)
  return (
    <div aria-live="polite">
      <p className="font-semibold">
        {codes.length} {codes.length === 1 ? 'bin' : 'bins'}, {codes[0]} to {codes.at(-1)}
      </p>
      {taken.length > 0 ? (
        <p className="text-collision font-semibold">
          {taken.length === 1 ? 'One of them is' : `${taken.length} of them are`} there already, marked below:
          change the pattern.
        </p>
      ) : null}
      <ul className="border-hairline mt-1 flex flex-wrap gap-x-3 border p-2 text-sm">
        {shown.map((code) => (
          <li key={code} className={isTaken.has(code) ? 'text-collision font-semibold line-through' : ''}>
            {code}
          </li>
        ))}
        {codes.length > shownAtMost ? <li>… and {codes.length - shownAtMost} more</li> : null}
      </ul>
    </div>
  )
}
