import type { Knex } from 'knex'
import type { Item } from './catalogue'
import type { People } from './people'
import type { Bin, Places } from './places'
import { type Random, randomFrom } from './random'
import type { StockPlan } from './reorder-points'

interface Shop {
  people: People
  places: Places
  items: Item[]
  plans: StockPlan[]
}

type Condition = 'new' | 'used' | 'reground' | 'worn'

interface Movement {
  kind: string
  item_id: string
  quantity: number
  from_location_id: string
  from_condition: Condition
  to_location_id: string
  to_condition: Condition
  actor_id: string
  note: string
  occurred_at: Date
}

const seed = 20_261_201
const days = 365
const dayMs = 86_400_000
/** Nobody restocks these: they run low, and the busiest of them out. */
const everyNeglected = 7
const batch = 2000

/** What the simulation knows of one item: where it is, and what is on its way. */
interface Kept {
  item: Item
  plan: StockPlan | null
  bin: Bin
  isNeglected: boolean
  inBin: Record<Condition, number>
  inHands: { userId: string; locationId: string; condition: Condition; dueDay: number }[]
  arrivals: { day: number; quantity: number }[]
}

/** A year of receipts, issues, returns, broken tools and regrinds, ending on the day of loading. */
export async function loadYear(trx: Knex, shop: Shop): Promise<number> {
  const random = randomFrom(seed)
  const start = new Date(Date.now() - days * dayMs)
  start.setUTCHours(0, 0, 0, 0)
  const movements: Movement[] = []
  const kept = stockUp(shop, random, start, movements)
  for (let day = 1; day < days; day += 1) {
    const date = new Date(start.getTime() + day * dayMs)
    const isWorkday = date.getUTCDay() !== 0 && date.getUTCDay() !== 6
    if (isWorkday) for (const entry of kept) workDay(shop, random, entry, day, date, movements)
  }
  moveSomeEast(shop, random, kept, new Date(start.getTime() + (days - 1) * dayMs), movements)
  movements.sort((one, other) => one.occurred_at.getTime() - other.occurred_at.getTime())
  for (let at = 0; at < movements.length; at += batch) {
    await trx('movements').insert(movements.slice(at, at + batch))
  }
  return movements.length
}

/** Each kind of thing to its own cabinet, the bins in order. */
function binFor(item: Item, bins: Map<string, Bin[]>, used: Map<string, number>): Bin {
  const cabinet =
    item.kind === 'holder'
      ? 'D'
      : item.kind !== 'cutter'
        ? 'E'
        : item.isHoleTool
          ? 'C'
          : item.isInch
            ? 'A'
            : 'B'
  const list = bins.get(cabinet)!
  const index = used.get(cabinet) ?? 0
  used.set(cabinet, index + 1)
  return list[index % list.length]!
}

function stockUp(shop: Shop, random: Random, start: Date, movements: Movement[]): Kept[] {
  const bins = new Map<string, Bin[]>()
  for (const bin of shop.places.mainBins) bins.set(bin.cabinet, [...(bins.get(bin.cabinet) ?? []), bin])
  const used = new Map<string, number>()
  const planById = new Map(shop.plans.map((plan) => [plan.itemId, plan]))
  return shop.items.map((item, index) => {
    const plan = planById.get(item.id) ?? null
    const quantity = plan
      ? plan.orderUpTo + random.whole(0, 3)
      : item.kind === 'collet'
        ? random.whole(1, 4)
        : 2
    const entry: Kept = {
      item,
      plan,
      bin: binFor(item, bins, used),
      isNeglected: plan !== null && index % everyNeglected === 3,
      inBin: { new: 0, used: 0, reground: 0, worn: 0 },
      inHands: [],
      arrivals: [],
    }
    receive(shop, entry, quantity, at(start, 8, random), movements)
    return entry
  })
}

function at(date: Date, hour: number, random: Random): Date {
  return new Date(date.getTime() + hour * 3_600_000 + random.whole(0, 3_500_000))
}

function receive(shop: Shop, entry: Kept, quantity: number, when: Date, movements: Movement[]): void {
  entry.inBin.new += quantity
  movements.push({
    kind: 'receipt',
    item_id: entry.item.id,
    quantity,
    from_location_id: shop.places.supplierId,
    from_condition: 'new',
    to_location_id: entry.bin.id,
    to_condition: 'new',
    actor_id: shop.people.cribManagerId,
    note: '',
    occurred_at: when,
  })
}

