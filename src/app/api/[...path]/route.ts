import { AppError } from '@/lib/app-error'
import { route } from '@/server/http/route'

/** What no other route answers: a script that mistypes an address is told so in the form of every other refusal. */
const nothingHere = route({
  access: 'public',
  answer: null,
  handle: async () => {
    throw new AppError('not-found', 'There is no such call.')
  },
})

export const GET = nothingHere
export const POST = nothingHere
export const PUT = nothingHere
export const PATCH = nothingHere
export const DELETE = nothingHere
