'use client'

import { Archive, Boxes, Hammer, MoveRight, Pencil, Printer, Ruler } from 'lucide-react'
import Link from 'next/link'
import { assemblyStateNames } from '@/lib/assembly-sentences'
import type { AssemblyResponse } from '@/schemas/assembly'
import { useCan } from '../layout/shop-context'
import { Button } from '../ui/button'
import { spotWords } from './assembly-words'
import { Mark } from './mark'

export type AssemblyPageAct = 'build' | 'measure' | 'pocket' | 'breakDown' | 'edit' | 'archive'

/** Its number, where it is, and what can be done with it: at the machine in gloves. */
export function AssemblyHeading({
  assembly,
  onAct,
}: {
  assembly: AssemblyResponse
  onAct: (act: AssemblyPageAct) => void
}) {
  const { number, name, state, archivedAt } = assembly
  const mayMove = useCan('move')
  const mayPlan = useCan('plan')
  const isBuilt = state === 'built'
  const mayChange = archivedAt === null && mayPlan && (mayMove || !isBuilt)
  return (
    <div className="flex flex-wrap items-start justify-between gap-x-6 gap-y-3">
      <div className="min-w-0">
        <p className="text-sm">
          <Link
            href="/assemblies"
            prefetch={false}
            className="text-accent inline-flex items-center hover:underline pointer-coarse:min-h-11"
          >
            Assemblies
          </Link>
        </p>
        <h1 className="text-2xl break-words">
          Assembly {number}
          {name ? <span className="font-normal"> · {name}</span> : null}
        </h1>
        <p className="flex flex-wrap items-center gap-x-3">
          <span className="font-semibold">{isBuilt ? spotWords(assembly) : assemblyStateNames[state]}</span>
          <Mark {...assembly} />
        </p>
      </div>
      <div className="flex flex-wrap gap-2 max-sm:grid max-sm:w-full max-sm:grid-cols-2 max-sm:[&>button]:px-2 max-sm:[&>button:first-child]:col-span-2">
        {mayMove && archivedAt === null ? (
          isBuilt ? (
            <>
              <Button variant="primary" size="counter" onClick={() => onAct('measure')}>
                <Ruler aria-hidden="true" className="size-6" />
                Measure
              </Button>
              <Button size="counter" onClick={() => onAct('pocket')}>
                <MoveRight aria-hidden="true" className="size-6" />
                Move
              </Button>
              <Button size="counter" onClick={() => onAct('breakDown')}>
                <Boxes aria-hidden="true" className="size-6" />
                Break down
              </Button>
            </>
          ) : (
            <Button variant="primary" size="counter" onClick={() => onAct('build')}>
              <Hammer aria-hidden="true" className="size-6" />
              Build
            </Button>
          )
        ) : null}
        <Button size="counter" onClick={() => window.print()}>
          <Printer aria-hidden="true" className="size-6" />
          Set-up sheet
        </Button>
        {mayChange ? (
          <Button variant="quiet" size="counter" onClick={() => onAct('edit')}>
            <Pencil aria-hidden="true" className="size-6" />
            Change
          </Button>
        ) : null}
        {mayChange && !isBuilt ? (
          <Button variant="quiet" size="counter" onClick={() => onAct('archive')}>
            <Archive aria-hidden="true" className="size-6" />
            Archive
          </Button>
        ) : null}
      </div>
    </div>
  )
}
