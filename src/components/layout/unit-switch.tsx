'use client'

import { useRouter } from 'next/navigation'
import { useTransition } from 'react'
import { toast } from '@/components/ui/toast'
import { type LengthUnit, lengthUnits } from '@/core/units/length-unit'
import { callApi } from '@/lib/api-client'
import { classNames } from '../ui/class-names'
import { useShop } from './shop-context'

/** Each person's own unit, kept with the person; every page reads in it at once. */
export function UnitSwitch() {
  const { unit } = useShop()
  const router = useRouter()
  const [isPending, startTransition] = useTransition()

  async function handleChoose(next: LengthUnit) {
    if (next === unit) return
    try {
      await callApi('PATCH', '/api/me', { body: { lengthUnit: next } })
      startTransition(() => router.refresh())
    } catch (error) {
      toast.error(error instanceof Error ? error.message : 'The unit was not changed.')
    }
  }

  return (
    <fieldset className="border-ink-soft/60 flex overflow-hidden rounded-[3px] border" disabled={isPending}>
      <legend className="sr-only">Unit of length</legend>
      {lengthUnits.map((choice) => (
        <button
          key={choice}
          type="button"
          aria-pressed={choice === unit}
          aria-label={choice === 'mm' ? 'Millimetres' : 'Inches'}
          onClick={() => handleChoose(choice)}
          className={classNames(
            'min-h-8 min-w-10 px-2 text-[0.9375rem] font-semibold pointer-coarse:min-h-11 pointer-coarse:min-w-11',
            choice === unit ? 'bg-accent text-on-accent' : 'text-accent hover:bg-accent-wash',
          )}
        >
          {choice}
        </button>
      ))}
    </fieldset>
  )
}
