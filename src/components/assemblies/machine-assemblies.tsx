'use client'

import Link from 'next/link'
import { useAssemblies } from '@/hooks/use-assemblies'
import { faultSentence } from '@/lib/field-faults'
import { ItemSection } from '../catalogue/item-section'
import { SectionState } from '../catalogue/section-state'
import { AssembliesTable } from './assemblies-table'

/** What is in a machine now, pocket by pocket. */
export function MachineAssemblies({ machineId }: { machineId: string }) {
  const { rows, error, hasMore, refresh } = useAssemblies({ machineId, sort: 'pocket' })
  return (
    <ItemSection
      title="In it now"
      aside={
        <Link
          href={`/assemblies?machineId=${machineId}`}
          prefetch={false}
          className="text-accent inline-flex min-h-6 items-center hover:underline pointer-coarse:min-h-11"
        >
          Among all assemblies
        </Link>
      }
    >
      {error ? (
        <SectionState sentence={faultSentence(error)} onRetry={() => void refresh()} />
      ) : rows === undefined ? (
        <SectionState sentence="Reading what is in it …" />
      ) : rows.length === 0 ? (
        <SectionState sentence="No assembly is in it. A built one is moved in from its own page." />
      ) : (
        <>
          <AssembliesTable rows={rows} isByMachine={false} />
          {hasMore ? (
            <p className="text-ink-soft py-2">More than these {rows.length}: see the list.</p>
          ) : null}
        </>
      )}
    </ItemSection>
  )
}
