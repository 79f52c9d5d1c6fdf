import { ComputeError } from '@/shared/compute/errors'

/** z of the tenth and ninetieth percentile of the standard normal distribution. */
const Z_90 = 1.2815515655446004

export interface MassBand {
  readonly meanKg: number
  readonly p10Kg: number
  readonly p50Kg: number
  readonly p90Kg: number
}

/**
 * Quantiles of a mass by a lognormal with the same mean and variance,
 *
 *     σ² = ln(1 + Var/mean²),   P50 = mean·e^(−σ²/2),   P10, P90 = P50·e^(∓1.2816 σ).
 *
 * @param meanKg mean [kg], ≥ 0
 * @param varianceKg2 variance [kg²], ≥ 0
 * @returns band with p10Kg ≤ p50Kg ≤ p90Kg
 * @throws {ComputeError} `negative-amount`
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1994). Continuous Univariate Distributions, vol. 1, ch. 14.
 * @example
 * massBand(0, 0).p90Kg // => 0
 * massBand(100, 625).p50Kg // => 97.01425001453319
 */
export function massBand(meanKg: number, varianceKg2: number): MassBand {
  if (!(meanKg >= 0) || !(varianceKg2 >= 0)) throw new ComputeError('negative-amount', { meanKg, varianceKg2 })
  if (meanKg === 0) return { meanKg: 0, p10Kg: 0, p50Kg: 0, p90Kg: 0 }
  const sigma = Math.sqrt(Math.log1p(varianceKg2 / meanKg ** 2))
  const p50Kg = meanKg * Math.exp((-sigma * sigma) / 2)
  return { meanKg, p10Kg: p50Kg * Math.exp(-Z_90 * sigma), p50Kg, p90Kg: p50Kg * Math.exp(Z_90 * sigma) }
}
