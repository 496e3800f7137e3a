'use client'

import { type FormEvent, useState } from 'react'
import { toast } from '@/components/ui/toast'
import { parseLength } from '@/core/units/parse-length'
import { useChangeAssembly } from '@/hooks/use-assemblies'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import { formatLength } from '@/lib/format-length'
import { useShop } from '../layout/shop-context'
import { Dialog } from '../ui/dialog'
import { LengthField } from '../ui/length-field'
import { TextAreaField, TextField } from '../ui/text-field'
import { DialogFoot, gloveFormClass } from './dialog-foot'
import { OffsetFields, offsetTexts, readOffsets } from './offset-fields'
import type { AssemblyDialogProps } from './use-dialog-act'

/** Names, numbers and the stick-out. A stick-out that fails what it was kept for is refused. */
export function EditDialog({ assembly, onClose, onChanged }: AssemblyDialogProps) {
  const { unit, decimalComma } = useShop()
  const changeAssembly = useChangeAssembly()
  const firstStickOut = formatLength(assembly.stickOutMm, unit, { withUnit: false })
  const [name, setName] = useState(assembly.name)
  const [note, setNote] = useState(assembly.note)
  const [stickOut, setStickOut] = useState(firstStickOut)
  const [offsets, setOffsets] = useState(() => offsetTexts(assembly))
  const [errors, setErrors] = useState<Record<string, string>>({})
  const [failure, setFailure] = useState<string | null>(null)
  const [isBusy, setIsBusy] = useState(false)

  async function handleSubmit(event: FormEvent) {
    event.preventDefault()
    const length = parseLength(stickOut, { unit, decimalComma, drillSizes: false })
    const numbers = readOffsets(offsets)
    if (!length.ok || !numbers.ok) {
      return setErrors({
        ...(length.ok ? {} : { stickOutMm: length.message }),
        ...(numbers.ok ? {} : numbers.errors),
      })
    }
    setErrors({})
    setFailure(null)
    setIsBusy(true)
    try {
      onChanged(
        await changeAssembly(assembly, {
          name,
          note,
          ...numbers.value,
          // As it was shown it is rounded: untouched, it stays what it is.
          ...(stickOut === firstStickOut ? {} : { stickOutMm: length.mm }),
        }),
      )
      toast.success(`Assembly ${assembly.number} is changed.`)
      onClose()
    } catch (error) {
      setErrors(fieldFaults(error))
      setFailure(Object.keys(fieldFaults(error)).length > 0 ? null : faultSentence(error))
      setIsBusy(false)
    }
  }

  return (
    <Dialog
      isOpen
      onOpenChange={(isOpen) => (isOpen ? undefined : onClose())}
      title={`Change assembly ${assembly.number}`}
    >
      <form noValidate onSubmit={handleSubmit} className={gloveFormClass}>
        <TextField
          label="Name"
          value={name}
          maxLength={200}
          onChange={(event) => setName(event.target.value)}
          error={errors.name}
        />
        <LengthField
          label="Stick-out"
          value={stickOut}
          onTextChange={setStickOut}
          unit={unit}
          decimalComma={decimalComma}
          drillSizes={false}
          error={errors.stickOutMm}
        />
        <OffsetFields texts={offsets} errors={errors} onChange={setOffsets} />
        <TextAreaField label="Note" value={note} onChange={(event) => setNote(event.target.value)} />
        <DialogFoot
          label="Save the changes"
          busyLabel="Saving …"
          isBusy={isBusy}
          failure={failure}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}
