import { ComputeError } from '@/shared/compute/errors'

export interface ExponentialGrowth {
  readonly start: number
  /** g [1/yr]; negative for decay, above −1 when compounded by the year. */
  readonly ratePerYear: number
  /** `yearly`: S₀(1 + g)^t; `continuous`: S₀ e^(gt). */
  readonly compounding: 'yearly' | 'continuous'
}

/**
 * Value of an exponential path at time t, S₀(1 + g)^t or S₀ e^(gt).
 *
 * @param timeYears t since the start [yr]
 * @throws {ComputeError} `negative-amount`, `parameter-out-of-range`, `not-a-number`
 * @see Closed form.
 * @example
 * exponentialGrowth(2, { start: 100, ratePerYear: 0.1, compounding: 'yearly' }) // => 121
 */
export function exponentialGrowth(timeYears: number, path: ExponentialGrowth): number {
  if (!(path.start >= 0)) throw new ComputeError('negative-amount', { start: path.start })
  if (!Number.isFinite(timeYears)) throw new ComputeError('not-a-number', { timeYears })
  return path.start * Math.exp(logRate(path) * timeYears)
}

function logRate({ ratePerYear, compounding }: ExponentialGrowth): number {
  const isProper = Number.isFinite(ratePerYear) && (compounding === 'continuous' || ratePerYear > -1)
  if (!isProper) throw new ComputeError('parameter-out-of-range', { ratePerYear, compounding })
  return compounding === 'continuous' ? ratePerYear : Math.log1p(ratePerYear)
}
