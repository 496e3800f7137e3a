import type { Knex } from 'knex'

export interface LedgerCheck {
  movements: number
  /** One sentence each; none when the books are right. */
  faults: string[]
}

/**
 * Adds every movement up again and says where balances, levels, pieces, alerts or assemblies differ from what follows from them. It reads
 * one snapshot, so it may run beside a working shop, and it shares nothing with the triggers it checks.
 */
export async function ledgerFaults(db: Knex): Promise<LedgerCheck> {
  return db.transaction(
    async (trx) => {
      const count = await trx('movements').first(trx.raw('count(*)::int as movements'))
      const faults: string[] = []
      for (const question of questions) {
        const { rows } = await trx.raw<{ rows: { fault: string }[] }>(question)
        faults.push(...rows.map((row) => row.fault))
      }
      return { movements: count.movements, faults }
    },
    { isolationLevel: 'repeatable read', readOnly: true },
  )
}

/** What came to a place, less what left it. */
const summed = `
  select item_id, location_id, condition, sum(quantity) as quantity from (
    select item_id, to_location_id as location_id, to_condition as condition, quantity from movements
    union all
    select item_id, from_location_id, from_condition, -quantity from movements
  ) as an_end group by item_id, location_id, condition`

const balancesAreSums = `
  with summed as (${summed})
  select format('%s at %s, %s: balance %s, movements %s', items.code, locations.code, condition,
    coalesce(balances.quantity, 0), coalesce(summed.quantity, 0)) as fault
  from balances full join summed using (item_id, location_id, condition)
  join items on items.id = item_id join locations on locations.id = location_id
  where coalesce(balances.quantity, 0) <> coalesce(summed.quantity, 0)
  order by items.code, locations.code, condition`

const itemsSumToZero = `
  select format('%s: its balances sum to %s, not zero', items.code, sum(quantity)) as fault
  from balances join items on items.id = item_id
  group by items.code having sum(quantity) <> 0 order by items.code`

const noneBelowZero = `
  select format('%s at %s, %s: %s, less than nothing', items.code, locations.code, condition, quantity) as fault
  from balances join items on items.id = item_id join locations on locations.id = location_id
  where quantity < 0 and locations.kind not in ('supplier', 'scrap', 'count_adjustment')
  order by items.code, locations.code, condition`

const onlyPlacesHold = `
  select format('%s at %s: a %s holds no stock', items.code, locations.code, locations.kind) as fault
  from (${summed}) as summed join items on items.id = item_id join locations on locations.id = location_id
  where summed.quantity <> 0 and locations.kind in ('crib', 'cabinet', 'drawer')
  order by items.code, locations.code`

const levelsAreSums = `
  with summed as (${summed}), on_hand as (
    select item_id, crib_id, sum(quantity) as quantity
    from summed join locations on locations.id = location_id
    where locations.kind = 'bin' and condition <> 'worn' group by item_id, crib_id)
  select format('%s in crib %s: level %s on hand, movements %s', items.code, cribs.code,
    coalesce(stock_levels.on_hand, 0), coalesce(on_hand.quantity, 0)) as fault
  from stock_levels full join on_hand using (item_id, crib_id)
  join items on items.id = item_id join cribs on cribs.id = crib_id
  where coalesce(stock_levels.on_hand, 0) <> coalesce(on_hand.quantity, 0)
  order by items.code, cribs.code`

const piecesAreWhereLastMoved = `
  select format('piece %s: said to be at %s, last moved to %s', pieces.tag, coalesce(here.code, 'no place'),
    coalesce(there.code, 'no place')) as fault
  from pieces
  left join lateral (
    select to_location_id, to_condition from movements where piece_id = pieces.id order by id desc limit 1
  ) as last on true
  left join locations as here on here.id = pieces.location_id
  left join locations as there on there.id = last.to_location_id
  where (pieces.location_id, pieces.condition) is distinct from (last.to_location_id, last.to_condition)
  order by pieces.tag`

const piecesAreTheBalance = `
  with counted as (
    select item_id, location_id, condition, count(*) as quantity from pieces
    where location_id is not null group by item_id, location_id, condition)
  select format('%s at %s, %s: balance %s, tagged pieces %s', items.code, locations.code, condition,
    coalesce(balances.quantity, 0), coalesce(counted.quantity, 0)) as fault
  from balances full join counted using (item_id, location_id, condition)
  join items on items.id = item_id join locations on locations.id = location_id
  where items.is_tracked_by_piece and not locations.is_outside
    and coalesce(balances.quantity, 0) <> coalesce(counted.quantity, 0)
  order by items.code, locations.code, condition`

