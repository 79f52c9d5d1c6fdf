import { ComputeError } from '@/shared/compute/errors'
import type { SurvivalTable } from '@/shared/compute/lifetime/survivalTable'
import type { ComingDown } from './stock.types'

export interface ComingDownOptions {
  /** m, acts on the hazard from the survey on [–], > 0; 1 unless given. */
  readonly hazardMultiplier?: number
  /** Years over which a building leaves that ought not to stand any more; 1 unless given. */
  readonly overdueSpreadYears?: number
}

/**
 * Chances of a building that stands at age a to come down in each of the years ahead,
 *
 *     r_k = (S(a + k)/S(a))^m,   p_k = r_(k−1) − r_k.
 *
 * What was surveyed is what survived: without the division by S(a) the losses of the past would be counted twice.
 * Where S(a) = 0 the building is overdue and leaves in the first year, or evenly over the years asked for.
 *
 * @param table survival at yearly steps of age
 * @param startIndex entry of age a, ≥ 0
 * @param years horizon, ≥ 0; the table reaches to startIndex + years
 * @throws {ComputeError} `parameter-not-positive`, `negative-age`, `length-mismatch`
 * @see Kalbfleisch, J. D. & Prentice, R. L. (2002). The Statistical Analysis of Failure Time Data, 2nd ed., §1.2 and §4.1.
 * @example
 * comingDownFromTable(tabulateSurvival({ model: 'fixed', lifetimeYears: 60 }, 57, 5), 0, 4).chances // => [0, 0, 1, 0]
 */
export function comingDownFromTable(
  table: SurvivalTable,
  startIndex: number,
  years: number,
  { hazardMultiplier = 1, overdueSpreadYears = 1 }: ComingDownOptions = {},
): ComingDown {
  if (!(hazardMultiplier > 0 && hazardMultiplier < Infinity)) {
    throw new ComputeError('parameter-not-positive', { hazardMultiplier })
  }
  if (!(Number.isInteger(startIndex) && startIndex >= 0)) throw new ComputeError('negative-age', { startIndex })
  if (!(startIndex + years < table.logSurvival.length)) {
    throw new ComputeError('length-mismatch', { startIndex, years, tableLength: table.logSurvival.length })
  }
  const log = table.logSurvival.subarray(startIndex, startIndex + years + 1)
  const start = log[0]!
  if (start === -Infinity) return overdue(years, overdueSpreadYears)
  const chances = new Float64Array(years)
  for (let k = 1; k <= years; k++) {
    const before = log[k - 1]!
    if (before === -Infinity) break
    chances[k - 1] = -Math.exp(hazardMultiplier * (before - start)) * Math.expm1(hazardMultiplier * (log[k]! - before))
  }
  return { chances, remaining: Math.exp(hazardMultiplier * (log[years]! - start)), overdueShare: 0 }
}

function overdue(years: number, spreadYears: number): ComingDown {
  if (!(Number.isInteger(spreadYears) && spreadYears >= 1)) {
    throw new ComputeError('parameter-not-positive', { overdueSpreadYears: spreadYears })
  }
  const chances = new Float64Array(years).fill(1 / spreadYears, 0, spreadYears)
  return { chances, remaining: Math.max(0, 1 - years / spreadYears), overdueShare: 1 }
}
