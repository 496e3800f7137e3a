import { z } from 'zod'
import { toolParts } from '@/core/outline/types'
import { cutterForms, holderSegmentParts, substrates } from '@/core/tooling'
import { boreSchema } from './bore'
import { idSchema } from './fields'
import { plainMessage } from './plain-message'

/**
 * Shapes alone: what a size may be is the core's to say, and its refusal answers 422 with the place. A member nobody
 * knows is a wrong shape, because a misspelt dimension that is left out changes the answer without a word.
 */
export const sizeSchema = z
  .number('Give a number.')
  .max(100_000, 'More than 100 m or 100,000: check the unit.')
  .refine((size) => size === 0 || Math.abs(size) >= 1e-9, 'Smaller than anything that can be made.')
export const optionalSizeSchema = sizeSchema.nullish()

const obstacleSchema = z.strictObject({ setbackMm: sizeSchema, riseMm: sizeSchema })

const wallFeatureSchema = z.strictObject({
  kind: z.literal('wall'),
  depthMm: sizeSchema,
  draftDeg: optionalSizeSchema,
  tiltDeg: optionalSizeSchema,
  throughMm: optionalSizeSchema,
  openingWidthMm: optionalSizeSchema,
  insideCornerRadiusMm: optionalSizeSchema,
  floorRadiusMm: optionalSizeSchema,
  obstacles: z.array(obstacleSchema).max(100).nullish(),
})

const holeFeatureSchema = z.strictObject({
  kind: z.literal('hole'),
  depthMm: sizeSchema,
  diameterMm: sizeSchema,
  breakThroughMm: optionalSizeSchema,
})

export const featureSchema = z.discriminatedUnion('kind', [wallFeatureSchema, holeFeatureSchema])

const cutterGeometrySchema = z.strictObject({
  form: z.enum(cutterForms),
  cuttingDiameterMm: sizeSchema,
  cornerRadiusMm: optionalSizeSchema,
  taperHalfAngleDeg: optionalSizeSchema,
  pointAngleDeg: optionalSizeSchema,
  tipDiameterMm: optionalSizeSchema,
  lengthOfCutMm: optionalSizeSchema,
  fluteLengthMm: optionalSizeSchema,
  neckDiameterMm: optionalSizeSchema,
  neckTaperHalfAngleDeg: optionalSizeSchema,
  reachLengthMm: optionalSizeSchema,
  neckTransitionAngleDeg: optionalSizeSchema,
  shankDiameterMm: sizeSchema,
  overallLengthMm: sizeSchema,
  fluteCount: optionalSizeSchema,
  substrate: z.enum(substrates).nullish(),
})

const clampingShape = {
  boreDepthMm: optionalSizeSchema,
  minimumGripMm: optionalSizeSchema,
  gripStartMm: optionalSizeSchema,
  bore: boreSchema.nullish(),
}

const segmentShape = { lengthMm: sizeSchema, noseDiameterMm: sizeSchema, spindleDiameterMm: sizeSchema }

const holderGeometrySchema = z.strictObject({
  gaugeLengthMm: sizeSchema,
  ...clampingShape,
  sideLockInsertionMm: optionalSizeSchema,
  spindleNoseDiameterMm: optionalSizeSchema,
  segments: z.array(z.strictObject({ part: z.enum(holderSegmentParts), ...segmentShape })).max(100),
})

const extensionGeometrySchema = z.strictObject({
  projectionMm: sizeSchema,
  ...clampingShape,
  // What part a segment is goes without saying here; saying it is no fault.
  segments: z
    .array(z.strictObject({ part: z.enum([...holderSegmentParts, 'extension']).nullish(), ...segmentShape }))
    .max(100),
})

const colletGeometrySchema = z.strictObject({
  series: z.string().min(1).max(100),
  minimumMm: sizeSchema,
  maximumMm: sizeSchema,
  lengthMm: optionalSizeSchema,
  minimumGripMm: optionalSizeSchema,
})

const itemReferenceSchema = z.strictObject({ id: idSchema })
const pieceReferenceSchema = z.strictObject({ pieceId: idSchema })

/**
 * A tool written out, or named by its id: which of the two is meant shows in its members, so the faults found are those
 * of the one that was meant.
 */
function named<Geometry extends z.ZodType, Reference extends z.ZodType>(
  geometry: Geometry,
  references: Readonly<Record<string, Reference>>,
) {
  return z.looseObject({}).transform((value, context): z.output<Geometry> | z.output<Reference> => {
    const member = Object.keys(references).find((name) => name in value)
    const schema = (member === undefined ? undefined : references[member]) ?? geometry
    const parsed = schema.safeParse(value, { error: plainMessage })
    if (parsed.success) return parsed.data as z.output<Geometry> | z.output<Reference>
    for (const issue of parsed.error.issues)
      context.issues.push({ ...issue, input: value } as z.core.$ZodRawIssue)
    return z.NEVER
  })
}

export const clearancesSchema = z.strictObject({
  shankMm: optionalSizeSchema,
  holderMm: optionalSizeSchema,
})

export const reachRequestSchema = z.strictObject({
  feature: featureSchema,
  cutter: named<typeof cutterGeometrySchema, typeof itemReferenceSchema | typeof pieceReferenceSchema>(
    cutterGeometrySchema,
    { id: itemReferenceSchema, pieceId: pieceReferenceSchema },
  ),
  holder: named(holderGeometrySchema, { id: itemReferenceSchema }),
  collet: named(colletGeometrySchema, { id: itemReferenceSchema }).nullish(),
  extension: named(extensionGeometrySchema, { id: itemReferenceSchema }).nullish(),
  stickOutMm: optionalSizeSchema,
  clearances: clearancesSchema.nullish(),
  sideLoadN: optionalSizeSchema,
})
export type ReachRequestBody = z.output<typeof reachRequestSchema>

const reachLimits = [...toolParts, 'usableLength', 'floor'] as const
const lowerBounds = ['clearance', 'floor', 'obstacle', 'flutes', 'neck', 'bore', 'sideLock'] as const
const upperBounds = ['grip', 'sideLock'] as const

export const reachResponseSchema = z.object({
  verdict: z.enum(['reaches', 'short', 'impossible']),
  shortfallMm: z.number(),
  reachMm: z.number().nullable(),
  limitedBy: z.enum(reachLimits).nullable(),
  firstTouch: z.array(z.object({ part: z.enum(toolParts), depthMm: z.number().nullable() })),
  reachAtBestMm: z.number().nullable(),
  stickOut: z.object({
    requiredMm: z.number().nullable(),
    minimumMm: z.number(),
    maximumMm: z.number(),
    usedMm: z.number(),
    gripMm: z.number(),
    boundBy: z.enum(lowerBounds),
    upperBoundBy: z.enum(upperBounds),
  }),
  gaugeLengthMm: z.number(),
  maximumAxialStepMm: z.number(),
  stiffness: z.object({
    complianceUmPerN: z.number(),
    stickOutToDiameter: z.number(),
    deflectionUm: z.number().nullable(),
  }),
  uncutAtFootMm: z.number().nullable(),
  messages: z.array(z.object({ code: z.string(), text: z.string() })),
})
export type ReachResponse = z.infer<typeof reachResponseSchema>
