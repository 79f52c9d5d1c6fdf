import gammaln from '@stdlib/math-base-special-gammaln'
import type { LifetimeLaw, LifetimeMoments, WeibullLifetime } from '@/shared/compute/lifetime/lifetime.types'
import { logPower } from '@/shared/compute/lifetime/logPower'
import { requirePositive } from '@/shared/compute/lifetime/requirePositive'
import { weibullLogMomentRatio } from '@/shared/compute/lifetime/weibullLogMomentRatio'

/**
 * S(a) = e^(−(a/λ)^k), hazard (k/λ)(a/λ)^(k−1): rising for k > 1.
 *
 * @throws {ComputeError} `parameter-not-positive`
 * @see Weibull, W. (1951). A statistical distribution function of wide applicability.
 *   Journal of Applied Mechanics 18, 293–297.
 * @example
 * weibullLaw({ model: 'weibull', shape: 3, scaleYears: 60 }).logSurvival(600) // => -1000
 */
export function weibullLaw({ shape, scaleYears }: WeibullLifetime): LifetimeLaw {
  requirePositive({ shape, scaleYears })
  const moments = (): LifetimeMoments => {
    const meanYears = scaleYears * Math.exp(gammaln(1 + 1 / shape))
    return {
      meanYears,
      sdYears: meanYears * Math.sqrt(Math.expm1(weibullLogMomentRatio(shape))),
      medianYears: scaleYears * Math.LN2 ** (1 / shape),
    }
  }
  return {
    logSurvival: (ageYears) => -((ageYears / scaleYears) ** shape),
    hazardPerYear: (ageYears) => (shape / scaleYears) * Math.exp(logPower(ageYears / scaleYears, shape - 1)),
    moments,
  }
}
