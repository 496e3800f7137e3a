import { one } from './one-way'

export const other = () => one
