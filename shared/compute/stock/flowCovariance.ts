import { ComputeError } from '@/shared/compute/errors'
import type { ComingDown, StandingGroup } from './stock.types'

/**
 * Covariance of the flows of two years: a building that fell in the one cannot fall in the other,
 *
 *     Cov(j, k) = −Σ x_i² p_ij p_ik,   Cov(k, k) = Σ x_i² p_ik (1 − p_ik).
 *
 * @param chancesOfGroups chances by group, same order as groups
 * @param inYear first year, 1 … horizon
 * @param andYear second year, 1 … horizon
 * @returns covariance, in the unit of the amount squared; ≤ 0 for two different years
 * @throws {ComputeError} `length-mismatch`, `parameter-out-of-range`
 * @see Johnson, N. L., Kotz, S. & Balakrishnan, N. (1997). Discrete Multivariate Distributions, ch. 35.
 * @example
 * flowCovariance(
 *   [{ lifetime: { model: 'fixed', lifetimeYears: 60 }, constructionYear: 1967, amount: 10, buildingCount: 1 }],
 *   [{ chances: Float64Array.of(0.5, 0.25), remaining: 0.25, overdueShare: 0 }], 1, 2,
 * ) // => -12.5
 */
export function flowCovariance(
  groups: readonly StandingGroup[],
  chancesOfGroups: readonly ComingDown[],
  inYear: number,
  andYear: number,
): number {
  if (groups.length !== chancesOfGroups.length) {
    throw new ComputeError('length-mismatch', { groups: groups.length, chances: chancesOfGroups.length })
  }
  return groups.reduce((covariance, { amount, buildingCount }, index) => {
    const { chances } = chancesOfGroups[index]!
    const [one, other] = [chances[inYear - 1], chances[andYear - 1]]
    if (one === undefined || other === undefined) throw new ComputeError('parameter-out-of-range', { inYear, andYear })
    const square = (amount * amount) / buildingCount
    return covariance + square * (inYear === andYear ? one * (1 - one) : -one * other)
  }, 0)
}
