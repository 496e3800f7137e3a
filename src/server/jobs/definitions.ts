import { z } from 'zod'

/** What the worker can be asked to do: a name and a payload of ids; the handler reads the rest again. */
export interface JobDefinition<Payload extends z.ZodType> {
  name: string
  payload: Payload
}

const importPayloadSchema = z.object({ importId: z.string() })

export const checkImportJob = {
  name: 'check-import',
  payload: importPayloadSchema,
} satisfies JobDefinition<z.ZodType>
export const commitImportJob = {
  name: 'commit-import',
  payload: importPayloadSchema,
} satisfies JobDefinition<z.ZodType>

/** Every queue there is: both ends make those that are missing before they use them. */
export const jobDefinitions = [checkImportJob, commitImportJob] as const
