'use client'

import { type FormEvent, useState } from 'react'
import { Dialog } from '../ui/dialog'
import { DialogFoot, gloveFormClass } from './dialog-foot'
import { MachineFields, type MachineSpotText, readSpot } from './machine-fields'
import { OffsetFields, offsetTexts, readOffsets } from './offset-fields'
import { type AssemblyDialogProps, useDialogAct } from './use-dialog-act'

/** Into a machine and a pocket of it, with the numbers its control knows it by, or back into one's hands. */
export function PocketDialog(props: AssemblyDialogProps) {
  const { assembly, onClose } = props
  const { send, errors, setErrors, failure, isBusy } = useDialogAct('pocket', props)
  const [spot, setSpot] = useState<MachineSpotText>({
    machineId: assembly.machine?.id ?? '',
    pocket: assembly.pocket?.toString() ?? '',
  })
  const [offsets, setOffsets] = useState(() => offsetTexts(assembly))

  async function handleSubmit(event: FormEvent) {
    event.preventDefault()
    const read = readSpot(spot)
    const numbers = readOffsets(offsets)
    if (!read.ok || !numbers.ok) {
      return setErrors({
        ...(read.ok ? {} : { pocket: read.pocket }),
        ...(numbers.ok ? {} : numbers.errors),
      })
    }
    await send(
      { ...read.value, ...numbers.value },
      read.value.machineId
        ? `Assembly ${assembly.number} is in the machine.`
        : `Assembly ${assembly.number} is in your hands.`,
    )
  }

  return (
    <Dialog
      isOpen
      onOpenChange={(isOpen) => (isOpen ? undefined : onClose())}
      title={`Move assembly ${assembly.number}`}
      description="Its parts move with it in the books."
    >
      <form noValidate onSubmit={handleSubmit} className={gloveFormClass}>
        <MachineFields
          spot={spot}
          gaugeLengthMm={assembly.gaugeLengthMm}
          errors={errors}
          onChange={setSpot}
        />
        <OffsetFields texts={offsets} errors={errors} onChange={setOffsets} />
        <DialogFoot
          label={spot.machineId !== '' ? 'Put it in' : assembly.machine ? 'Take it out' : 'Take it in hand'}
          busyLabel="Moving …"
          isBusy={isBusy}
          failure={failure}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}
