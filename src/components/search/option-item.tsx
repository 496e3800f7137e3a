'use client'

import Link from 'next/link'
import type { SearchOptionResponse } from '@/schemas/reach-search'
import { useReading } from '../reach/use-reach-check'
import { AssemblyItem } from './assembly-item'
import type { AssemblyListing } from './listed-assembly'
import { searchQuery } from './search-question'

export interface OptionItemProps {
  option: SearchOptionResponse
  place: number
  listing: AssemblyListing
}

/** What reaches, and why it stands where it stands. */
export function OptionItem({ option, place, listing }: OptionItemProps) {
  const { draft } = listing
  const reading = useReading()
  const picks = { ...draft.check.picks, cutter: option.cutter.id }
  const holders = searchQuery({ ...draft, check: { ...draft.check, picks } }, reading)
  return (
    <AssemblyItem assembly={option} place={place} listing={listing}>
      <p>{option.reason}</p>
      {draft.check.picks.cutter === null ? (
        <Link
          href={`/search?${holders}`}
          prefetch={false}
          className="text-accent inline-flex min-h-6 items-center font-semibold hover:underline pointer-coarse:min-h-11"
        >
          Everything that could hold {option.cutter.code}
        </Link>
      ) : null}
    </AssemblyItem>
  )
}