function workDay(
  shop: Shop,
  random: Random,
  entry: Kept,
  day: number,
  date: Date,
  movements: Movement[],
): void {
  for (const arrival of entry.arrivals.filter((due) => due.day <= day)) {
    receive(shop, entry, arrival.quantity, at(date, 7, random), movements)
  }
  entry.arrivals = entry.arrivals.filter((due) => due.day > day)
  bringBack(shop, random, entry, day, date, movements)
  const wanted = Math.min(3, random.times(entry.item.use * 0.035))
  for (let count = 0; count < wanted; count += 1) issue(shop, random, entry, day, date, movements)
  reorder(random, entry, day)
}

function issue(
  shop: Shop,
  random: Random,
  entry: Kept,
  day: number,
  date: Date,
  movements: Movement[],
): void {
  const condition = (['used', 'reground', 'new'] as const).find((held) => entry.inBin[held] > 0)
  if (!condition) return
  const holder = random.pick(shop.people.machinists)
  const toMachine = entry.item.kind !== 'cutter' && random.next() < 0.5
  entry.inBin[condition] -= 1
  const place = toMachine ? random.pick(shop.places.machineIds) : holder.locationId
  movements.push({
    kind: 'issue',
    item_id: entry.item.id,
    quantity: 1,
    from_location_id: entry.bin.id,
    from_condition: condition,
    to_location_id: place,
    to_condition: condition,
    actor_id: holder.userId,
    note: '',
    occurred_at: at(date, random.whole(8, 11), random),
  })
  const isKept = entry.item.kind !== 'cutter'
  entry.inHands.push({
    userId: holder.userId,
    locationId: place,
    condition,
    dueDay: day + (isKept ? random.whole(3, 20) : random.whole(1, 6)),
  })
}

function bringBack(
  shop: Shop,
  random: Random,
  entry: Kept,
  day: number,
  date: Date,
  movements: Movement[],
): void {
  const due = entry.inHands.filter((held) => held.dueDay <= day)
  entry.inHands = entry.inHands.filter((held) => held.dueDay > day)
  for (const { userId, locationId, condition } of due) {
    const isCutter = entry.item.kind === 'cutter'
    const isBroken = isCutter && random.next() < 0.42
    const isWorn = isCutter && !isBroken && random.next() < 0.3
    const becomes: Condition = !isCutter ? condition : isWorn ? 'worn' : 'used'
    if (!isBroken) entry.inBin[becomes] += 1
    movements.push({
      kind: isBroken ? 'scrap' : 'return',
      item_id: entry.item.id,
      quantity: 1,
      from_location_id: locationId,
      from_condition: condition,
      to_location_id: isBroken ? shop.places.scrapId : entry.bin.id,
      to_condition: isBroken ? 'worn' : becomes,
      actor_id: userId,
      note: isBroken ? random.pick(['Broke at the corner', 'Chipped', 'Worn out', 'Crashed']) : '',
      occurred_at: at(date, random.whole(12, 15), random),
    })
  }
}

function reorder(random: Random, entry: Kept, day: number): void {
  const { plan } = entry
  if (!plan || (entry.isNeglected && day > days - 210)) return
  const onHand = entry.inBin.new + entry.inBin.used + entry.inBin.reground
  const coming = entry.arrivals.reduce((sum, arrival) => sum + arrival.quantity, 0)
  if (onHand + coming > plan.reorderPoint) return
  const wanted = Math.ceil((plan.orderUpTo - onHand - coming) / plan.packSize) * plan.packSize
  entry.arrivals.push({ day: day + plan.leadTimeDays + random.whole(0, 3), quantity: wanted })
}

/** A few cutters stand in the east cell too: sent, on the way, arrived. */
function moveSomeEast(shop: Shop, random: Random, kept: Kept[], date: Date, movements: Movement[]): void {
  const busy = kept.filter(
    (entry) =>
      entry.item.kind === 'cutter' && !entry.isNeglected && entry.inBin.new > 4 && entry.item.use >= 2,
  )
  for (const [index, entry] of busy.slice(0, shop.places.eastBins.length).entries()) {
    entry.inBin.new -= 2
    const bin = shop.places.eastBins[index]!
    const common = {
      item_id: entry.item.id,
      quantity: 2,
      from_condition: 'new',
      to_condition: 'new',
      note: '',
    } as const
    const sent = at(date, 17, random)
    movements.push(
      {
        ...common,
        kind: 'transfer',
        from_location_id: entry.bin.id,
        to_location_id: shop.places.inTransitId,
        actor_id: shop.people.cribManagerId,
        occurred_at: sent,
      },
      {
        ...common,
        kind: 'transfer',
        from_location_id: shop.places.inTransitId,
        to_location_id: bin.id,
        actor_id: shop.people.cribManagerId,
        occurred_at: new Date(sent.getTime() + 5_400_000),
      },
    )
  }
}
