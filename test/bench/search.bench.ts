import { setFlagsFromString } from 'node:v8'
import { runInNewContext } from 'node:vm'
import { tangent } from '@/core/outline/checked-number'
import { defaultReachSettings, type Feature, type WallFeature } from '@/core/reach/types'
import { searchReach } from '@/core/search/search-reach'
import { type SearchTables, searchTables } from '@/core/search/search-tables'
import type { SearchAnswer } from '@/core/search/types'
import { type CribSize, cribOfSize, fullSize } from '../support/crib-of-size'
import type { Figure } from './runner/bench'
import { median } from './runner/statistics'
import { type BareCrib, bareCrib, bareDirect, bareStacks } from './search/bare-loop'
import { benchFeatures, fortyFeatures, type NamedFeature } from './search/features'
import { libraryTime } from './search/polygon-pairs'
import { processorSeconds } from './search/processor-seconds'
import { survivorsOf } from './search/surviving-pairs'

const oneLimitSeconds = 1
const fortyLimitSeconds = 5
const bareRatioLimit = 3
const libraryRatioLimit = 100
const sizes = [2500, 5000, 10_000, 20_000]
const warmUps = 4
const samples = 9
const librarySample = 2000

const ask = (tables: SearchTables, feature: Feature): SearchAnswer =>
  searchReach(tables, { feature, limit: 50, perCutter: 3, nearMissLimit: 20 })

/**
 * The search of a crib of 20,000 cutters, 1,000 holders with their collets and 20 extensions, tables packed. Times are of
 * the processor, garbage collection with it; the two sides of a ratio are measured in turn.
 */
export const bench = {
  name: 'search',
  run: async (): Promise<Figure[]> => {
    const { tables, memoryFigures } = packedTables()
    const crib = bareCrib(tables)
    return [
      ...memoryFigures,
      ...benchFeatures.flatMap((named) => featureFigures(tables, crib, named)),
      windowFigure(tables),
      fortyFigure(tables),
      ...growthFigures(),
    ]
  },
}

function packedTables(): { tables: SearchTables; memoryFigures: Figure[] } {
  const tooling = cribOfSize(fullSize)
  const before = heldMb()
  let packed: SearchTables | null = null
  const seconds = processorSeconds(() => {
    packed = searchTables(tooling, defaultReachSettings)
  })
  const megabytes = heldMb() - before
  const memoryFigures: Figure[] = [
    { name: 'tables packed', value: seconds, unit: 's', limit: null, samples: 1 },
    { name: 'memory of the tables', value: megabytes, unit: 'MB', limit: null, samples: 1 },
  ]
  return { tables: packed ?? searchTables(tooling, defaultReachSettings), memoryFigures }
}

/** What is left after collecting garbage. */
function heldMb(): number {
  setFlagsFromString('--expose-gc')
  const collect: () => void = runInNewContext('gc')
  collect()
  const { heapUsed, arrayBuffers } = process.memoryUsage()
  return (heapUsed + arrayBuffers) / 1024 / 1024
}

function featureFigures(tables: SearchTables, crib: BareCrib, { name, feature }: NamedFeature): Figure[] {
  if (feature.kind !== 'wall') return []
  const survivors = survivorsOf(tables, feature)
  const depthMm = feature.depthMm
  const tanDraft = tangent(feature.draftDeg ?? 0)
  const bare = () => bareDirect(tables, crib, survivors, depthMm, tanDraft)
  const search = () => ask(tables, feature)
  const ours: number[] = []
  const other: number[] = []
  for (let at = -warmUps; at < samples; at++) {
    const times = [processorSeconds(search), processorSeconds(bare)] as const
    if (at < 0) continue
    ours.push(times[0])
    other.push(times[1])
  }
  const answer = search()
  const seconds = median(ours)
  const stacks = allAssemblies(tables, crib, survivors, feature)
  const counted = bare().reaching + stacks.reaching
  if (counted !== answer.reachable)
    throw new Error(`The bare loop finds ${counted} that reach, the search ${answer.reachable}.`)
  const direct = bare().pairs
  const library = libraryTime(tables, crib, survivors, depthMm, tanDraft, librarySample)
  const all = direct + stacks.pairs
  const inLibrary = (library.seconds / library.pairs) * all
  return [
    {
      name: `${name}, one feature`,
      value: seconds,
      unit: 's',
      limit: { atMost: oneLimitSeconds },
      samples,
      note: `${survivors.length} cutters survive, ${direct} pairs with what holds them, ${all} with every holder behind an extension; ${answer.comparedPairs} compared one by one, ${answer.reachable} reach`,
    },
    {
      name: `${name}, against a bare loop over those pairs`,
      value: seconds / median(other),
      unit: 'times',
      limit: { atMost: bareRatioLimit },
      sides: { ours: seconds, other: median(other), unit: 's' },
      samples,
    },
    {
      name: `${name}, against the bare loop with every holder behind an extension`,
      value: seconds / (median(other) + stacks.seconds),
      unit: 'times',
      limit: null,
      sides: { ours: seconds, other: median(other) + stacks.seconds, unit: 's' },
      samples: 1,
    },
    {
      name: `${name}, a general geometry library takes`,
      value: inLibrary / seconds,
      unit: 'times',
      limit: { atLeast: libraryRatioLimit },
      sides: { ours: seconds, other: inLibrary, unit: 's' },
      samples: librarySample,
      note: `one cut a pair, scaled from ${librarySample} to ${all}; ${library.meeting} of the sample meet`,
    },
  ]
}

