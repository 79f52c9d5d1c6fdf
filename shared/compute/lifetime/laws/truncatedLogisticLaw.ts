import type { LifetimeLaw, LifetimeMoments, TruncatedLogisticLifetime } from '@/shared/compute/lifetime/lifetime.types'
import { requireFinite } from '@/shared/compute/lifetime/requireFinite'
import { requirePositive } from '@/shared/compute/lifetime/requirePositive'
import { softplus } from '@/shared/compute/lifetime/softplus'
import { truncatedLogisticShape } from '@/shared/compute/lifetime/truncatedLogisticShape'

/**
 * Logistic law with its part below age 0 cut off: S(a) = (1 + e^(−μ/b))/(1 + e^((a − μ)/b)).
 *
 * @throws {ComputeError} `not-a-number`, `parameter-not-positive`
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1995). Continuous Univariate Distributions, vol. 2, ch. 23.
 * @example
 * truncatedLogisticLaw({ model: 'truncatedLogistic', locationYears: 0, scaleYears: 1 }).moments().meanYears // => 1.3862943611198906
 */
export function truncatedLogisticLaw({ locationYears, scaleYears }: TruncatedLogisticLifetime): LifetimeLaw {
  requireFinite({ locationYears })
  requirePositive({ scaleYears })
  const z = locationYears / scaleYears
  const logStart = softplus(-z)
  const moments = (): LifetimeMoments => {
    const { mean, sd } = truncatedLogisticShape(z)
    const median = z > 0 ? z + Math.log1p(2 * Math.exp(-z)) : Math.LN2 + Math.log1p(Math.exp(z) / 2)
    return { meanYears: mean * scaleYears, sdYears: sd * scaleYears, medianYears: median * scaleYears }
  }
  return {
    logSurvival: (ageYears) => logStart - softplus(ageYears / scaleYears - z),
    hazardPerYear: (ageYears) => Math.exp(-softplus(z - ageYears / scaleYears)) / scaleYears,
    moments,
  }
}
