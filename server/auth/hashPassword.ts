import { hash } from '@node-rs/argon2'

/** 19 MiB, two passes, one lane; the library's algorithm is argon2id unless another is asked for. */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const

/**
 * Digest of a password as typed: nothing trimmed, nothing cut off.
 *
 * @see OWASP Password Storage Cheat Sheet (2025), argon2id: m = 19 MiB, t = 2, p = 1
 */
export function hashPassword(password: string): Promise<string> {
  return hash(password, cost)
}
