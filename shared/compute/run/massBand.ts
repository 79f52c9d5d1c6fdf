import { ComputeError } from '@/shared/compute/errors'
import { lognormalBand } from '@/shared/compute/uncertainty/lognormalBand'
import { lognormalFromMean } from '@/shared/compute/uncertainty/lognormalFromMean'

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
  const { p10, p50, p90 } = lognormalBand(lognormalFromMean(meanKg, Math.sqrt(varianceKg2) / meanKg))
  return { meanKg, p10Kg: p10, p50Kg: p50, p90Kg: p90 }
}
