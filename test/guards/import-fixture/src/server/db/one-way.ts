import { other } from './other-way'

export const one = () => other
