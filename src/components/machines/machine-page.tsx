'use client'

import { useState } from 'react'
import { toast } from '@/components/ui/toast'
import { useMachine, useSetUps } from '@/hooks/use-machines'
import { callApi } from '@/lib/api-client'
import { faultSentence } from '@/lib/field-faults'
import type { MachineResponse } from '@/schemas/machine'
import type { SetUpResponse } from '@/schemas/set-up'
import { MachineAssemblies } from '../assemblies/machine-assemblies'
import { PageHeading } from '../layout/page-heading'
import { useCan } from '../layout/shop-context'
import { Button } from '../ui/button'
import { Notice } from '../ui/notice'
import { StateSentence } from '../ui/state-sentence'
import { MachineDialog } from './machine-dialog'
import { MachineFacts } from './machine-facts'
import { SetUpDialog } from './set-up-dialog'
import { SetUpList } from './set-up-list'
import { SetUpSheet } from './set-up-sheet'
import { useMachineAddress } from './use-machine-address'

export interface MachinePageProps {
  firstMachine: MachineResponse
  firstSetUps: SetUpResponse[]
}

/** One machine: its daylight with a set-up in it first, then what the machine is. */
export function MachinePage({ firstMachine, firstSetUps }: MachinePageProps) {
  const { machine, refresh } = useMachine(firstMachine)
  const setUps = useSetUps(machine.id, firstSetUps)
  const address = useMachineAddress()
  const mayKeep = useCan('keepCrib')
  const [edited, setEdited] = useState<'machine' | 'newSetUp' | SetUpResponse | null>(null)
  const chosen = setUps.rows.find(({ id }) => id === address.valueOf('setUp')) ?? setUps.rows[0] ?? null

  async function handleArchive() {
    try {
      if (machine.archivedAt === null) await callApi('DELETE', `/api/machines/${machine.id}`)
      else {
        const body = { version: machine.version, archivedAt: null }
        await callApi('PATCH', `/api/machines/${machine.id}`, { body })
      }
      await refresh()
    } catch (error) {
      toast.error(faultSentence(error))
    }
  }

  function handleSetUpSaved(setUp: SetUpResponse | null) {
    setEdited(null)
    void setUps.refresh()
    address.change({ setUp: setUp?.id ?? null })
  }

  return (
    <>
      <PageHeading title={`${machine.code} · ${machine.name}`} note={machine.note || null}>
        {mayKeep ? (
          <>
            <Button size="compact" onClick={() => setEdited('newSetUp')}>
              Add a set-up
            </Button>
            <Button size="compact" variant="quiet" onClick={() => setEdited('machine')}>
              Change the machine
            </Button>
            <Button size="compact" variant="quiet" onClick={() => void handleArchive()}>
              {machine.archivedAt === null ? 'Archive' : 'Bring it back'}
            </Button>
          </>
        ) : null}
      </PageHeading>
      <div className="flex flex-col gap-8 px-4 pb-10 lg:px-6">
        {machine.archivedAt === null ? null : (
          <Notice kind="plain">This machine is archived: nothing is looked for on it.</Notice>
        )}
        {setUps.error ? (
          <StateSentence sentence={faultSentence(setUps.error)}>
            <Button onClick={() => void setUps.refresh()}>Try again</Button>
          </StateSentence>
        ) : null}
        {chosen ? (
          <div className="grid gap-x-8 gap-y-5 lg:grid-cols-[21rem_minmax(0,1fr)]">
            <SetUpList
              setUps={setUps.rows}
              chosenId={chosen.id}
              onChoose={(id) => address.change({ setUp: id })}
            />
            <SetUpSheet
              key={chosen.id}
              machine={machine}
              setUp={chosen}
              onEdit={mayKeep ? () => setEdited(chosen) : null}
            />
          </div>
        ) : setUps.error ? null : (
          <StateSentence
            sentence={
              mayKeep
                ? 'No set-up yet. Enter what stands on the table and how far down a tip is driven, and the gauge lengths that work follow.'
                : 'No set-up yet. The crib manager enters what stands on the table.'
            }
          >
            {mayKeep ? (
              <Button variant="primary" onClick={() => setEdited('newSetUp')}>
                Add the first set-up
              </Button>
            ) : null}
          </StateSentence>
        )}
        <MachineAssemblies machineId={machine.id} />
        <MachineFacts machine={machine} />
      </div>
      {edited === 'machine' ? (
        <MachineDialog
          machine={machine}
          onClose={() => setEdited(null)}
          onSaved={() => {
            setEdited(null)
            void refresh()
            void setUps.refresh()
          }}
        />
      ) : null}
      {edited !== null && edited !== 'machine' ? (
        <SetUpDialog
          machine={machine}
          setUp={edited === 'newSetUp' ? null : edited}
          onClose={() => setEdited(null)}
          onSaved={handleSetUpSaved}
        />
      ) : null}
    </>
  )
}
