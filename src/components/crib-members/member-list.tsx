'use client'

import { useState } from 'react'
import { useCribMembers } from '@/hooks/use-crib-members'
import type { CribChoice } from '@/hooks/use-cribs'
import { faultSentence } from '@/lib/field-faults'
import { roleNames } from '@/lib/role-names'
import type { CribMember } from '@/schemas/crib-member'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { StateSentence } from '../ui/state-sentence'

export interface MemberListProps {
  crib: CribChoice
  /** The crib is worked on: it stays chosen though it has members now. */
  onChoose: () => void
}

/** Everyone of the shop with a box each: ticked, they are a member of this crib. */
export function MemberList({ crib, onChoose }: MemberListProps) {
  const { data, error, refresh, setMember } = useCribMembers(crib.id)
  const [fault, setFault] = useState<string>()

  async function handleChange(person: CribMember, isMember: boolean) {
    onChoose()
    setFault(undefined)
    try {
      await setMember(person.userId, isMember)
    } catch (refusal) {
      setFault(`${person.name} was not changed. ${faultSentence(refusal)}`)
    }
  }

  if (!data) {
    return error ? (
      <StateSentence sentence={`The members of ${crib.code} could not be read. ${faultSentence(error)}`}>
        <Button onClick={() => void refresh()}>Try again</Button>
      </StateSentence>
    ) : (
      <StateSentence sentence={`Reading who is in ${crib.code} …`} />
    )
  }
  const members = data.rows.filter(({ isMember }) => isMember).length
  return (
    <>
      <div className="flex flex-col gap-3 px-4 pb-3 lg:px-6">
        {members === 0 ? (
          <Notice kind="caution">
            {crib.code} has no members, so its mail goes to every crib manager and admin.
          </Notice>
        ) : null}
        {fault ? (
          <Notice kind="collision" isAnnounced>
            {fault}
          </Notice>
        ) : null}
      </div>
      <fieldset className="border-ink bg-sheet border-t">
        <legend className="sr-only">Members of {crib.name}</legend>
        {data.rows.map((person) => (
          <label
            key={person.userId}
            className="border-hairline hover:bg-accent-wash has-focus-visible:outline-accent flex min-h-11 cursor-pointer items-center gap-3 border-b px-4 py-1.5 has-focus-visible:outline-3 has-focus-visible:-outline-offset-3 lg:px-6"
          >
            <input
              type="checkbox"
              className="accent-accent size-6 shrink-0"
              checked={person.isMember}
              onChange={(event) => void handleChange(person, event.target.checked)}
            />
            <span className="grid min-w-0 flex-1 gap-x-4 sm:grid-cols-[minmax(0,2fr)_minmax(0,3fr)_minmax(0,1fr)]">
              <span className="font-semibold">{person.name}</span>
              <span className="text-ink-soft break-all">{person.email}</span>
              <span className="text-ink-soft">{roleNames[person.role]}</span>
            </span>
          </label>
        ))}
      </fieldset>
    </>
  )
}