/** All assemblies in an extension, the long way; what a bare loop without any idea of the problem would go through. */
function allAssemblies(
  tables: SearchTables,
  crib: BareCrib,
  survivors: ReturnType<typeof survivorsOf>,
  { depthMm, draftDeg }: WallFeature,
): { pairs: number; reaching: number; seconds: number } {
  const takers = tables.tooling.extensions.map((_, extension) => takersOf(tables, extension))
  let count = { pairs: 0, reaching: 0 }
  const seconds = processorSeconds(() => {
    const of = (extension: number) => takers[extension] ?? new Int32Array(0)
    count = bareStacks(tables, crib, survivors, of, depthMm, tangent(draftDeg ?? 0))
  })
  return { ...count, seconds }
}

/** Outlines of the holders that take an extension's shank; any, where it is not known. */
function takersOf({ tooling, holders, extensionClass, holdingExtension }: SearchTables, extension: number) {
  const ofClass = extensionClass[extension] ?? -1
  const owners =
    ofClass < 0
      ? tooling.holders.map((_, index) => index)
      : [...new Set((holdingExtension[ofClass] ?? []).map(({ owner }) => owner))]
  return Int32Array.from(owners, (owner) => holders.outlineOf[owner]!)
}

/** A machine chosen: every assembly's own gauge length counts. */
function windowFigure(tables: SearchTables): Figure {
  const [{ name, feature }] = benchFeatures as [NamedFeature]
  const gaugeLengthMm = { shortestMm: 120, longestMm: 220 }
  const inWindow = () =>
    searchReach(tables, { feature, gaugeLengthMm, limit: 50, perCutter: 3, nearMissLimit: 20 })
  for (let at = 0; at < warmUps; at++) inWindow()
  return {
    name: `${name}, one feature in a machine's window`,
    value: median(Array.from({ length: samples }, () => processorSeconds(inWindow))),
    unit: 's',
    limit: { atMost: oneLimitSeconds },
    samples,
  }
}

function fortyFigure(tables: SearchTables): Figure {
  const all = () => {
    for (const feature of fortyFeatures) ask(tables, feature)
  }
  all()
  const times = Array.from({ length: 3 }, () => processorSeconds(all))
  return {
    name: 'forty features',
    value: median(times),
    unit: 's',
    limit: { atMost: fortyLimitSeconds },
    samples: times.length,
  }
}

/** With everything that holds, and more and more cutters: from the smallest to the largest no more than the crib grows. */
function growthFigures(): Figure[] {
  const bySize = sizes.map((cutters) => featureSeconds({ ...fullSize, cutters }))
  const growth = (sizes.at(-1) ?? 1) / (sizes[0] ?? 1)
  return benchFeatures.map(({ name }, of) => {
    const seconds = bySize.map((ofSize) => ofSize[of] ?? Number.NaN)
    const [smallest = 1] = seconds
    const largest = seconds.at(-1) ?? 1
    return {
      name: `${name}, growth from ${sizes[0]} to ${sizes.at(-1)} cutters`,
      value: largest / smallest,
      unit: 'times' as const,
      limit: { atMost: growth },
      sides: { ours: largest, other: smallest, unit: 's' as const },
      samples,
      note: sizes.map((size, at) => `${size}: ${((seconds[at] ?? 0) * 1000).toFixed(0)} ms`).join(', '),
    }
  })
}

/** Of every feature in turn, in a crib of this size. */
function featureSeconds(size: CribSize): number[] {
  const tables = searchTables(cribOfSize(size), defaultReachSettings)
  return benchFeatures.map(({ feature }) => {
    for (let at = 0; at < warmUps; at++) ask(tables, feature)
    return median(Array.from({ length: samples }, () => processorSeconds(() => ask(tables, feature))))
  })
}
