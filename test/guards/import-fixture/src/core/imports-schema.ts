import { schema } from '../schemas/schema'

export const value = schema
