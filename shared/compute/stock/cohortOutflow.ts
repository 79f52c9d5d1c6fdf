import type { SurvivalTable } from '@/shared/compute/lifetime/survivalTable'

export interface CohortCourse {
  /** What leaves in year j = 0, 1, … after the construction year, in the unit of the amount. */
  readonly outflow: Float64Array
  /** What stands at the end of year j. */
  readonly standing: Float64Array
}

/**
 * Course of a cohort from its construction year on,
 *
 *     outflow_j = N [S(j − 1 + o) − S(j + o)],   standing_j = N S(j + o),   S(a ≤ 0) = 1.
 *
 * @param table survival at ages o, 1 + o, …, or of a year of even construction
 * @param amount N, ≥ 0
 * @returns series as long as the table; all outflows and the last standing add up to N
 * @see Baccini, P. & Bader, H.-P. (1996). Regionaler Stoffhaushalt, ch. 3.
 * @example
 * cohortOutflow(tabulateSurvival({ model: 'fixed', lifetimeYears: 2 }, 0.5, 3), 100).outflow // => [0, 0, 100]
 */
export function cohortOutflow(table: SurvivalTable, amount: number): CohortCourse {
  const outflow = table.survival.map((_, j) =>
    j === 0 ? -amount * Math.expm1(table.logSurvival[0]!) : amount * table.leaving[j - 1]!,
  )
  return { outflow, standing: table.survival.map((share) => amount * share) }
}