/** A merge changes a piece's item by movements; one that a count missed goes over without, since it is nowhere. */
const piecesAreOfWhatLastMoved = `
  select format('piece %s: a piece of %s, last moved as %s', pieces.tag, items.code, moved.code) as fault
  from pieces
  join items on items.id = pieces.item_id
  join lateral (select item_id from movements where piece_id = pieces.id order by id desc limit 1) as last on true
  join items as moved on moved.id = last.item_id
  left join locations on locations.id = pieces.location_id
  where last.item_id <> pieces.item_id
    and locations.kind is distinct from 'count_adjustment'
  order by pieces.tag`

/** What left the one item's books by a merge entered the other's, place by place and piece by piece. */
const mergesArePaired = `
  select format('the merge of %s: %s more in than out at %s, %s', items.code, sum(quantity), locations.code, condition)
    as fault
  from (
    select merged_item_id, piece_id, to_location_id as location_id, to_condition as condition, quantity
    from movements where merged_item_id <> item_id
    union all
    select merged_item_id, piece_id, from_location_id, from_condition, -quantity
    from movements where merged_item_id = item_id
  ) as an_end
  join items on items.id = merged_item_id join locations on locations.id = location_id
  group by items.code, locations.code, condition, piece_id having sum(quantity) <> 0
  order by items.code, locations.code, condition`

const reversalsMirror = `
  select format('movement %s is no mirror of %s, which it reverses', reversal.id, reversed.id) as fault
  from movements as reversal join movements as reversed on reversed.id = reversal.reverses_id
  where (reversal.item_id, reversal.quantity, reversal.from_location_id, reversal.from_condition,
      reversal.to_location_id, reversal.to_condition)
    is distinct from (reversed.item_id, reversed.quantity, reversed.to_location_id, reversed.to_condition,
      reversed.from_location_id, reversed.from_condition)
  order by reversal.id`

/** Position with on hand added up again; an alert is open where, and only where, it is at or below the reorder point. */
const alertsAreWhatIsLow = `
  with summed as (${summed}), on_hand as (
    select item_id, crib_id, sum(quantity) as quantity
    from summed join locations on locations.id = location_id
    where locations.kind = 'bin' and condition <> 'worn' group by item_id, crib_id
  ), kept as (
    select point.item_id, point.crib_id, point.reorder_point,
      coalesce(on_hand.quantity, 0) - coalesce(level.reserved, 0) + coalesce(level.coming, 0) as position
    from reorder_points as point
    join items on items.id = point.item_id and items.archived_at is null
    left join on_hand using (item_id, crib_id)
    left join stock_levels as level using (item_id, crib_id)
  ), open_alerts as (select item_id, crib_id from alerts where closed_at is null)
  select format('%s in crib %s: position %s, reorder point %s, %s', items.code, cribs.code,
    coalesce(kept.position::text, 'not kept'), coalesce(kept.reorder_point::text, 'none'),
    case when open_alerts.item_id is null then 'but no alert is open' else 'but an alert is open' end) as fault
  from kept full join open_alerts using (item_id, crib_id)
  join items on items.id = item_id join cribs on cribs.id = crib_id
  where coalesce(kept.position <= kept.reorder_point, false) <> (open_alerts.item_id is not null)
  order by items.code, cribs.code`

/** A part that is no longer with its built assembly is told of, or is about to be looked at. */
const goneAssemblyPartsAreTold = `
  with summed as (${summed}), part as (
    select placed.*, count(*) over (partition by item_id, location_id, condition) as claimed
    from assembly_parts as placed where location_id is not null)
  select format('assembly %s: its %s is gone from %s, and nothing says so', assemblies.number, items.code,
    locations.code) as fault
  from part
  join assemblies on assemblies.id = part.assembly_id
  join items on items.id = part.item_id join locations on locations.id = part.location_id
  left join summed on (summed.item_id, summed.location_id, summed.condition)
    = (part.item_id, part.location_id, part.condition)
  left join lateral (
    select to_location_id from movements where piece_id = part.piece_id order by id desc limit 1
  ) as last on true
  where case when part.piece_id is null then coalesce(summed.quantity, 0) < part.claimed
      else last.to_location_id is distinct from part.location_id end
    and not exists (select from assembly_findings as finding
      where finding.assembly_id = part.assembly_id and finding.code = 'part_gone' and finding.resolved_at is null)
    and not exists (select from assembly_rechecks as due where due.assembly_id = part.assembly_id)
  order by assemblies.number, items.code`

const questions = [
  balancesAreSums,
  itemsSumToZero,
  noneBelowZero,
  onlyPlacesHold,
  levelsAreSums,
  piecesAreWhereLastMoved,
  piecesAreTheBalance,
  piecesAreOfWhatLastMoved,
  mergesArePaired,
  reversalsMirror,
  alertsAreWhatIsLow,
  goneAssemblyPartsAreTold,
]
