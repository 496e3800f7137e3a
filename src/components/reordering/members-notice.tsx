'use client'

import Link from 'next/link'
import { useCribs } from '@/hooks/use-cribs'
import { useCan } from '../layout/shop-context'
import { Notice } from '../ui/notice'

/** Says of which cribs nobody in particular hears, to those who can name somebody. */
export function MembersNotice({ cribId = '' }: { cribId?: string }) {
  const canKeep = useCan('keepCrib')
  const { data } = useCribs()
  const lone = (data?.rows ?? []).filter(
    ({ id, members }) => members === 0 && (cribId === '' || id === cribId),
  )
  const [first, ...others] = lone
  if (!canKeep || !first) return null
  const names =
    others.length > 2
      ? `${lone.length} cribs have`
      : `${lone.map(({ code }) => code).join(', ')} ${others.length > 0 ? 'have' : 'has'}`
  return (
    <div className="px-4 pb-3 lg:px-6">
      <Notice kind="caution">
        {names} no members, so mail of what is low goes to every crib manager and admin.{' '}
        <Link href="/crib-members" className="text-accent font-semibold underline">
          Choose who gets it
        </Link>
      </Notice>
    </div>
  )
}
