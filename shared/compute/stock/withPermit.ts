import { ComputeError } from '@/shared/compute/errors'
import type { ComingDown, DemolitionPermit } from './stock.types'

/**
 * Chances of a building with a known permit: with probability q it comes down in year j, otherwise it follows
 * the ordinary model from the survey on,
 *
 *     p′_k = (1 − q) p_k + q·1[k = j].
 *
 * @param permit year j = 1, 2, … counted from the survey, and execution probability q in [0, 1]
 * @returns chances as long as those given; a permit beyond the horizon raises what remains
 * @throws {ComputeError} `share-out-of-range`, `parameter-not-positive`
 * @see Closed form: mixture of two cases.
 * @example
 * withPermit({ chances: Float64Array.of(0.1, 0.1), remaining: 0.8, overdueShare: 0 }, { inYear: 2, executionProbability: 1 }).chances // => [0, 1]
 */
export function withPermit(ordinary: ComingDown, { inYear, executionProbability }: DemolitionPermit): ComingDown {
  if (!(executionProbability >= 0 && executionProbability <= 1)) {
    throw new ComputeError('share-out-of-range', { executionProbability })
  }
  if (!(Number.isInteger(inYear) && inYear >= 1)) throw new ComputeError('parameter-not-positive', { inYear })
  const otherwise = 1 - executionProbability
  const chances = ordinary.chances.map(
    (chance, index) => otherwise * chance + (index + 1 === inYear ? executionProbability : 0),
  )
  const later = inYear > chances.length ? executionProbability : 0
  return { chances, remaining: otherwise * ordinary.remaining + later, overdueShare: ordinary.overdueShare }
}
