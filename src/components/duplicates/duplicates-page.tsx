'use client'

import { usePathname, useSearchParams } from 'next/navigation'
import { useState } from 'react'
import { type ToolingKind, toolingKinds } from '@/core/stock/kinds'
import { useDuplicates } from '@/hooks/use-duplicates'
import { fullSizeWords } from '@/lib/size-words'
import { PageHeading } from '../layout/page-heading'
import { useShop } from '../layout/shop-context'
import { Button } from '../ui/button'
import { SelectField } from '../ui/select-field'
import { StateSentence } from '../ui/state-sentence'
import { DuplicateGroup } from './duplicate-group'
import { groupsText } from './groups-text'
import { MergeDialog, type MergePair } from './merge-dialog'

const kindNames: Readonly<Record<ToolingKind, string>> = {
  cutter: 'Cutters',
  holder: 'Holders',
  collet: 'Collets',
  extension: 'Extensions',
}

/** Items that measure the same under different codes, to be made one. */
export function DuplicatesPage() {
  const params = useSearchParams()
  const pathname = usePathname()
  const kind = toolingKinds.find((candidate) => candidate === params.get('kind')) ?? 'cutter'
  const { data, error, refresh } = useDuplicates(kind)
  const [pair, setPair] = useState<MergePair | null>(null)
  const many = kindNames[kind].toLowerCase()
  const { unit } = useShop()
  return (
    <>
      <PageHeading
        title="Duplicates"
        note="The same in every dimension, under different codes. Whether they are the same to the shop, maker and coating included, only a person can say."
      />
      <div className="flex flex-col gap-5 px-4 pb-10 lg:px-6">
        <SelectField
          label="Kind"
          className="max-w-64"
          value={kind}
          onChange={(event) =>
            window.history.replaceState(null, '', `${pathname}?kind=${event.target.value}`)
          }
          options={toolingKinds.map((value) => ({ value, label: kindNames[value] }))}
        />
        {error ? (
          <StateSentence sentence={`The ${many} could not be compared. ${error.message}`}>
            <Button onClick={() => void refresh()}>Try again</Button>
          </StateSentence>
        ) : null}
        {!data && !error ? <StateSentence sentence={`Comparing the ${many} …`} /> : null}
        {data && data.groups.length === 0 ? (
          <StateSentence sentence={`No two ${many} in use measure the same.`} />
        ) : null}
        {data && data.groups.length > 0 ? (
          <p role="status">
            {groupsText(data.total, many)}
            {data.total > data.groups.length ? ` The first ${data.groups.length} are shown.` : ''}
          </p>
        ) : null}
        {data?.groups.map((group) => (
          <DuplicateGroup
            key={group.items.map(({ id }) => id).join()}
            kind={kind}
            size={fullSizeWords(group.size, unit)}
            items={group.items}
            onMerge={setPair}
          />
        ))}
      </div>
      {pair ? (
        <MergeDialog
          pair={pair}
          onClose={() => setPair(null)}
          onMerged={() => {
            setPair(null)
            void refresh()
          }}
        />
      ) : null}
    </>
  )
}
