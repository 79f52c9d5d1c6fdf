import { lifetimeLaw } from './lifetimeLaw'
import type { Lifetime, LifetimeMoments } from './lifetime.types'

/**
 * Mean, standard deviation and median of a lifetime.
 *
 * @returns years; Infinity where the moment does not exist (log-logistic: mean for β ≤ 1, sd for β ≤ 2)
 * @throws {ComputeError} `parameter-not-positive`, `not-a-number`
 * @remarks relative error below 1e-10 against 40-digit arithmetic
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1994, 1995). Continuous Univariate Distributions, vols 1–2.
 * @example
 * lifetimeMoments({ model: 'gamma', shape: 16, scaleYears: 4 }).sdYears // => 16
 */
export function lifetimeMoments(lifetime: Lifetime): LifetimeMoments {
  return lifetimeLaw(lifetime).moments()
}
