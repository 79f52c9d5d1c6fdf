import { ComputeError } from '@/shared/compute/errors'
import { integral } from './integral'
import { lifetimeLaw } from './lifetimeLaw'
import type { Lifetime } from './lifetime.types'
import { survivalTable, type SurvivalTable } from './survivalTable'

/** Above this hazard all falls within minutes of the year's start, and ∫S is S over the hazard. */
const STEEPEST_PER_YEAR = 1e5

/**
 * Survival of a cohort whose construction is spread evenly through its year: entry j is the share standing at the
 * end of the j-th year after the construction year,
 *
 *     A(j) = ∫_j^(j+1) S(a) da.
 *
 * @param firstYear j of entry 0, a whole number ≥ 0
 * @param length number of years, ≥ 1
 * @returns a table like that of `tabulateSurvival`, for a check of the mid-year rule (o = 0.5), which differs by O(f′/24)
 * @throws {ComputeError} `parameter-not-positive`, `negative-age`, `empty-input`
 * @remarks relative error below 1e-12, exact for a fixed lifetime
 * @see Takahasi, H. & Mori, M. (1974), the quadrature; the convention is common practice of stock models.
 * @example
 * tabulateUniformYear({ model: 'fixed', lifetimeYears: 1.5 }, 0, 3).survival // => [1, 0.5, 0]
 */
export function tabulateUniformYear(lifetime: Lifetime, firstYear: number, length: number): SurvivalTable {
  if (!(Number.isInteger(firstYear) && firstYear >= 0)) throw new ComputeError('negative-age', { firstYear })
  if (!(Number.isInteger(length) && length >= 1)) throw new ComputeError('empty-input', { length })
  const logMean = logMeanOverYear(lifetime)
  return survivalTable(
    firstYear,
    Float64Array.from({ length: length + 1 }, (_, step) => logMean(firstYear + step)),
  )
}

function logMeanOverYear(lifetime: Lifetime): (year: number) => number {
  if (lifetime.model === 'fixed') {
    return (year) => Math.log(Math.min(1, Math.max(0, lifetime.lifetimeYears - year)))
  }
  const law = lifetimeLaw(lifetime)
  return (year) => {
    const start = year > 0 ? law.logSurvival(year) : 0
    if (start === -Infinity) return -Infinity
    const hazard = law.hazardPerYear(year)
    if (hazard > STEEPEST_PER_YEAR && hazard < Infinity && year > 0) return start - Math.log(hazard)
    // relative to its start, so that an integral smaller than any double still has a logarithm
    return start + Math.log(integral((age) => Math.exp(law.logSurvival(age) - start), { low: year, high: year + 1 }))
  }
}
