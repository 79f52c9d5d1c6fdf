import { verify } from '@node-rs/argon2'
import { hashPassword } from './hashPassword'

let hashOfNobody: Promise<string> | undefined

/**
 * Whether a password opens an account. Without an account, or before it has a password, the same work is done
 * against a digest of nobody, so that the time of the answer tells nothing.
 */
export async function isPasswordRight(passwordHash: string | null | undefined, password: string): Promise<boolean> {
  hashOfNobody ??= hashPassword('a password that nobody has')
  const isRight = await verify(passwordHash ?? (await hashOfNobody), password)
  return isRight && passwordHash !== null && passwordHash !== undefined
}
