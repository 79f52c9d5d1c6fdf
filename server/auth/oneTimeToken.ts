import { createHash, randomBytes } from 'node:crypto'

const HOUR_MS = 3_600_000
/** How long a link of each purpose opens something. */
export const LINK_LASTS_MS = { invitation: 7 * 24 * HOUR_MS, 'password-reset': HOUR_MS } as const

/** A token for one link in one message, and the digest that is kept of it. */
export interface OneTimeToken {
  readonly token: string
  readonly tokenSha256: string
}

/** 256 random bits; only their digest is stored. */
export function makeOneTimeToken(): OneTimeToken {
  const token = randomBytes(32).toString('base64url')
  return { token, tokenSha256: sha256Hex(token) }
}

export function sha256Hex(text: string): string {
  return createHash('sha256').update(text).digest('hex')
}
