import type { Lognormal } from './lognormal.types'

/**
 * Mean and coefficient of variation of a lognormal: e^(μ + σ²/2), √(e^(σ²) − 1).
 *
 * @see Johnson, Kotz & Balakrishnan (1994), Continuous Univariate Distributions, vol. 1, ch. 14.
 * @example
 * lognormalMoments({ logMean: 0, logSd: 0 }) // => { mean: 1, cv: 0 }
 */
export function lognormalMoments({ logMean, logSd }: Lognormal): { mean: number; cv: number } {
  return { mean: Math.exp(logMean + logSd ** 2 / 2), cv: Math.sqrt(Math.expm1(logSd ** 2)) }
}
