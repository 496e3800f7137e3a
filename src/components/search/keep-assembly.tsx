'use client'

import { useRouter } from 'next/navigation'
import { useKeepAssembly } from '@/hooks/use-keep-assembly'
import { useCan } from '../layout/shop-context'
import { Button, ButtonLink } from '../ui/button'
import { useAttempt } from '../ui/use-attempt'
import { type AssemblyListing, keptAssembly, type SearchedAssembly } from './listed-assembly'

export interface KeepAssemblyProps {
  assembly: SearchedAssembly
  listing: AssemblyListing
}

/** Keeps an option under a number, with the feature it was found for, and goes to its page; or to the one it stands ready as. */
export function KeepAssembly({ assembly, listing }: KeepAssemblyProps) {
  const mayPlan = useCan('plan')
  const router = useRouter()
  const keep = useKeepAssembly()
  const { fault, isBusy, attempt } = useAttempt()
  const name = `${assembly.cutter.code} in ${assembly.holder.code}`
  const look = 'max-lg:min-h-16 max-lg:flex-1'
  const builtAs = 'builtAs' in assembly ? assembly.builtAs : null
  if (builtAs) {
    return (
      <ButtonLink href={`/assemblies/${builtAs.id}`} prefetch={false} className={look}>
        Assembly {builtAs.number}
      </ButtonLink>
    )
  }
  if (!mayPlan) return null
  const handleKeep = () =>
    attempt(async () => {
      const kept = await keep(keptAssembly(assembly, listing))
      router.push(`/assemblies/${kept.id}`)
    })
  return (
    <>
      <Button
        variant="primary"
        className={look}
        disabled={isBusy}
        aria-label={`Keep ${name} as an assembly`}
        onClick={handleKeep}
      >
        {isBusy ? 'Keeping …' : 'Keep as assembly'}
      </Button>
      {fault ? (
        <p role="alert" className="text-collision w-full font-semibold">
          {fault instanceof Error ? fault.message : 'It was not kept.'}
        </p>
      ) : null}
    </>
  )
}
