import { row } from '../server/db/row'

export const value = row
