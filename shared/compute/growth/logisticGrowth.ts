import { ComputeError } from '@/shared/compute/errors'

export interface LogisticGrowth {
  readonly start: number
  /** C, the value it settles at. */
  readonly ceiling: number
  /** r [1/yr]; rises to the ceiling, or falls to it when it starts above. */
  readonly ratePerYear: number
}

/**
 * Value of a logistic path at time t,
 *
 *     C/(1 + ((C − S₀)/S₀) e^(−rt)).
 *
 * @param timeYears t since the start [yr]
 * @returns between start and ceiling, in their unit
 * @throws {ComputeError} `parameter-not-positive`, `not-a-number`; `parameter-out-of-range` before a path that falls began
 * @see Verhulst, P.-F. (1838). Notice sur la loi que la population suit dans son accroissement.
 * @example
 * logisticGrowth(0, { start: 20, ceiling: 45, ratePerYear: 0.06 }) // => 20
 */
export function logisticGrowth(timeYears: number, { start, ceiling, ratePerYear }: LogisticGrowth): number {
  if (!Number.isFinite(timeYears)) throw new ComputeError('not-a-number', { timeYears })
  for (const [name, value] of Object.entries({ start, ceiling, ratePerYear })) {
    if (!(value > 0 && value < Infinity)) throw new ComputeError('parameter-not-positive', { [name]: value })
  }
  const exponent = -ratePerYear * timeYears
  const value =
    timeYears < 0
      ? ceiling / (1 + ((ceiling - start) / start) * Math.exp(exponent))
      : // the same with terms that are all positive, for a start far above the ceiling
        (ceiling * start) / (ceiling * Math.exp(exponent) - start * Math.expm1(exponent))
  if (!(value >= 0)) throw new ComputeError('parameter-out-of-range', { timeYears, start, ceiling, ratePerYear })
  return value
}
