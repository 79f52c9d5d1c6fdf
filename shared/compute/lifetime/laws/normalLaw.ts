import type { LifetimeLaw, NormalLifetime } from '@/shared/compute/lifetime/lifetime.types'
import { logNormalTail } from '@/shared/compute/lifetime/logNormalTail'
import { normalHazard } from '@/shared/compute/lifetime/normalHazard'
import { requireFinite } from '@/shared/compute/lifetime/requireFinite'
import { requirePositive } from '@/shared/compute/lifetime/requirePositive'

/**
 * S(a) = Φ((μ − a)/σ).
 *
 * @throws {ComputeError} `not-a-number`, `parameter-not-positive`
 * @remarks negative lifetimes have the probability Φ(−μ/σ): 0.0026 for 70 ± 25
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1994). Continuous Univariate Distributions, vol. 1, ch. 13.
 * @example
 * normalLaw({ model: 'normal', meanYears: 60, sdYears: 15 }).logSurvival(400) // => -260.93065982422024
 */
export function normalLaw({ meanYears, sdYears }: NormalLifetime): LifetimeLaw {
  requireFinite({ meanYears })
  requirePositive({ sdYears })
  return {
    logSurvival: (ageYears) => logNormalTail((ageYears - meanYears) / sdYears),
    hazardPerYear: (ageYears) => normalHazard((ageYears - meanYears) / sdYears) / sdYears,
    moments: () => ({ meanYears, sdYears, medianYears: meanYears }),
  }
}
