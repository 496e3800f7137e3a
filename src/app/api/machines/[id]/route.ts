import { idParamsSchema } from '@/schemas/fields'
import { machineResponseSchema, updateMachineRequestSchema } from '@/schemas/machine'
import { route } from '@/server/http/route'
import { archiveMachine, updateMachine } from '@/server/services/machines/change-machine'
import { getMachine } from '@/server/services/machines/get-machine'

export const GET = route({
  access: 'see',
  params: idParamsSchema,
  answer: machineResponseSchema,
  handle: ({ params }) => getMachine(params.id),
})

export const PATCH = route({
  access: 'keepCrib',
  params: idParamsSchema,
  body: updateMachineRequestSchema,
  answer: machineResponseSchema,
  handle: ({ actor, params, body }) => updateMachine(actor, params.id, body),
})

export const DELETE = route({
  access: 'keepCrib',
  params: idParamsSchema,
  answer: null,
  handle: ({ actor, params }) => archiveMachine(actor, params.id),
})
