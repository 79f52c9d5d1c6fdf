import { ComputeError } from '@/shared/compute/errors'
import type { ComingDown, StandingGroup, SurveyConventions } from './stock.types'
import { standingChancesOfGroups } from './standingChancesOfGroups'

/** What is to come from buildings that stand at the survey; series by year k = 1 … horizon. */
export interface StandingFlows {
  readonly expected: Float64Array
  /** Variance of each year's flow, in the unit of the amount squared. */
  readonly variance: Float64Array
  readonly cumulativeExpected: Float64Array
  /** Variance of all that came down so far: smaller than the sum of the yearly ones. */
  readonly cumulativeVariance: Float64Array
  readonly surveyed: number
  /** Expected to stand at the end of the horizon. */
  readonly remaining: number
  /** Expected flow of the first year over what was surveyed [1/yr]. */
  readonly impliedRatePerYear: number
  readonly overdueBuildingCount: number
  readonly overdueAmount: number
}

/**
 * Expected flow and its chance from buildings that stand at the survey. Each building falls at most once:
 *
 *     E_k = Σ x_i p_ik,   Var_k = Σ x_i² p_ik (1 − p_ik),   cumulative Var_K = Σ x_i² P_iK (1 − P_iK).
 *
 * A group of n equal buildings counts n times with x/n each.
 *
 * @returns expectations add up with what remains to what was surveyed
 * @throws {ComputeError} `negative-amount`, `parameter-not-positive` for a group without buildings, and those of
 *   `standingChancesOfGroups`
 * @see Johnson, N. L., Kemp, A. W. & Kotz, S. (2005). Univariate Discrete Distributions, 3rd ed., §3.12 (unequal trials).
 * @example
 * standingFlows(
 *   [{ lifetime: { model: 'fixed', lifetimeYears: 60 }, constructionYear: 1967, amount: 100, buildingCount: 2 }],
 *   { surveyYear: 2025, horizonYears: 3, yearOffset: 0 },
 * ).expected // => [0, 100, 0]
 */
export function standingFlows(groups: readonly StandingGroup[], conventions: SurveyConventions): StandingFlows {
  return flowsOfChances(groups, standingChancesOfGroups(groups, conventions), conventions.horizonYears)
}

function flowsOfChances(
  groups: readonly StandingGroup[],
  chancesOfGroups: readonly ComingDown[],
  years: number,
): StandingFlows {
  const expected = new Float64Array(years)
  const variance = new Float64Array(years)
  const cumulativeExpected = new Float64Array(years)
  const cumulativeVariance = new Float64Array(years)
  let [surveyed, remaining, overdueBuildingCount, overdueAmount] = [0, 0, 0, 0]
  groups.forEach(({ amount, buildingCount }, index) => {
    if (!(amount >= 0)) throw new ComputeError('negative-amount', { amount })
    if (!(buildingCount > 0)) throw new ComputeError('parameter-not-positive', { buildingCount })
    const ofGroup = chancesOfGroups[index]!
    const square = (amount * amount) / buildingCount
    let soFar = 0
    for (let k = 0; k < years; k++) {
      const chance = ofGroup.chances[k]!
      // rounding may carry a sum of chances a hair above one
      soFar = Math.min(1, soFar + chance)
      expected[k]! += amount * chance
      variance[k]! += square * chance * (1 - chance)
      cumulativeExpected[k]! += amount * soFar
      cumulativeVariance[k]! += square * soFar * (1 - soFar)
    }
    surveyed += amount
    remaining += amount * ofGroup.remaining
    overdueBuildingCount += buildingCount * ofGroup.overdueShare
    overdueAmount += amount * ofGroup.overdueShare
  })
  const impliedRatePerYear = surveyed > 0 && years > 0 ? expected[0]! / surveyed : 0
  return {
    expected,
    variance,
    cumulativeExpected,
    cumulativeVariance,
    surveyed,
    remaining,
    impliedRatePerYear,
    overdueBuildingCount,
    overdueAmount,
  }
}
