import gammaincinv from '@stdlib/math-base-special-gammaincinv'
import gammaln from '@stdlib/math-base-special-gammaln'
import type { GammaLifetime, LifetimeLaw } from '@/shared/compute/lifetime/lifetime.types'
import { logPower } from '@/shared/compute/lifetime/logPower'
import { logUpperGamma } from '@/shared/compute/lifetime/logUpperGamma'
import { requirePositive } from '@/shared/compute/lifetime/requirePositive'

/**
 * S(a) = Q(k, a/θ), the upper incomplete gamma function. The hazard rises to 1/θ for k > 1.
 *
 * @throws {ComputeError} `parameter-not-positive`
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1994). Continuous Univariate Distributions, vol. 1, ch. 17.
 * @example
 * gammaLaw({ model: 'gamma', shape: 16, scaleYears: 4 }).logSurvival(1800) // => -386.2267349839892
 */
export function gammaLaw({ shape, scaleYears }: GammaLifetime): LifetimeLaw {
  requirePositive({ shape, scaleYears })
  const logGamma = gammaln(shape)
  const logSurvival = (ageYears: number) => logUpperGamma(shape, ageYears / scaleYears)
  return {
    logSurvival,
    hazardPerYear: (ageYears) => {
      const x = ageYears / scaleYears
      return Math.exp(logPower(x, shape - 1) - x - logGamma - logSurvival(ageYears)) / scaleYears
    },
    moments: () => ({
      meanYears: shape * scaleYears,
      sdYears: Math.sqrt(shape) * scaleYears,
      medianYears: scaleYears * gammaincinv(0.5, shape),
    }),
  }
}
