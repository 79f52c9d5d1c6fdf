import { ComputeError } from '@/shared/compute/errors'
import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'
import { tabulateSurvival } from '@/shared/compute/lifetime/tabulateSurvival'
import { comingDownFromTable, type ComingDownOptions } from './comingDownFromTable'
import type { ComingDown } from './stock.types'

/**
 * Chances of one building that stands at age a to come down in each of the years ahead; for many buildings
 * tabulate the lifetime once and use `comingDownFromTable`.
 *
 * @param ageYears age a at the survey [yr], ≥ 0
 * @param years horizon, ≥ 0
 * @throws {ComputeError} `negative-age`, `parameter-not-positive`, `not-a-number`
 * @see Kalbfleisch, J. D. & Prentice, R. L. (2002). The Statistical Analysis of Failure Time Data, 2nd ed., §1.2.
 * @example
 * comingDownChances({ model: 'exponential', meanYears: 70 }, 150, 1).chances // => [0.014184157647595397]
 */
export function comingDownChances(
  lifetime: Lifetime,
  ageYears: number,
  years: number,
  options: ComingDownOptions = {},
): ComingDown {
  if (!(ageYears >= 0)) throw new ComputeError('negative-age', { ageYears })
  return comingDownFromTable(tabulateSurvival(lifetime, ageYears, years + 1), 0, years, options)
}
