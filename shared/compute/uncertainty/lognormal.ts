import { ComputeError } from '@/shared/compute/errors'
import { normalQuantile } from './quantiles'

/** A lognormal quantity by the mean and standard deviation of its logarithm. */
export interface Lognormal {
  readonly logMean: number
  readonly logSd: number
}

/**
 * Lognormal by median and geometric standard deviation: μ = ln median, σ = ln GSD.
 *
 * @param median > 0
 * @param geometricSd GSD [–], ≥ 1
 * @throws {ComputeError} `parameter-not-positive`, `parameter-out-of-range`
 * @see Limpert, E., Stahel, W. & Abbt, M. (2001). BioScience 51, 341–352.
 * @example
 * lognormalFromMedian(1, 1) // => { logMean: 0, logSd: 0 }
 */
export function lognormalFromMedian(median: number, geometricSd: number): Lognormal {
  if (!(median > 0)) throw new ComputeError('parameter-not-positive', { median })
  if (!(geometricSd >= 1)) throw new ComputeError('parameter-out-of-range', { geometricSd })
  return { logMean: Math.log(median), logSd: Math.log(geometricSd) }
}

/**
 * Lognormal by mean and coefficient of variation: σ² = ln(1 + CV²), μ = ln mean − σ²/2.
 *
 * @param mean > 0
 * @param cv coefficient of variation [–], ≥ 0
 * @throws {ComputeError} `parameter-not-positive`, `parameter-out-of-range`
 * @see Johnson, Kotz & Balakrishnan (1994), Continuous Univariate Distributions, vol. 1, ch. 14.
 * @example
 * lognormalFromMean(820, 0.25).logSd // => 0.24622067706923975
 */
export function lognormalFromMean(mean: number, cv: number): Lognormal {
  if (!(mean > 0)) throw new ComputeError('parameter-not-positive', { mean })
  if (!(cv >= 0)) throw new ComputeError('parameter-out-of-range', { cv })
  const variance = Math.log1p(cv * cv)
  return { logMean: Math.log(mean) - variance / 2, logSd: Math.sqrt(variance) }
}

/**
 * Mean and coefficient of variation of a lognormal.
 *
 * @see as {@link lognormalFromMean}
 * @example
 * lognormalMoments({ logMean: 0, logSd: 0 }) // => { mean: 1, cv: 0 }
 */
export function lognormalMoments({ logMean, logSd }: Lognormal): { mean: number; cv: number } {
  return { mean: Math.exp(logMean + logSd ** 2 / 2), cv: Math.sqrt(Math.expm1(logSd ** 2)) }
}

/**
 * Quantile of a lognormal, e^(μ + zσ).
 *
 * @param probability p, in (0, 1)
 * @throws {ComputeError} `share-out-of-range`
 * @see as {@link lognormalFromMean}
 * @example
 * lognormalQuantile({ logMean: 0, logSd: 1 }, 0.5) // => 1
 */
export function lognormalQuantile({ logMean, logSd }: Lognormal, probability: number): number {
  return Math.exp(logMean + logSd * normalQuantile(probability))
}
