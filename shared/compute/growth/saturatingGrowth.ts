import { ComputeError } from '@/shared/compute/errors'

export interface SaturatingGrowth {
  readonly start: number
  /** C, the value it settles at. */
  readonly ceiling: number
  /** r, share of the remaining distance covered [1/yr]. */
  readonly ratePerYear: number
}

/**
 * Value of a path that closes a constant share of its distance to the ceiling, steepest at the start,
 *
 *     C − (C − S₀) e^(−rt).
 *
 * @param timeYears t since the start [yr]
 * @returns between start and ceiling, in their unit
 * @throws {ComputeError} `parameter-not-positive`, `negative-amount`, `not-a-number`
 * @see Closed form: first-order approach.
 * @example
 * saturatingGrowth(1, { start: 0, ceiling: 100, ratePerYear: Math.LN2 }) // => 50
 */
export function saturatingGrowth(timeYears: number, { start, ceiling, ratePerYear }: SaturatingGrowth): number {
  if (!Number.isFinite(timeYears)) throw new ComputeError('not-a-number', { timeYears })
  if (!(ratePerYear > 0 && ratePerYear < Infinity)) throw new ComputeError('parameter-not-positive', { ratePerYear })
  if (!(start >= 0 && ceiling >= 0)) throw new ComputeError('negative-amount', { start, ceiling })
  const exponent = -ratePerYear * timeYears
  // two terms that are positive ahead of the start, rather than a difference
  return start * Math.exp(exponent) - ceiling * Math.expm1(exponent)
}
