import { ComputeError } from '@/shared/compute/errors'

/**
 * Multipliers divided by their mean, so that they tell buildings apart and leave the district's expectation alone:
 * a list in which everything is poor is a list in which nothing is.
 *
 * @param multipliers each > 0 [–]
 * @param weights what each counts in the mean, such as the expected flow of the first year, ≥ 0; equal unless given
 * @returns multipliers with a weighted mean of 1
 * @throws {ComputeError} `empty-input`, `length-mismatch`, `parameter-not-positive`, `negative-amount`
 * @see Breslow, N. E. & Day, N. E. (1987). Statistical Methods in Cancer Research, vol. 2, ch. 2 (internal standard).
 * @example
 * recentredMultipliers([1, 3]) // => [0.5, 1.5]
 */
export function recentredMultipliers(multipliers: readonly number[], weights?: readonly number[]): number[] {
  if (multipliers.length === 0) throw new ComputeError('empty-input', { what: 'multipliers' })
  if (weights && weights.length !== multipliers.length) {
    throw new ComputeError('length-mismatch', { multipliers: multipliers.length, weights: weights.length })
  }
  let [weighted, total] = [0, 0]
  multipliers.forEach((multiplier, index) => {
    const weight = weights?.[index] ?? 1
    if (!(multiplier > 0 && multiplier < Infinity)) throw new ComputeError('parameter-not-positive', { multiplier })
    if (!(weight >= 0)) throw new ComputeError('negative-amount', { weight })
    weighted += weight * multiplier
    total += weight
  })
  if (!(total > 0)) throw new ComputeError('parameter-not-positive', { totalWeight: total })
  return multipliers.map((multiplier) => (multiplier * total) / weighted)
}
