import type { WeibullLifetime } from './lifetime.types'
import { requirePositive } from './requirePositive'

/**
 * Most frequent age at the end of a Weibull life, λ((k − 1)/k)^(1/k), 0 for k ≤ 1.
 *
 * @returns mode [yr]
 * @throws {ComputeError} `parameter-not-positive`
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1994). Continuous Univariate Distributions, vol. 1, ch. 21.
 * @example
 * weibullModeYears({ model: 'weibull', shape: 2, scaleYears: 80 }) // => 56.568542494923804
 */
export function weibullModeYears({ shape, scaleYears }: WeibullLifetime): number {
  requirePositive({ shape, scaleYears })
  return shape > 1 ? scaleYears * ((shape - 1) / shape) ** (1 / shape) : 0
}
