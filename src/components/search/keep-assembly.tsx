'use client'

import { KeepAssemblyButton } from '../assemblies/keep-assembly-button'
import { ButtonLink } from '../ui/button'
import { type AssemblyListing, keptOption, type SearchedAssembly } from './listed-assembly'

export interface KeepAssemblyProps {
  assembly: SearchedAssembly
  listing: AssemblyListing
}

/** Keeps an option under a number, with the feature it was found for; or leads to the assembly it stands ready as. */
export function KeepAssembly({ assembly, listing }: KeepAssemblyProps) {
  const builtAs = 'builtAs' in assembly ? assembly.builtAs : null
  if (builtAs) {
    return (
      <ButtonLink
        href={`/assemblies/${builtAs.id}`}
        prefetch={false}
        className="max-lg:min-h-16 max-lg:flex-1"
      >
        Assembly {builtAs.number}
      </ButtonLink>
    )
  }
  return (
    <span className="contents [&>button]:min-h-11 max-lg:[&>button]:min-h-16 max-lg:[&>button]:flex-1">
      <KeepAssemblyButton
        option={keptOption(assembly, listing)}
        label={`Keep ${assembly.cutter.code} in ${assembly.holder.code} as an assembly`}
      />
    </span>
  )
}
