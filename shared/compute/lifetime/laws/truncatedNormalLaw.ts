import { bracketedRoot } from '@/shared/compute/lifetime/bracketedRoot'
import type { LifetimeLaw, LifetimeMoments, TruncatedNormalLifetime } from '@/shared/compute/lifetime/lifetime.types'
import { logNormalTail } from '@/shared/compute/lifetime/logNormalTail'
import { normalHazard } from '@/shared/compute/lifetime/normalHazard'
import { requireFinite } from '@/shared/compute/lifetime/requireFinite'
import { requirePositive } from '@/shared/compute/lifetime/requirePositive'
import { truncatedNormalShape } from '@/shared/compute/lifetime/truncatedNormalShape'

/**
 * Normal law with its part below age 0 cut off: S(a) = Φ((μ − a)/σ)/Φ(μ/σ).
 *
 * @throws {ComputeError} `not-a-number`, `parameter-not-positive`
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1994). Continuous Univariate Distributions, vol. 1, ch. 13, §10.1.
 * @example
 * truncatedNormalLaw({ model: 'truncatedNormal', parentMeanYears: 0, parentSdYears: 10 }).moments().meanYears // => 7.978845608028654
 */
export function truncatedNormalLaw({ parentMeanYears, parentSdYears }: TruncatedNormalLifetime): LifetimeLaw {
  requireFinite({ parentMeanYears })
  requirePositive({ parentSdYears })
  const logStart = logNormalTail(-parentMeanYears / parentSdYears)
  const logSurvival = (ageYears: number) => logNormalTail((ageYears - parentMeanYears) / parentSdYears) - logStart
  const moments = (): LifetimeMoments => {
    const { mean, sd } = truncatedNormalShape(parentMeanYears / parentSdYears)
    const meanYears = mean * parentSdYears
    const medianYears = bracketedRoot((age) => logSurvival(age) + Math.LN2, 0, 2 * meanYears)
    return { meanYears, sdYears: sd * parentSdYears, medianYears }
  }
  return {
    logSurvival,
    hazardPerYear: (ageYears) => normalHazard((ageYears - parentMeanYears) / parentSdYears) / parentSdYears,
    moments,
  }
}
