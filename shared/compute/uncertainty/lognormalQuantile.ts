import type { Lognormal } from './lognormal.types'
import { normalQuantile } from './normalQuantile'

/**
 * Quantile of a lognormal, e^(μ + zσ).
 *
 * @param probability p [–], in (0, 1)
 * @throws {ComputeError} `share-out-of-range`
 * @see Johnson, Kotz & Balakrishnan (1994), Continuous Univariate Distributions, vol. 1, ch. 14.
 * @example
 * lognormalQuantile({ logMean: 0, logSd: 1 }, 0.5) // => 1
 */
export function lognormalQuantile({ logMean, logSd }: Lognormal, probability: number): number {
  return Math.exp(logMean + logSd * normalQuantile(probability))
}
