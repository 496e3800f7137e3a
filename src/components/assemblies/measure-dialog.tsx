'use client'

import { type FormEvent, useState } from 'react'
import { parseLength } from '@/core/units/parse-length'
import { formatLength } from '@/lib/format-length'
import { useShop } from '../layout/shop-context'
import { Dialog } from '../ui/dialog'
import { LengthField } from '../ui/length-field'
import { Notice } from '../ui/notice'
import { difference } from './assembly-words'
import { DialogFoot, gloveFormClass } from './dialog-foot'
import { type AssemblyDialogProps, useDialogAct } from './use-dialog-act'

/** What was read off the height gauge or the presetter, beside what was calculated, before it is kept. */
export function MeasureDialog(props: AssemblyDialogProps) {
  const { assembly, onClose } = props
  const { unit, decimalComma, measuringToleranceMm } = useShop()
  const { send, errors, setErrors, failure, isBusy } = useDialogAct('measure', props)
  const [length, setLength] = useState('')
  const [diameter, setDiameter] = useState('')
  const read = (text: string) => parseLength(text, { unit, decimalComma, drillSizes: false })
  const typed = length.trim() === '' ? null : read(length)
  const off = typed?.ok ? difference(typed.mm, assembly.gaugeLengthMm, measuringToleranceMm, unit) : null

  async function handleSubmit(event: FormEvent) {
    event.preventDefault()
    const [gauge, across] = [read(length), diameter.trim() === '' ? null : read(diameter)]
    if (!gauge.ok || (across && !across.ok)) {
      return setErrors({
        ...(gauge.ok ? {} : { gaugeLengthMm: gauge.message }),
        ...(across && !across.ok ? { diameterMm: across.message } : {}),
      })
    }
    await send(
      { gaugeLengthMm: gauge.mm, diameterMm: across?.ok ? across.mm : null },
      `Assembly ${assembly.number} is measured.`,
    )
  }

  return (
    <Dialog
      isOpen
      onOpenChange={(isOpen) => (isOpen ? undefined : onClose())}
      title={`Measure assembly ${assembly.number}`}
      description={`To expect: gauge length ${formatLength(assembly.gaugeLengthMm, unit)}, diameter ${formatLength(assembly.tools.cutter.cuttingDiameterMm, unit)}.`}
    >
      <form noValidate onSubmit={handleSubmit} className={gloveFormClass}>
        <LengthField
          label="Gauge length"
          value={length}
          onTextChange={setLength}
          unit={unit}
          decimalComma={decimalComma}
          drillSizes={false}
          error={errors.gaugeLengthMm}
          isRequired
        />
        <LengthField
          label="Diameter"
          value={diameter}
          onTextChange={setDiameter}
          unit={unit}
          decimalComma={decimalComma}
          drillSizes={false}
          error={errors.diameterMm}
          hint="Blank where it was not measured"
        />
        {off ? (
          <Notice kind={off.isOver ? 'collision' : 'holds'}>
            {off.text} to the calculated gauge length
            {off.isOver ? `: more than the ${formatLength(measuringToleranceMm, unit)} allowed.` : '.'}
          </Notice>
        ) : null}
        <DialogFoot
          label="Keep it"
          busyLabel="Keeping …"
          isBusy={isBusy}
          failure={Object.keys(errors).length > 0 ? null : failure}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}
