'use client'

import { useState } from 'react'
import { usePeople } from '@/hooks/use-people'
import { faultSentence } from '@/lib/field-faults'
import { roleNames } from '@/lib/role-names'
import type { Person, PersonLink } from '@/schemas/person'
import { PageHeading } from '../layout/page-heading'
import { Button, ButtonLink } from '../ui/button'
import { StateSentence } from '../ui/state-sentence'
import { LinkDialog } from './link-dialog'
import { PersonDialog } from './person-dialog'

/** Everyone of the shop, as a plain list; adding and changing happen in a dialog beside it. */
export function PeoplePage({ initialRows }: { initialRows: Person[] }) {
  const { data, error, refresh } = usePeople(initialRows)
  const [edited, setEdited] = useState<Person | 'new' | null>(null)
  const [link, setLink] = useState<PersonLink | null>(null)

  function handleSaved(result: PersonLink | null) {
    setEdited(null)
    if (result) setLink(result)
    void refresh()
  }

  return (
    <>
      <PageHeading title="People" note="Who may sign in, and what their role lets them do.">
        <ButtonLink href="/crib-members">Who gets the mail</ButtonLink>
        <Button variant="primary" onClick={() => setEdited('new')}>
          Add a person
        </Button>
      </PageHeading>
      {error ? (
        <StateSentence sentence={faultSentence(error)}>
          <Button onClick={() => void refresh()}>Try again</Button>
        </StateSentence>
      ) : null}
      <PeopleTable rows={data?.rows ?? []} onOpen={setEdited} />
      {data?.rows.length === 1 ? (
        <p className="max-w-[75ch] px-4 py-4 lg:px-6">
          Nobody but you yet. Whoever takes tools out of the crib needs an account of their own, so that the
          books say who has what: add them, and hand each the link to choose a password.
        </p>
      ) : null}
      {edited ? (
        <PersonDialog
          person={edited === 'new' ? null : edited}
          onClose={() => setEdited(null)}
          onSaved={handleSaved}
          onLink={(result) => {
            setEdited(null)
            setLink(result)
          }}
        />
      ) : null}
      {link ? <LinkDialog link={link} onClose={() => setLink(null)} /> : null}
    </>
  )
}

function standingOf(person: Person): string {
  if (!person.isActive) return 'Inactive'
  return person.hasPassword ? 'Active' : 'Invited, no password yet'
}

function PeopleTable({ rows, onOpen }: { rows: Person[]; onOpen: (person: Person) => void }) {
  return (
    <div className="border-ink bg-sheet border-t">
      <table className="w-full text-left text-[0.9375rem]">
        <thead className="border-ink border-b max-sm:hidden">
          <tr className="[&>th]:px-4 [&>th]:py-2 lg:[&>th]:px-6">
            <th scope="col">Name</th>
            <th scope="col">E-mail</th>
            <th scope="col">Role</th>
            <th scope="col">Standing</th>
            <th scope="col">Last seen</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((person) => (
            <tr
              key={person.id}
              className="border-hairline hover:bg-accent-wash border-b max-sm:block max-sm:px-4 max-sm:py-2 sm:[&>td]:px-4 sm:[&>td]:py-1.5 lg:[&>td]:px-6 max-sm:[&>td]:block"
            >
              <td>
                <button
                  type="button"
                  className="text-accent min-h-9 font-semibold hover:underline pointer-coarse:min-h-11"
                  onClick={() => onOpen(person)}
                >
                  {person.name}
                </button>
              </td>
              <td className="break-all">{person.email}</td>
              <td>{roleNames[person.role]}</td>
              <td className={person.isActive ? '' : 'text-ink-soft'}>{standingOf(person)}</td>
              <td className="text-ink-soft">
                <LastSeen at={person.lastSeenAt} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}

function LastSeen({ at }: { at: string | null }) {
  if (!at) return 'Never'
  const text = new Date(at).toLocaleString('en-GB', { dateStyle: 'medium', timeStyle: 'short' })
  return (
    <time dateTime={at} suppressHydrationWarning>
      {text}
    </time>
  )
}
