import { logSurvival } from '@/shared/compute/lifetime/logSurvival'
import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'

/** A survival function at the ends of whole years: entry j is age j + o. */
export interface SurvivalTable {
  readonly logSurvival: Float64Array
  readonly survival: Float64Array
  /** S(j + o) − S(j + 1 + o), with the digits that the difference of two near numbers would lose. */
  readonly falling: Float64Array
}

/**
 * Tabulates a lifetime once, so that no building is ever evaluated twice.
 *
 * @param yearOffset convention o: age at the end of the construction year [yr], 0, 0.5 or 1
 * @param length number of ages
 * @example
 * survivalTable({ model: 'exponential', meanYears: 50 }, 0.5, 3).logSurvival[2] // => -0.05
 */
export function survivalTable(lifetime: Lifetime, yearOffset: number, length: number): SurvivalTable {
  const log = Float64Array.from({ length: length + 1 }, (_, year) =>
    year + yearOffset <= 0 ? 0 : logSurvival(year + yearOffset, lifetime),
  )
  const survival = log.map(Math.exp)
  const falling = Float64Array.from({ length }, (_, year) => fallingShare(survival[year]!, log[year]!, log[year + 1]!))
  return { logSurvival: log.subarray(0, length), survival: survival.subarray(0, length), falling }
}

function fallingShare(survival: number, log: number, nextLog: number): number {
  if (log === -Infinity) return 0
  return nextLog === -Infinity ? survival : -survival * Math.expm1(nextLog - log)
}
