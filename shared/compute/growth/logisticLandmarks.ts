import type { LogisticGrowth } from './logisticGrowth'
import { logisticTime } from './logisticTime'

export interface LogisticLandmarks {
  /** Time of the steepest rise, negative when it lies before the start [yr]. */
  readonly inflectionYears: number
  readonly valueAtInflection: number
  readonly steepestSlopePerYear: number
}

/**
 * Where a rising logistic path is steepest: C/2 at t = ln((C − S₀)/S₀)/r, slope rC/4.
 *
 * @throws {ComputeError} `parameter-not-positive`; `undefined-statistic` for a path that starts at or above its ceiling
 * @see Verhulst, P.-F. (1838). Notice sur la loi que la population suit dans son accroissement.
 * @example
 * logisticLandmarks({ start: 10, ceiling: 20, ratePerYear: 0.1 }) // => { inflectionYears: 0, valueAtInflection: 10, steepestSlopePerYear: 0.5 }
 */
export function logisticLandmarks(path: LogisticGrowth): LogisticLandmarks {
  return {
    inflectionYears: logisticTime(path.ceiling / 2, path),
    valueAtInflection: path.ceiling / 2,
    steepestSlopePerYear: (path.ratePerYear * path.ceiling) / 4,
  }
}
