import type { Knex } from 'knex'
import type { FirstDay } from '@/schemas/first-day'

export type FirstDayCounts = Omit<FirstDay, 'isDone'> & { areSettingsSeen: boolean }

/** Whether anything that a shop cannot work without is missing; asked with every page, so it counts nothing. */
export async function readIsFirstDayOpen(db: Knex): Promise<boolean> {
  const hasKind = (kind: string) => `exists(select from items where kind = '${kind}' and archived_at is null)`
  const { rows } = await db.raw<{ rows: { isOpen: boolean }[] }>(
    `select not (${hasKind('cutter')} and ${hasKind('holder')}
        and exists(select from locations where kind = 'bin' and archived_at is null)
        and exists(select from stock_levels where on_hand > 0)) as "isOpen"`,
  )
  return rows[0]?.isOpen ?? false
}

/** How much there is of each thing a shop begins with. */
export async function readFirstDayCounts(db: Knex): Promise<FirstDayCounts> {
  const ofKind = (kind: string) =>
    `(select count(*)::int from items where kind = '${kind}' and archived_at is null)`
  const { rows } = await db.raw<{ rows: FirstDayCounts[] }>(
    `select (select count(*)::int from cribs) as cribs,
      (select count(*)::int from locations where kind = 'bin' and archived_at is null) as bins,
      ${ofKind('cutter')} as cutters, ${ofKind('holder')} as holders,
      ${ofKind('collet')} as collets, ${ofKind('extension')} as extensions,
      (select coalesce(sum(balances.quantity), 0)::int from balances
        join locations on locations.id = balances.location_id and locations.kind = 'bin') as "piecesInBins",
      (select count(*)::int from users where is_active) as people,
      exists(select from audit_entries where action = 'settings-changed') as "areSettingsSeen"`,
  )
  const [counts] = rows
  if (!counts) throw new Error('The counts of the first day gave no row.')
  return counts
}
