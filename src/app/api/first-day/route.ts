import { firstDayResponseSchema } from '@/schemas/first-day'
import { route } from '@/server/http/route'
import { getFirstDay } from '@/server/services/first-day/get-first-day'

export const GET = route({ access: 'keepCrib', answer: firstDayResponseSchema, handle: () => getFirstDay() })
