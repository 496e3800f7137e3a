import { AppError } from '@/lib/app-error'
import type { CreateSessionRequest } from '@/schemas/session'
import { isPasswordRight } from '../../auth/password'
import { db } from '../../db/connection'
import {
  countFailedSignIns,
  createSignInTry,
  markSignInSucceeded,
  removeSignInTry,
} from '../../db/stores/sign-in-store'
import { findUserForSignIn, type SignInUser } from '../../db/stores/user-store'

const failedTriesAMinute = 10

/**
 * The person whose e-mail and password these are. Ten failed tries a minute, for one address or one account, close the
 * door for the rest of that minute; an unknown account is refused as slowly and in the same words as a wrong password.
 */
export async function signInUser(request: CreateSessionRequest, remoteAddress: string): Promise<SignInUser> {
  const email = request.email.toLowerCase()
  const tryId = await createSignInTry(db(), { email, remoteAddress })
  if ((await countFailedSignIns(db(), { email, remoteAddress }, 60)) > failedTriesAMinute) {
    await removeSignInTry(db(), tryId)
    throw new AppError('too-many-tries', 'Too many failed tries. Wait a minute and try again.', {
      note: `sign-in closed for ${remoteAddress}`,
    })
  }
  const user = await findUserForSignIn(db(), email)
  const isRight = await isPasswordRight(request.password, user?.passwordHash ?? null)
  if (!user || !isRight) {
    throw new AppError('wrong-credentials', 'This e-mail address and password do not belong together.', {
      note: `sign-in refused for ${remoteAddress}`,
    })
  }
  await markSignInSucceeded(db(), tryId)
  return user
}
