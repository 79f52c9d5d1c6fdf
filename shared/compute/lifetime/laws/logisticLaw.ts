import type { LifetimeLaw, LogisticLifetime } from '@/shared/compute/lifetime/lifetime.types'
import { requireFinite } from '@/shared/compute/lifetime/requireFinite'
import { requirePositive } from '@/shared/compute/lifetime/requirePositive'
import { softplus } from '@/shared/compute/lifetime/softplus'

/**
 * S(a) = 1/(1 + e^((a − μ)/b)); the hazard rises to 1/b.
 *
 * @throws {ComputeError} `not-a-number`, `parameter-not-positive`
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1995). Continuous Univariate Distributions, vol. 2, ch. 23.
 * @example
 * logisticLaw({ model: 'logistic', locationYears: 60, scaleYears: 6 }).logSurvival(5000) // => -823.3333333333334
 */
export function logisticLaw({ locationYears, scaleYears }: LogisticLifetime): LifetimeLaw {
  requireFinite({ locationYears })
  requirePositive({ scaleYears })
  const score = (ageYears: number) => (ageYears - locationYears) / scaleYears
  return {
    logSurvival: (ageYears) => -softplus(score(ageYears)),
    hazardPerYear: (ageYears) => Math.exp(-softplus(-score(ageYears))) / scaleYears,
    moments: () => ({
      meanYears: locationYears,
      sdYears: (scaleYears * Math.PI) / Math.sqrt(3),
      medianYears: locationYears,
    }),
  }
}
