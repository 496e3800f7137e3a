'use client'

import { useState } from 'react'
import { toast } from '@/components/ui/toast'
import { type AssemblyAct, useActOnAssembly } from '@/hooks/use-assemblies'
import { faultSentence, fieldFaults } from '@/lib/field-faults'
import { newIdempotencyKey } from '@/lib/new-idempotency-key'
import type { AssemblyResponse } from '@/schemas/assembly'

export interface AssemblyDialogProps {
  assembly: AssemblyResponse
  onClose: () => void
  onChanged: (assembly: AssemblyResponse) => void
}

/** One opened dialog is one act, however often it is sent; a refusal stands beside its field or below. */
export function useDialogAct(act: AssemblyAct, { assembly, onClose, onChanged }: AssemblyDialogProps) {
  const actOn = useActOnAssembly()
  const [key] = useState(newIdempotencyKey)
  const [errors, setErrors] = useState<Record<string, string>>({})
  const [failure, setFailure] = useState<string | null>(null)
  const [isBusy, setIsBusy] = useState(false)

  async function send(body: object, done: string) {
    setErrors({})
    setFailure(null)
    setIsBusy(true)
    try {
      onChanged(await actOn(assembly, act, body, key))
      toast.success(done)
      onClose()
    } catch (error) {
      setErrors(fieldFaults(error))
      setFailure(faultSentence(error))
      setIsBusy(false)
    }
  }
  return { send, errors, setErrors, failure, isBusy }
}
