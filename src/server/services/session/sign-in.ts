import { AppError } from '@/lib/app-error'
import type { CreateSessionRequest } from '@/schemas/session'
import { isPasswordRight } from '../../auth/password'
import { db } from '../../db/connection'
import { countFailedSignIns, createSignInAttempt, type SignInTry } from '../../db/stores/sign-in-store'
import { findUserForSignIn, type SignInUser } from '../../db/stores/user-store'

const failedTriesAMinute = 10

/**
 * The person whose e-mail and password these are. Ten failed tries a minute, for one address or one account, close the
 * door for the rest of that minute; an unknown account is refused as slowly and in the same words as a wrong password.
 *
 * Counted before and after judging: of many tries at the same moment no more than ten learn whether they were right,
 * and many right ones at the same moment all come in.
 */
export async function signInUser(request: CreateSessionRequest, remoteAddress: string): Promise<SignInUser> {
  const attempt = { email: request.email.toLowerCase(), remoteAddress }
  await refuseBeyond(failedTriesAMinute - 1, attempt)
  const user = await findUserForSignIn(db(), attempt.email)
  const isRight = await isPasswordRight(request.password, user?.passwordHash ?? null)
  await createSignInAttempt(db(), attempt, isRight)
  if (!user || !isRight) {
    await refuseBeyond(failedTriesAMinute, attempt)
    throw new AppError('wrong-credentials', 'This e-mail address and password do not belong together.', {
      note: `sign-in refused for ${remoteAddress}`,
    })
  }
  await refuseBeyond(failedTriesAMinute - 1, attempt)
  return user
}

async function refuseBeyond(most: number, attempt: SignInTry): Promise<void> {
  if ((await countFailedSignIns(db(), attempt, 60)) <= most) return
  throw new AppError('too-many-tries', 'Too many failed tries. Wait a minute and try again.', {
    note: `sign-in closed for ${attempt.remoteAddress}`,
  })
}
