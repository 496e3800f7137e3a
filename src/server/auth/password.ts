import bcrypt from 'bcryptjs'

const cost = 12

/** bcrypt reads 72 bytes and no more; a longer password is refused rather than cut. */
export const passwordLimitBytes = 72

export function hashPassword(password: string): Promise<string> {
  return bcrypt.hash(password, cost)
}

/** Stands in for the hash of an account that is not there, so that its refusal takes as long as a wrong password's. */
let absentHash: Promise<string> | undefined

export async function isPasswordRight(password: string, hash: string | null): Promise<boolean> {
  absentHash ??= hashPassword('no account has this password')
  const matches = await bcrypt.compare(password, hash ?? (await absentHash))
  return matches && hash !== null
}
