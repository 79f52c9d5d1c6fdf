import { ComputeError } from '@/shared/compute/errors'

const ROUNDING = 1e-12

/**
 * Smallest count whose cumulative probability reaches p.
 *
 * @param probabilities chance of 0, 1, … [–], adding up to 1
 * @param p in (0, 1)
 * @throws {ComputeError} `share-out-of-range`, `empty-input`
 * @see Hyndman, R. J. & Fan, Y. (1996). Sample quantiles in statistical packages. The American Statistician 50, 361–365 (type 1).
 * @example
 * countQuantile([0.25, 0.5, 0.25], 0.5) // => 1
 */
export function countQuantile(probabilities: readonly number[] | Float64Array, p: number): number {
  if (!(p > 0 && p < 1)) throw new ComputeError('share-out-of-range', { p })
  if (probabilities.length === 0) throw new ComputeError('empty-input', { what: 'probabilities' })
  let soFar = 0
  for (let count = 0; count < probabilities.length; count++) {
    soFar += probabilities[count]!
    if (soFar >= p - ROUNDING) return count
  }
  return probabilities.length - 1
}
