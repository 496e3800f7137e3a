import { machineWindow } from '@/core/machine/machine-window'
import { machineWindowRequestSchema, machineWindowResponseSchema } from '@/schemas/machine-window'
import { route } from '@/server/http/route'

export const POST = route({
  access: 'see',
  body: machineWindowRequestSchema,
  answer: machineWindowResponseSchema,
  handle: async ({ body }) => machineWindow(body),
})
