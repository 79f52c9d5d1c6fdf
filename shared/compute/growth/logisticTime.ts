import { ComputeError } from '@/shared/compute/errors'
import type { LogisticGrowth } from './logisticGrowth'

/**
 * Time at which a rising logistic path reaches a value, t = ln(v (C − S₀)/(S₀ (C − v)))/r.
 *
 * @param value v, above 0 and below the ceiling
 * @returns years, negative when it was reached before the start
 * @throws {ComputeError} `parameter-not-positive`, `undefined-statistic`
 * @see Verhulst, P.-F. (1838). Notice sur la loi que la population suit dans son accroissement.
 * @example
 * logisticTime(5, { start: 5, ceiling: 20, ratePerYear: 0.1 }) // => 0
 */
export function logisticTime(value: number, { start, ceiling, ratePerYear }: LogisticGrowth): number {
  for (const [name, given] of Object.entries({ start, ceiling, ratePerYear })) {
    if (!(given > 0 && given < Infinity)) throw new ComputeError('parameter-not-positive', { [name]: given })
  }
  if (!(start < ceiling && value > 0 && value < ceiling)) {
    throw new ComputeError('undefined-statistic', { start, ceiling, value })
  }
  return Math.log((value * (ceiling - start)) / (start * (ceiling - value))) / ratePerYear
}
