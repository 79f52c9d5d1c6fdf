import type { LifetimeLaw, LifetimeMoments, LogLogisticLifetime } from '@/shared/compute/lifetime/lifetime.types'
import { logPower } from '@/shared/compute/lifetime/logPower'
import { requirePositive } from '@/shared/compute/lifetime/requirePositive'
import { softplus } from '@/shared/compute/lifetime/softplus'

/**
 * S(a) = 1/(1 + (a/α)^β): a heavy tail, the hazard rises and then falls for β > 1.
 *
 * @returns moments are Infinity where they do not exist: the mean for β ≤ 1, the sd for β ≤ 2
 * @throws {ComputeError} `parameter-not-positive`
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1995). Continuous Univariate Distributions, vol. 2, ch. 23, §11.
 * @example
 * logLogisticLaw({ model: 'logLogistic', shape: 4, scaleYears: 66 }).moments().medianYears // => 66
 */
export function logLogisticLaw({ shape, scaleYears }: LogLogisticLifetime): LifetimeLaw {
  requirePositive({ shape, scaleYears })
  const logOdds = (ageYears: number) => shape * Math.log(ageYears / scaleYears)
  const moments = (): LifetimeMoments => {
    const x = Math.PI / shape
    const meanYears = shape > 1 ? (scaleYears * x) / Math.sin(x) : Infinity
    const sdYears = shape > 2 ? meanYears * Math.sqrt(Math.tan(x) / x - 1) : Infinity
    return { meanYears, sdYears, medianYears: scaleYears }
  }
  return {
    logSurvival: (ageYears) => -softplus(logOdds(ageYears)),
    hazardPerYear: (ageYears) => {
      const log = logPower(ageYears / scaleYears, shape - 1) - softplus(logOdds(ageYears))
      return (shape / scaleYears) * Math.exp(log)
    },
    moments,
  }
}
