import {
  createMachineRequestSchema,
  machineListQuerySchema,
  machineListResponseSchema,
  machineResponseSchema,
} from '@/schemas/machine'
import { route } from '@/server/http/route'
import { createMachine } from '@/server/services/machines/change-machine'
import { listMachines } from '@/server/services/machines/list-machines'

export const GET = route({
  access: 'see',
  query: machineListQuerySchema,
  answer: machineListResponseSchema,
  handle: ({ query }) => listMachines(query.archived),
})

export const POST = route({
  access: 'keepCrib',
  body: createMachineRequestSchema,
  answer: machineResponseSchema,
  status: 201,
  handle: ({ actor, body }) => createMachine(actor, body),
})
