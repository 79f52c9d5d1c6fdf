import { ComputeError } from '@/shared/compute/errors'

/**
 * Refuses shares outside 0 … 1.
 *
 * @param shares by name [–]
 * @throws {ComputeError} `share-out-of-range` with the offending share
 * @example
 * requireShares({ recoveryShare: 0.7 }) // => undefined
 */
export function requireShares(shares: Readonly<Record<string, number>>): void {
  for (const [name, share] of Object.entries(shares)) {
    if (!(share >= 0 && share <= 1)) throw new ComputeError('share-out-of-range', { [name]: share })
  }
}
