'use client'

import { BookmarkPlus } from 'lucide-react'
import { useRouter } from 'next/navigation'
import { type FormEvent, useState } from 'react'
import { toast } from '@/components/ui/toast'
import type { Clearances, Feature } from '@/core/reach/types'
import { useAddAssemblyCheck, useAssemblies } from '@/hooks/use-assemblies'
import { useKeepAssembly } from '@/hooks/use-keep-assembly'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import { formatLength } from '@/lib/format-length'
import type { AssemblyRow } from '@/schemas/assembly'
import { useCan, useShop } from '../layout/shop-context'
import { Button } from '../ui/button'
import { Dialog } from '../ui/dialog'
import { SelectField } from '../ui/select-field'
import { TextField } from '../ui/text-field'
import { DialogFoot, gloveFormClass } from './dialog-foot'
import { noOffsetTexts, OffsetFields, readOffsets } from './offset-fields'

/** What reaches, by the ids of its parts. */
export interface KeptOption {
  feature: Feature
  cutter: { id: string } | { pieceId: string }
  holder: { id: string }
  collet: { id: string } | null
  extension: { id: string } | null
  stickOutMm: number
  /** null where the shop's own stand. */
  clearances: Partial<Clearances> | null
}

/** Keeps an option as a numbered assembly and goes to it; nothing for those who may not. */
export function KeepAssemblyButton({ option, label }: { option: KeptOption; label?: string }) {
  const [isOpen, setIsOpen] = useState(false)
  if (!useCan('plan')) return null
  return (
    <>
      <Button size="compact" onClick={() => setIsOpen(true)} {...(label ? { 'aria-label': label } : {})}>
        <BookmarkPlus aria-hidden="true" className="size-4.5" />
        Keep as assembly
      </Button>
      {isOpen ? <KeepDialog option={option} onClose={() => setIsOpen(false)} /> : null}
    </>
  )
}

function KeepDialog({ option, onClose }: { option: KeptOption; onClose: () => void }) {
  const router = useRouter()
  const keepAssembly = useKeepAssembly()
  const addCheck = useAddAssemblyCheck()
  const { unit } = useShop()
  const alike = useAlike(option)
  const [withId, setWithId] = useState('')
  const [name, setName] = useState('')
  const [offsets, setOffsets] = useState(noOffsetTexts)
  const [errors, setErrors] = useState<Record<string, string>>({})
  const [failure, setFailure] = useState<string | null>(null)
  const [isBusy, setIsBusy] = useState(false)
  const existing = alike.find(({ id }) => id === withId) ?? null

  async function handleSubmit(event: FormEvent) {
    event.preventDefault()
    const numbers = readOffsets(offsets)
    if (!numbers.ok) return setErrors(numbers.errors)
    setErrors({})
    setFailure(null)
    setIsBusy(true)
    try {
      const { feature, clearances } = option
      const kept = existing
        ? await addCheck(existing, { feature, clearances })
        : await keepAssembly({ ...option, name, ...numbers.value })
      toast.success(existing ? `Kept with assembly ${kept.number}.` : `Kept as assembly ${kept.number}.`)
      router.push(`/assemblies/${kept.id}`)
    } catch (error) {
      setErrors(fieldFaults(error))
      setFailure(faultSentence(error))
      setIsBusy(false)
    }
  }

  return (
    <Dialog
      isOpen
      onOpenChange={(isOpen) => (isOpen ? undefined : onClose())}
      title="Keep as assembly"
      description={`Set to ${formatLength(option.stickOutMm, unit)} of stick-out. It is marked when a part of it changes so that it no longer holds.`}
    >
      <form noValidate onSubmit={handleSubmit} className={gloveFormClass}>
        {alike.length > 0 ? (
          <SelectField
            label="Keep it"
            value={withId}
            onChange={(event) => setWithId(event.target.value)}
            options={[
              { value: '', label: 'As a new assembly' },
              ...alike.map(({ id, number, name: called }) => ({
                value: id,
                label: `With assembly ${number}${called ? `, ${called}` : ''}`,
              })),
            ]}
            hint="The same parts at the same stick-out are kept already: one assembly may be for several features."
          />
        ) : null}
        {existing ? null : (
          <>
            <TextField
              label="Name"
              value={name}
              maxLength={200}
              onChange={(event) => setName(event.target.value)}
              hint="What it is for, such as the pocket or the job"
              error={errors.name}
            />
            <OffsetFields texts={offsets} errors={errors} onChange={setOffsets} />
          </>
        )}
        <DialogFoot
          label="Keep it"
          busyLabel="Keeping …"
          isBusy={isBusy}
          failure={failure}
          onCancel={onClose}
        />
      </form>
    </Dialog>
  )
}

const sameMm = 1e-9

/** Assemblies of the very same parts at the same stick-out. */
function useAlike({ cutter, holder, collet, extension, stickOutMm }: KeptOption): readonly AssemblyRow[] {
  const { rows } = useAssemblies({ itemId: holder.id })
  if (!('id' in cutter)) return []
  const wanted = [cutter, collet, extension, holder].flatMap((part) => part?.id ?? []).sort()
  return (rows ?? []).filter(
    (row) =>
      Math.abs(row.stickOutMm - stickOutMm) <= sameMm &&
      row.parts
        .map(({ itemId }) => itemId)
        .sort()
        .join() === wanted.join(),
  )
}
