import { z } from 'zod'

export const value = z
