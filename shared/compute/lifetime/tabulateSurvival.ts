import { ComputeError } from '@/shared/compute/errors'
import { lifetimeLaw } from './lifetimeLaw'
import type { Lifetime } from './lifetime.types'
import { survivalTable, type SurvivalTable } from './survivalTable'

/**
 * Tabulates a survival function once, so that no building is ever evaluated twice. With the year offset o as first
 * age, entry j belongs to the end of the j-th year after the construction year.
 *
 * @param firstAgeYears age of entry 0 [yr]; S(a) = 1 for a ≤ 0
 * @param length number of ages, ≥ 1
 * @returns ln S, S and the share leaving in the following year, each of the given length
 * @throws {ComputeError} `not-a-number`, `parameter-not-positive`, `empty-input`
 * @see Kalbfleisch, J. D. & Prentice, R. L. (2002). The Statistical Analysis of Failure Time Data, 2nd ed., §1.2.
 * @example
 * tabulateSurvival({ model: 'exponential', meanYears: 50 }, 0.5, 3).logSurvival // => [-0.01, -0.03, -0.05]
 */
export function tabulateSurvival(lifetime: Lifetime, firstAgeYears: number, length: number): SurvivalTable {
  if (!Number.isFinite(firstAgeYears)) throw new ComputeError('not-a-number', { firstAgeYears })
  if (!(Number.isInteger(length) && length >= 1)) throw new ComputeError('empty-input', { length })
  const law = lifetimeLaw(lifetime)
  const logSurvival = Float64Array.from({ length: length + 1 }, (_, step) => {
    const age = firstAgeYears + step
    return age > 0 ? law.logSurvival(age) : 0
  })
  return survivalTable(firstAgeYears, logSurvival)
}
