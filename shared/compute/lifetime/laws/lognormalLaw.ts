import type { LifetimeLaw, LognormalLifetime } from '@/shared/compute/lifetime/lifetime.types'
import { logNormalTail } from '@/shared/compute/lifetime/logNormalTail'
import { normalHazard } from '@/shared/compute/lifetime/normalHazard'
import { requireFinite } from '@/shared/compute/lifetime/requireFinite'
import { requirePositive } from '@/shared/compute/lifetime/requirePositive'

/**
 * S(a) = Φ((μ − ln a)/σ), a in years. The hazard rises and then falls: the very old become safer.
 *
 * @throws {ComputeError} `not-a-number`, `parameter-not-positive`
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1994). Continuous Univariate Distributions, vol. 1, ch. 14.
 * @example
 * lognormalLaw({ model: 'lognormal', logMean: 0, logSd: 1 }).moments().meanYears // => 1.6487212707001282
 */
export function lognormalLaw({ logMean, logSd }: LognormalLifetime): LifetimeLaw {
  requireFinite({ logMean })
  requirePositive({ logSd })
  const score = (ageYears: number) => (Math.log(ageYears) - logMean) / logSd
  const meanYears = Math.exp(logMean + (logSd * logSd) / 2)
  return {
    logSurvival: (ageYears) => logNormalTail(score(ageYears)),
    hazardPerYear: (ageYears) => (ageYears > 0 ? normalHazard(score(ageYears)) / (logSd * ageYears) : 0),
    moments: () => ({
      meanYears,
      sdYears: meanYears * Math.sqrt(Math.expm1(logSd * logSd)),
      medianYears: Math.exp(logMean),
    }),
  }
}
