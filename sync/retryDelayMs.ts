import { ApiError } from './api/ApiError'

const FIRST_MS = 1_000
const MOST_MS = 300_000

/**
 * How long to wait before the next try: exponential with full jitter, rand(0, min(300 s, 1 s · 2ⁿ)).
 *
 * @param failures tries that failed in a row, from 1
 * @param random in [0, 1)
 */
export function retryDelayMs(failures: number, random: number): number {
  return Math.round(random * Math.min(MOST_MS, FIRST_MS * 2 ** failures))
}

/**
 * How long the server asked to wait, and up to a tenth longer, so that devices that were sent away together do not come
 * back together.
 *
 * @param random in [0, 1)
 * @returns 0 where it did not say
 */
export function retryAfterMs(error: unknown, random: number): number {
  if (!(error instanceof ApiError) || error.retryAfterS === null) return 0
  return Math.round(Math.min(MOST_MS, error.retryAfterS * 1_000) * (1 + 0.1 * random))
}
