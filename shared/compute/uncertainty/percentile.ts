import { ComputeError } from '@/shared/compute/errors'

/**
 * Percentile of sorted values by linear interpolation between order statistics.
 *
 * @param sorted ascending, at least one
 * @param probability p [–], in [0, 1]
 * @returns value between the smallest (p = 0) and the largest (p = 1), in the unit of the values
 * @throws {ComputeError} `empty-input`, `share-out-of-range`
 * @see Hyndman, R. J. & Fan, Y. (1996). Sample quantiles in statistical packages. The American Statistician 50,
 *   361–365, definition 7.
 * @example
 * percentile([1, 2, 3, 4], 0.5) // => 2.5
 */
export function percentile(sorted: ArrayLike<number>, probability: number): number {
  if (sorted.length === 0) throw new ComputeError('empty-input', { what: 'values' })
  if (!(probability >= 0 && probability <= 1)) throw new ComputeError('share-out-of-range', { probability })
  const place = (sorted.length - 1) * probability
  const below = Math.floor(place)
  const above = Math.min(sorted.length - 1, below + 1)
  return sorted[below]! + (place - below) * (sorted[above]! - sorted[below]!)
}
