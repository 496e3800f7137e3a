import { z } from 'zod'
import { cutterForms, substrates } from '@/core/tooling'
import { lengthUnits } from '@/core/units/length-unit'
import { colletResponseSchema } from './collet'
import { cutEstimateSchema, searchCutSchema } from './cut-estimate'
import { cutterResponseSchema } from './cutter'
import { extensionResponseSchema } from './extension'
import { idSchema } from './fields'
import { holderResponseSchema } from './holder'
import { stockPlaceSchema } from './item'
import { machineWindowRequestSchema } from './machine-window'
import { clearancesSchema, featureSchema, optionalSizeSchema, reachResponseSchema, sizeSchema } from './reach'

export const searchRankings = ['stiffness', 'stock', 'cost', 'built'] as const
export type SearchRanking = (typeof searchRankings)[number]

export const searchPurposes = ['roughing', 'finishing'] as const
export type SearchPurpose = (typeof searchPurposes)[number]

const mostFeatures = 200
const mostListed = 100
/** What one answer holds at most, options and near misses of all its features together. */
const mostAnswered = 2000

const countSchema = (least: number) =>
  z
    .number('Give a whole number.')
    .int('Only whole numbers.')
    .min(least, `At least ${least}.`)
    .max(mostListed, `At most ${mostListed}.`)

const whereSchema = z.strictObject({
  /** Stock is looked for in this crib alone. */
  cribId: idSchema.nullish(),
  /** Only what can be put together now: every part in a bin, not worn and not reserved. */
  inStockOnly: z.boolean('Only true or false.').nullish(),
  /** Only holders of its taper, gauge lengths and widths it takes, and its spindle nose. */
  machineId: idSchema.nullish(),
  /** A set-up of the shop's, on its own machine: what its window takes. */
  setUpId: idSchema.nullish(),
  /** A set-up written out, as machine-window takes it. */
  setup: machineWindowRequestSchema.nullish(),
  /** This cutter alone: what holds it, and how. */
  cutterId: idSchema.nullish(),
  forms: z.array(z.enum(cutterForms, 'This is no form of a cutter.')).max(cutterForms.length).nullish(),
  substrates: z.array(z.enum(substrates, 'Only carbide or hss.')).max(substrates.length).nullish(),
  /** A material of the shop's starting speeds: each option then says where to start. It leaves nothing out. */
  material: z.string('This is a text.').trim().min(1, 'Name a material.').max(200).nullish(),
  longestStickOutToDiameter: sizeSchema.positive('More than 0.').nullish(),
})

const requestFields = {
  feature: featureSchema.optional(),
  features: z
    .array(featureSchema)
    .min(1, 'Name a feature.')
    .max(mostFeatures, `At most ${mostFeatures} features.`)
    .optional(),
  /** Absent: every limit of the feature is asked for, as in a reach check. */
  purpose: z.enum(searchPurposes, 'Only roughing or finishing.').nullish(),
  /** Of a finished surface: how far the passes lie apart, and how high a cusp may stay between them. */
  scallop: z
    .strictObject({
      stepoverMm: sizeSchema.positive('More than 0.'),
      maximumHeightMm: sizeSchema.positive('More than 0.'),
    })
    .nullish(),
  clearances: clearancesSchema.nullish(),
  sideLoadN: optionalSizeSchema,
  /** A cut to be estimated for every assembly listed. */
  cut: searchCutSchema.nullish(),
  where: whereSchema.nullish(),
  rankBy: z.enum(searchRankings, 'Rank by stiffness, stock, cost or built.').default('stiffness'),
  /** 20 where one feature is asked about, 3 of each where many are. */
  limit: countSchema(1).optional(),
  /** The most options of one cutter; no limit unless given. */
  perCutter: countSchema(1).nullish(),
  nearMissLimit: countSchema(0).optional(),
  /** The unit the sentences of the answer speak in; figures are millimetres whatever it says. */
  sentenceUnit: z.enum(lengthUnits).default('mm'),
}

export const reachSearchRequestSchema = z.strictObject(requestFields).superRefine((body, context) => {
  if ((body.feature === undefined) === (body.features === undefined)) {
    context.addIssue({
      code: 'custom',
      path: ['feature'],
      message: 'Ask about one feature, or about a list of features.',
    })
  }
  const { limit, nearMissLimit } = searchLimits(body)
  const answered = (body.features?.length ?? 1) * (limit + nearMissLimit)
  if (answered <= mostAnswered) return
  context.addIssue({
    code: 'custom',
    path: ['limit'],
    message: `${answered} options are more than one answer holds (${mostAnswered}): ask for fewer of each.`,
  })
})
export type ReachSearchRequest = z.output<typeof reachSearchRequestSchema>
/** As it is sent. */
export type ReachSearchBody = z.input<typeof reachSearchRequestSchema>

