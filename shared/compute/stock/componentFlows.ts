import { ComputeError } from '@/shared/compute/errors'
import type { Renewals } from './renewalsAfter'
import type { ComingDown } from './stock.types'

export interface ComponentFlowInputs {
  readonly renewals: Renewals
  readonly building: ComingDown
  /** Mass of the component in place at the survey [kg], ≥ 0. */
  readonly massKg: number
  /** Mass of a new component over that of the one in place at the survey [–]; 1 unless given. */
  readonly replacementRatio?: number
  /** A demolition known in advance: nothing is renewed in its year and in the years before it. */
  readonly beforeDemolition?: { readonly inYear: number; readonly quietYears: number }
}

/** Series by year k = 1 … horizon [kg]. */
export interface ComponentFlows {
  readonly refurbishmentKg: Float64Array
  readonly demolitionKg: Float64Array
  /** New components built in. */
  readonly inflowKg: Float64Array
  /** Mass in place at the end of each year. */
  readonly stockKg: Float64Array
}

/**
 * What a component sends out of a standing building: again and again by refurbishment while the building survives
 * the year, and once by demolition,
 *
 *     refurbishment_k = q_k v_k M,   demolition_k = p_k M,   inflow_k = q_k v_k M′,   q_k = S_b(a + k)/S_b(a).
 *
 * With replacements of another mass M′ the mass in place is followed: M until the first renewal, M′ after.
 *
 * @returns stock + inflow − outflow agrees every year; over a long horizon more than one mass leaves
 * @throws {ComputeError} `length-mismatch`, `negative-amount`, `parameter-not-positive`
 * @see Sandberg, N. H., Sartori, I. & Brattebø, H. (2014). Sensitivity analysis in long-term dynamic building stock
 *   modeling. Energy Policy 74, 493–504 (renovation conditional on standing).
 * @example
 * componentFlows({
 *   renewals: { all: Float64Array.of(1, 0), first: Float64Array.of(1, 0) },
 *   building: { chances: Float64Array.of(0.5, 0.25), remaining: 0.25, overdueShare: 0 },
 *   massKg: 100,
 * }) // => { refurbishmentKg: [50, 0], demolitionKg: [50, 25], inflowKg: [50, 0], stockKg: [50, 25] }
 */
export function componentFlows({
  renewals,
  building,
  massKg,
  replacementRatio = 1,
  beforeDemolition,
}: ComponentFlowInputs): ComponentFlows {
  const years = building.chances.length
  if (renewals.all.length !== years || renewals.first.length !== years) {
    throw new ComputeError('length-mismatch', { building: years, renewals: renewals.all.length })
  }
  if (!(massKg >= 0)) throw new ComputeError('negative-amount', { massKg })
  if (!(replacementRatio > 0)) throw new ComputeError('parameter-not-positive', { replacementRatio })
  const newKg = massKg * replacementRatio
  const flows = {
    refurbishmentKg: new Float64Array(years),
    demolitionKg: new Float64Array(years),
    inflowKg: new Float64Array(years),
    stockKg: new Float64Array(years),
  }
  let [standing, firstInPlace] = [1, 1]
  for (let k = 0; k < years; k++) {
    const isQuiet = beforeDemolition !== undefined && withinQuiet(k + 1, beforeDemolition)
    const renewed = isQuiet ? 0 : renewals.all[k]!
    const renewedFirst = isQuiet ? 0 : Math.min(firstInPlace, renewals.first[k]!)
    const chance = building.chances[k]!
    standing = Math.max(0, standing - chance)
    flows.demolitionKg[k] = chance * (firstInPlace * massKg + (1 - firstInPlace) * newKg)
    flows.refurbishmentKg[k] = standing * (renewedFirst * massKg + (renewed - renewedFirst) * newKg)
    flows.inflowKg[k] = standing * renewed * newKg
    firstInPlace -= renewedFirst
    flows.stockKg[k] = standing * (firstInPlace * massKg + (1 - firstInPlace) * newKg)
  }
  return flows
}

function withinQuiet(year: number, { inYear, quietYears }: { inYear: number; quietYears: number }): boolean {
  return year > inYear - quietYears && year <= inYear
}
