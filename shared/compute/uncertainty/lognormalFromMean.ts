import { ComputeError } from '@/shared/compute/errors'
import type { Lognormal } from './lognormal.types'

/**
 * Lognormal by mean and coefficient of variation: σ² = ln(1 + CV²), μ = ln mean − σ²/2.
 *
 * @param mean in any unit, > 0
 * @param cv coefficient of variation [–], ≥ 0
 * @throws {ComputeError} `parameter-not-positive`, `parameter-out-of-range`
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1994). Continuous Univariate Distributions, vol. 1, ch. 14.
 * @example
 * lognormalFromMean(820, 0.25).logSd // => 0.24622067706923975
 */
export function lognormalFromMean(mean: number, cv: number): Lognormal {
  if (!(mean > 0 && mean < Infinity)) throw new ComputeError('parameter-not-positive', { mean })
  if (!(cv >= 0 && cv < Infinity)) throw new ComputeError('parameter-out-of-range', { cv })
  const variance = Math.log1p(cv * cv)
  return { logMean: Math.log(mean) - variance / 2, logSd: Math.sqrt(variance) }
}
