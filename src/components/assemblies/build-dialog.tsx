'use client'

import { type FormEvent, useState } from 'react'
import { assemblyPartNames } from '@/lib/assembly-sentences'
import { formatLength } from '@/lib/format-length'
import type { AssemblyPart } from '@/schemas/assembly'
import { conditionNames } from '../catalogue/stock-words'
import { useShop } from '../layout/shop-context'
import { Dialog } from '../ui/dialog'
import { Notice } from '../ui/notice'
import { SelectField } from '../ui/select-field'
import { placeWords } from './assembly-words'
import { DialogFoot, gloveFormClass } from './dialog-foot'
import { MachineFields, type MachineSpotText, readSpot } from './machine-fields'
import { type AssemblyDialogProps, useDialogAct } from './use-dialog-act'

interface Source {
  value: string
  label: string
  fromLocationId: string
  condition: string
  pieceId: string | null
}

/** The bins a part can be taken from, or the tagged pieces of it; the fullest bin first. */
function sourcesOf(part: AssemblyPart): Source[] {
  if (part.isTrackedByPiece)
    return part.pieces.flatMap(({ id, tag, locationId, condition }) => {
      const bin = part.bins.find(({ place }) => place.locationId === locationId)
      if (!bin || !locationId || !condition) return []
      const label = `${tag}, ${placeWords(bin.place)}, ${conditionNames[condition].toLowerCase()}`
      return [{ value: id, label, fromLocationId: locationId, condition, pieceId: id }]
    })
  return part.bins.map(({ place, condition, quantity }) => ({
    value: `${place.locationId} ${condition}`,
    label: `${placeWords(place)}, ${conditionNames[condition].toLowerCase()}: ${quantity}`,
    fromLocationId: place.locationId,
    condition,
    pieceId: null,
  }))
}

/** Every part out of its bin, all together or none; into one's hands or straight into a machine. */
export function BuildDialog(props: AssemblyDialogProps) {
  const { assembly, onClose } = props
  const { unit } = useShop()
  const { send, errors, setErrors, failure, isBusy } = useDialogAct('build', props)
  const [chosen, setChosen] = useState<Record<string, string>>({})
  const [spot, setSpot] = useState<MachineSpotText>({ machineId: '', pocket: '' })
  const parts = assembly.parts.map((part) => {
    const sources = sourcesOf(part)
    const wanted = chosen[part.kind] ?? (part.pieceId || null)
    return { part, sources, source: sources.find(({ value }) => value === wanted) ?? sources[0] ?? null }
  })
  const missing = parts.filter(({ source }) => source === null)
  const isReground = parts.some(
    ({ part, source }) => part.kind === 'cutter' && source?.condition === 'reground',
  )

  async function handleSubmit(event: FormEvent) {
    event.preventDefault()
    const read = readSpot(spot)
    if (!read.ok) return setErrors({ pocket: read.pocket })
    await send(
      {
        ...read.value,
        parts: parts.flatMap(({ part, source }) =>
          source === null
            ? []
            : [
                {
                  kind: part.kind,
                  fromLocationId: source.fromLocationId,
                  condition: source.condition,
                  pieceId: source.pieceId,
                },
              ],
        ),
      },
      `Assembly ${assembly.number} is built.`,
    )
  }

  return (
    <Dialog
      isOpen
      onOpenChange={(isOpen) => (isOpen ? undefined : onClose())}
      title={`Build assembly ${assembly.number}`}
      description={`Stick-out ${formatLength(assembly.stickOutMm, unit)}, gauge length ${formatLength(assembly.gaugeLengthMm, unit)}. All parts are issued together.`}
    >
      <form noValidate onSubmit={handleSubmit} className={gloveFormClass}>
        {parts.map(({ part, sources, source }, index) =>
          source === null ? (
            <Notice key={part.kind} kind="collision">
              {assemblyPartNames[part.kind]} {part.code}: none in any bin.
            </Notice>
          ) : (
            <SelectField
              key={part.kind}
              label={`${assemblyPartNames[part.kind]} ${part.code}`}
              value={source.value}
              onChange={(event) => setChosen({ ...chosen, [part.kind]: event.target.value })}
              options={sources}
              error={errors[`parts.${index}.fromLocationId`] ?? errors[`parts.${index}.pieceId`]}
            />
          ),
        )}
        {isReground ? (
          <Notice kind="caution">
            A reground cutter is smaller than the catalogue says. Measure it before it cuts to size.
          </Notice>
        ) : null}
        <MachineFields
          spot={spot}
          gaugeLengthMm={assembly.gaugeLengthMm}
          errors={errors}
          onChange={setSpot}
        />
        <DialogFoot
          label="Build it"
          busyLabel="Building …"
          isBusy={isBusy}
          isDisabled={missing.length > 0}
          failure={failure}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}