/** How many options, and how many near misses, each feature is answered with. */
export function searchLimits(body: {
  features?: unknown[] | undefined
  limit?: number | undefined
  nearMissLimit?: number | undefined
}): { limit: number; nearMissLimit: number } {
  const [options, misses] = body.features ? [3, 3] : [20, 10]
  return { limit: body.limit ?? options, nearMissLimit: body.nearMissLimit ?? misses }
}

const assemblyPartKinds = ['cutter', 'collet', 'extension', 'holder'] as const

/** Where a part of an assembly lies. */
const partPlaceSchema = stockPlaceSchema.extend({ part: z.enum(assemblyPartKinds), itemId: z.string() })

const assemblyFields = {
  /** The same assembly has the same key in every answer. */
  key: z.string(),
  cutter: cutterResponseSchema.extend({
    /** A tagged piece with measures of its own; the geometry is then the piece's. */
    piece: z.object({ id: z.string(), tag: z.string() }).nullable(),
  }),
  holder: holderResponseSchema,
  /** What holds the cutter, in the extension where there is one. */
  collet: colletResponseSchema.nullable(),
  extension: extensionResponseSchema.nullable(),
  /** What holds the extension. */
  extensionCollet: colletResponseSchema.nullable(),
  reach: reachResponseSchema,
  /** What is to be known of it: cautions of the reach check, and what was not checked. */
  cautions: z.array(z.string()),
  stickOut: reachResponseSchema.shape.stickOut,
  stiffness: reachResponseSchema.shape.stiffness.extend({
    /** How many times the stiffest one listed gives. */
    timesStiffest: z.number().nullable(),
  }),
  /** Of whole assemblies: as many as the part there is least of; and where every part lies. */
  stock: z.object({ onHand: z.number(), available: z.number(), locations: z.array(partPlaceSchema) }),
  /** In the material named, at the full diameter; null where none was, or the shop has no speed for this tool in it. */
  speed: z
    .object({
      lowMPerMin: z.number(),
      highMPerMin: z.number(),
      lowRpm: z.number(),
      highRpm: z.number(),
      limited: z.enum(['no', 'high', 'all']),
    })
    .nullable(),
  /** What the cut asked for would do with it; null where none was. An estimate, never a setting to run by. */
  estimate: cutEstimateSchema.nullable(),
  /** Absent for those who see no costs; the amount is null where the cost of a part is not known. */
  cost: z.object({ amount: z.number().nullable(), currency: z.string() }).optional(),
}

export const searchOptionSchema = z.object({
  ...assemblyFields,
  /** Why it stands where it stands. */
  reason: z.string(),
  /** The assembly it stands ready as; its stick-out is then the one it was built with. */
  builtAs: z
    .object({
      id: z.string(),
      number: z.number(),
      /** In whose hands or in which machine it is. */
      place: z.string(),
    })
    .nullable(),
})
export type SearchOptionResponse = z.infer<typeof searchOptionSchema>

export const searchNearMissSchema = z.object({
  ...assemblyFields,
  stoppedBy: z.string(),
  shortfallMm: z.number(),
  /** What stops it. */
  reason: z.string(),
  /** The smallest changes that would make it reach, the smallest first. */
  changes: z.array(z.object({ kind: z.string(), text: z.string(), itemId: z.string().nullable() })),
})
export type SearchNearMissResponse = z.infer<typeof searchNearMissSchema>

export const searchNoteCodes = [
  'crib-empty',
  'nothing-passes-filters',
  'no-cutter-suits',
  'nothing-reaches',
  'cutters-not-checked',
  'left-to-finishing',
] as const
export type SearchNoteCode = (typeof searchNoteCodes)[number]

const searchAnswerSchema = z.object({
  options: z.array(searchOptionSchema),
  nearMisses: z.array(searchNearMissSchema),
  /** Assemblies the crib could build, and how many of them reach. */
  considered: z.number(),
  reachable: z.number(),
  /** Where nothing reaches, or something is left to another cutter: what that is and what to do. */
  notes: z.array(z.object({ code: z.enum(searchNoteCodes), text: z.string() })),
})
export type SearchAnswerResponse = z.infer<typeof searchAnswerSchema>

/** Of one feature its answer, of many a list of answers in their order; the counts are then of all together. */
export const reachSearchResponseSchema = z.union([
  searchAnswerSchema.extend({ computedInMs: z.number() }),
  z.object({
    results: z.array(searchAnswerSchema),
    considered: z.number(),
    reachable: z.number(),
    computedInMs: z.number(),
  }),
])
export type ReachSearchResponse = SearchAnswerResponse & { computedInMs: number }
