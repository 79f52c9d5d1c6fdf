import { ComputeError } from '@/shared/compute/errors'
import type { SurvivalTable } from './survivalTable'

/** A construction year that stands for itself or for a share of possible years; weights add up to 1. */
export interface YearWeight {
  readonly year: number
  readonly weight: number
}

/** What is to come for a standing building. */
export interface StandingChances {
  /** Chance to come down in year k = 1 … horizon [–]. */
  readonly comingDown: Float64Array
  /** Share of the possible years whose model leaves no survivor at the survey [–]. */
  readonly overdueShare: number
}

/** Below this survival the ratio of two tabulated values would lose digits; the logarithms do not. */
const SMALLEST_SURVIVAL = 1e-280

/**
 * Chances of a building that stands at the end of the survey year to come down in each coming year,
 *
 *     r_k = (S(a + k) / S(a))^m,   p_k = r_(k−1) − r_k,   a = Y − c + o,
 *
 * averaged over its possible construction years c. The chances and the share left at the horizon add up to 1.
 * Where the model leaves no survivor at age a, the building is overdue and leaves in the first year.
 *
 * @param table of {@link survivalTable}, longer than the age of the oldest year plus the horizon
 * @param hazardMultiplier m, acts from the survey on [–], > 0
 * @throws {ComputeError} `parameter-not-positive`, `negative-age` for a year after the survey, `length-mismatch` for a short table
 * @see Kalbfleisch, J. D. & Prentice, R. L. (2002). The Statistical Analysis of Failure Time Data, 2nd ed., §1.2 and §4.1.
 */
export function standingChances(
  table: SurvivalTable,
  years: readonly YearWeight[],
  surveyYear: number,
  hazardMultiplier: number,
  horizonYears: number,
): StandingChances {
  if (!(hazardMultiplier > 0)) throw new ComputeError('parameter-not-positive', { hazardMultiplier })
  if (years.length === 0) throw new ComputeError('empty-input', { what: 'construction years' })
  const comingDown = new Float64Array(horizonYears)
  let overdueShare = 0
  for (const { year, weight } of years) {
    const age = surveyYear - year
    if (!(age >= 0)) throw new ComputeError('negative-age', { constructionYear: year, surveyYear })
    if (age + horizonYears >= table.survival.length)
      throw new ComputeError('length-mismatch', { age, horizonYears, table: table.survival.length })
    if (table.logSurvival[age] === -Infinity) {
      overdueShare += weight
      comingDown[0]! += weight
    } else if (hazardMultiplier === 1 && table.survival[age]! > SMALLEST_SURVIVAL) {
      const scale = weight / table.survival[age]!
      for (let k = 0; k < horizonYears; k++) comingDown[k]! += scale * table.falling[age + k]!
    } else {
      addByLogarithms(comingDown, table.logSurvival, age, weight, hazardMultiplier)
    }
  }
  return { comingDown, overdueShare }
}

function addByLogarithms(
  comingDown: Float64Array,
  log: Float64Array,
  age: number,
  weight: number,
  multiplier: number,
): void {
  const start = log[age]!
  let previous = start
  for (let k = 1; k <= comingDown.length; k++) {
    const now = log[age + k]!
    const standingBefore = weight * Math.exp(multiplier * (previous - start))
    if (now === -Infinity) {
      comingDown[k - 1]! += standingBefore
      return
    }
    comingDown[k - 1]! -= standingBefore * Math.expm1(multiplier * (now - previous))
    previous = now
  }
}
