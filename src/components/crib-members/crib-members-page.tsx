'use client'

import { useState } from 'react'
import { type CribChoice, useCribs } from '@/hooks/use-cribs'
import { faultSentence } from '@/lib/field-faults'
import { PageHeading } from '../layout/page-heading'
import { useCan, useShop } from '../layout/shop-context'
import { Button, ButtonLink } from '../ui/button'
import { SelectField } from '../ui/select-field'
import { StateSentence } from '../ui/state-sentence'
import { firstCrib } from './first-crib'
import { MemberList } from './member-list'

/** Who works in a crib, and so gets its mail of what is low. */
export function CribMembersPage() {
  const canAdminister = useCan('administer')
  const { actor } = useShop()
  const { data, error } = useCribs()
  const [chosen, setChosen] = useState<string | null>(null)
  const cribs = data?.rows ?? []
  const crib = cribs.find(({ id }) => id === chosen) ?? firstCrib(cribs, actor.homeCribId)
  return (
    <>
      <PageHeading
        title="Who gets the mail"
        note="The members of a crib get one mail when something in it falls to its reorder point. Every change counts at once."
      >
        {crib ? (
          <SelectField
            label="Crib"
            value={crib.id}
            onChange={(event) => setChosen(event.target.value)}
            options={cribs.map((one) => ({ value: one.id, label: cribLabel(one) }))}
          />
        ) : null}
        <ButtonLink href="/alerts" className="self-end">
          Low stock
        </ButtonLink>
        {canAdminister ? (
          <ButtonLink href="/mail" className="self-end">
            Mail
          </ButtonLink>
        ) : null}
      </PageHeading>
      {error ? (
        <StateSentence sentence={`The cribs could not be read. ${faultSentence(error)}`}>
          <Button onClick={() => window.location.reload()}>Try again</Button>
        </StateSentence>
      ) : !data ? (
        <StateSentence sentence="Reading the cribs …" />
      ) : crib ? (
        <MemberList key={crib.id} crib={crib} onChoose={() => setChosen(crib.id)} />
      ) : (
        <StateSentence sentence="There is no crib yet.">
          <ButtonLink href="/locations">Locations</ButtonLink>
        </StateSentence>
      )}
    </>
  )
}

function cribLabel({ code, name, members }: CribChoice): string {
  return `${code} · ${name} (${members === 0 ? 'nobody' : members})`
}
