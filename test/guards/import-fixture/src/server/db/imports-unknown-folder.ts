import { unknown } from '../unknown/unknown'

export const value = unknown
