import type { ExponentialLifetime, LifetimeLaw } from '@/shared/compute/lifetime/lifetime.types'
import { requirePositive } from '@/shared/compute/lifetime/requirePositive'

/**
 * Constant hazard: S(a) = e^(−a/m).
 *
 * @throws {ComputeError} `parameter-not-positive`
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1994). Continuous Univariate Distributions, vol. 1, ch. 19.
 * @example
 * exponentialLaw({ model: 'exponential', meanYears: 70 }).hazardPerYear(12) // => 0.014285714285714285
 */
export function exponentialLaw({ meanYears }: ExponentialLifetime): LifetimeLaw {
  requirePositive({ meanYears })
  return {
    logSurvival: (ageYears) => -ageYears / meanYears,
    hazardPerYear: () => 1 / meanYears,
    moments: () => ({ meanYears, sdYears: meanYears, medianYears: meanYears * Math.LN2 }),
  }
}
