import { bracketedRoot } from '@/shared/compute/lifetime/bracketedRoot'
import type { GammaLifetime, LifetimeLaw } from '@/shared/compute/lifetime/lifetime.types'
import { gammaTail } from '@/shared/compute/lifetime/gammaTail'
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
  const logSurvival = (ageYears: number) => gammaTail(shape, ageYears / scaleYears).logTail
  return {
    logSurvival,
    hazardPerYear: (ageYears) => gammaTail(shape, ageYears / scaleYears).hazard / scaleYears,
    moments: () => ({
      meanYears: shape * scaleYears,
      sdYears: Math.sqrt(shape) * scaleYears,
      medianYears: bracketedRoot((age) => logSurvival(age) + Math.LN2, 0, shape * scaleYears),
    }),
  }
}
