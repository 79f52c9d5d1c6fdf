import { ComputeError } from '@/shared/compute/errors'

/**
 * Refuses a probability that leaves no room on either side.
 *
 * @param probability p [–], in (0, 1)
 * @throws {ComputeError} `share-out-of-range`
 * @example
 * requireProbability(0.5) // => undefined
 */
export function requireProbability(probability: number): void {
  if (!(probability > 0 && probability < 1)) throw new ComputeError('share-out-of-range', { probability })
}
