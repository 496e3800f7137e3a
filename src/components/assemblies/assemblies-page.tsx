'use client'

import { FileUp } from 'lucide-react'
import { usePathname, useRouter, useSearchParams } from 'next/navigation'
import { useState } from 'react'
import { useAssemblies } from '@/hooks/use-assemblies'
import { useMachines } from '@/hooks/use-machines'
import { assemblyStateNames } from '@/lib/assembly-sentences'
import { faultSentence } from '@/lib/field-faults'
import { PageHeading } from '../layout/page-heading'
import { useCan } from '../layout/shop-context'
import { Button, ButtonLink } from '../ui/button'
import { SelectField } from '../ui/select-field'
import { StateSentence } from '../ui/state-sentence'
import { TextField } from '../ui/text-field'
import { AssembliesTable } from './assemblies-table'
import { PresetterDialog } from './presetter-dialog'

const filterNames = ['q', 'state', 'machineId', 'inMachine', 'marked', 'itemId', 'archived', 'sort'] as const

/** The shop's assemblies: what is in each machine now, what is built, what is planned, what no longer holds. */
export function AssembliesPage() {
  const { filters, setFilters } = useFilters()
  const mayMove = useCan('move')
  const [isImporting, setIsImporting] = useState(false)
  const { rows, total, error, hasMore, loadMore, refresh } = useAssemblies({
    // By machine and pocket where that is what is looked at.
    ...(filters.inMachine || filters.machineId ? { sort: 'machine,pocket' } : {}),
    ...filters,
  })
  return (
    <>
      <PageHeading
        title="Assemblies"
        note="Cutter, what holds it and the stick-out it is set to, each under its number."
      >
        {mayMove ? (
          <Button onClick={() => setIsImporting(true)}>
            <FileUp aria-hidden="true" className="size-5" />
            Presetter file
          </Button>
        ) : null}
        <ButtonLink href="/reach">Plan one by a reach check</ButtonLink>
      </PageHeading>
      <Filters filters={filters} onChange={setFilters} />
      {error ? (
        <StateSentence sentence={faultSentence(error)}>
          <Button onClick={() => void refresh()}>Try again</Button>
        </StateSentence>
      ) : rows === undefined ? (
        <StateSentence sentence="Reading the assemblies …" />
      ) : rows.length === 0 ? (
        <Nothing filters={filters} onClear={() => setFilters({})} />
      ) : (
        <>
          <p className="text-ink-soft px-4 pb-2 lg:px-6">
            {total === 1 ? '1 assembly' : `${total} assemblies`}
          </p>
          <AssembliesTable rows={rows} isByMachine={Boolean(filters.inMachine || filters.machineId)} />
          {hasMore ? (
            <div className="px-4 py-3 lg:px-6">
              <Button onClick={() => void loadMore()}>Show more</Button>
            </div>
          ) : null}
        </>
      )}
      {isImporting ? (
        <PresetterDialog onClose={() => setIsImporting(false)} onTaken={() => void refresh()} />
      ) : null}
    </>
  )
}

function Nothing({ filters, onClear }: { filters: FilterValues; onClear: () => void }) {
  const names = Object.keys(filters)
  if (names.length > 0) {
    const isMarkAlone = filters.marked === 'true' && names.length === 1
    const isMachineAlone = names.length === 1 && (filters.inMachine || filters.machineId)
    return (
      <StateSentence
        sentence={
          isMarkAlone
            ? 'Every assembly holds.'
            : isMachineAlone
              ? 'No assembly is there now.'
              : 'No assembly matches this.'
        }
      >
        <Button onClick={onClear}>Show all</Button>
      </StateSentence>
    )
  }
  return (
    <StateSentence sentence="No assembly is kept yet. Check that a tool reaches, then keep it as an assembly.">
      <ButtonLink href="/reach" variant="primary">
        Check a reach
      </ButtonLink>
    </StateSentence>
  )
}

type FilterValues = Readonly<Record<string, string>>

/** In the address bar, so that a view can be shared. */
function useFilters() {
  const params = useSearchParams()
  const router = useRouter()
  const pathname = usePathname()
  const filters: FilterValues = Object.fromEntries(
    filterNames.flatMap((name) => {
      const value = params.get(name)
      return value ? [[name, value]] : []
    }),
  )
  function setFilters(next: FilterValues) {
    const query = new URLSearchParams(Object.entries(next).filter(([, value]) => value !== ''))
    router.replace(query.size > 0 ? `${pathname}?${query}` : pathname, { scroll: false })
  }
  return { filters, setFilters }
}

function Filters({
  filters,
  onChange,
}: {
  filters: FilterValues
  onChange: (filters: FilterValues) => void
}) {
  const { rows: machines } = useMachines()
  const [text, setText] = useState(filters.q ?? '')
  const change = (changed: FilterValues) => onChange({ ...filters, ...changed })
  const where = filters.machineId ?? (filters.inMachine ? 'machines' : (filters.state ?? ''))
  function handleWhere(value: string) {
    const { machineId: _, inMachine: __, state: ___, ...rest } = filters
    const isMachine = machines.some(({ id }) => id === value)
    onChange({
      ...rest,
      ...(isMachine ? { machineId: value } : value === 'machines' ? { inMachine: 'true' } : { state: value }),
    })
  }
  return (
    <search aria-label="Assemblies">
      <form
        className="flex flex-wrap items-end gap-3 px-4 pb-3 lg:px-6"
        onSubmit={(event) => {
          event.preventDefault()
          change({ q: text.trim() })
        }}
      >
        <TextField
          label="Search"
          type="search"
          placeholder="Number, name or code"
          className="w-72 max-sm:w-full"
          value={text}
          onChange={(event) => setText(event.target.value)}
          onBlur={() => (text.trim() === (filters.q ?? '') ? undefined : change({ q: text.trim() }))}
        />
        <SelectField
          label="Which"
          className="max-sm:flex-1"
          value={where}
          onChange={(event) => handleWhere(event.target.value)}
          options={[
            { value: '', label: 'All' },
            { value: 'machines', label: 'In the machines now' },
            ...machines.map(({ id, code, name }) => ({ value: id, label: `In ${code} · ${name}` })),
            ...Object.entries(assemblyStateNames).map(([value, label]) => ({ value, label })),
          ]}
        />
        <SelectField
          label="Mark"
          className="max-sm:flex-1"
          value={filters.marked ?? ''}
          onChange={(event) => change({ marked: event.target.value })}
          options={[
            { value: '', label: 'Any' },
            { value: 'true', label: 'No longer holds' },
            { value: 'false', label: 'Holds' },
          ]}
        />
      </form>
    </search>
  )
}
