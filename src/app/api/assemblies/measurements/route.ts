import { importMeasurementsRequestSchema, importMeasurementsResponseSchema } from '@/schemas/assembly'
import { route } from '@/server/http/route'
import { importMeasurements } from '@/server/services/assemblies/import-measurements'

export const POST = route({
  access: 'move',
  body: importMeasurementsRequestSchema,
  answer: importMeasurementsResponseSchema,
  handle: ({ actor, body }) => importMeasurements(actor, body),
})
