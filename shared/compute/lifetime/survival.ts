import { logSurvival } from './logSurvival'
import type { Lifetime } from './lifetime.types'

/**
 * Survival function: the share of a cohort still standing at age a, S(a) = P(T > a).
 *
 * @param ageYears age a [yr]; S(a) = 1 for a ≤ 0
 * @returns share [–], in [0, 1], never rising with age
 * @throws {ComputeError} `not-a-number`, `parameter-not-positive`
 * @see Kalbfleisch, J. D. & Prentice, R. L. (2002). The Statistical Analysis of Failure Time Data, 2nd ed., §1.2.
 * @example
 * survival(80, { model: 'weibull', shape: 3, scaleYears: 80 }) // => 0.36787944117144233
 * survival(60, { model: 'fixed', lifetimeYears: 60 }) // => 0
 */
export function survival(ageYears: number, lifetime: Lifetime): number {
  return Math.exp(logSurvival(ageYears, lifetime))
}
