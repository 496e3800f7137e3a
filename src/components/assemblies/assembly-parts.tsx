'use client'

import Link from 'next/link'
import { partItemKind } from '@/core/assemblies/types'
import { assemblyPartNames } from '@/lib/assembly-sentences'
import { itemPagePath } from '@/lib/catalogue-paths'
import type { AssemblyPart } from '@/schemas/assembly'
import { cellClass, headingCellClass, ItemSection } from '../catalogue/item-section'
import { partPlaceWords } from './assembly-words'

/** What it is put together from, in the order a person does it, and where each lies. */
export function AssemblyParts({ parts }: { parts: readonly AssemblyPart[] }) {
  return (
    <ItemSection title="Parts">
      <table className="w-full">
        <thead className="max-sm:sr-only">
          <tr className="border-hairline border-b">
            <th scope="col" className={headingCellClass}>
              Part
            </th>
            <th scope="col" className={headingCellClass}>
              Item
            </th>
            <th scope="col" className={headingCellClass}>
              Where
            </th>
          </tr>
        </thead>
        <tbody>
          {parts.map((part) => (
            <tr
              key={part.kind}
              className="border-hairline border-b align-baseline max-sm:grid max-sm:grid-cols-[7rem_1fr] max-sm:py-1.5"
            >
              <td className={`${cellClass} text-ink-soft max-sm:p-0`}>{assemblyPartNames[part.kind]}</td>
              <th scope="row" className={`${cellClass} text-left font-normal max-sm:p-0`}>
                <Link
                  href={itemPagePath(partItemKind(part.kind), part.itemId)}
                  prefetch={false}
                  className="text-accent inline-flex items-center font-semibold hover:underline pointer-coarse:min-h-11"
                >
                  {part.code}
                </Link>
                {part.description ? (
                  <span className="text-ink-soft block text-sm">{part.description}</span>
                ) : null}
              </th>
              <td className={`${cellClass} max-sm:col-start-2 max-sm:p-0`}>{partPlaceWords(part)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </ItemSection>
  )
}
