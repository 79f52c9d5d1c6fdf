import { ComputeError } from '@/shared/compute/errors'
import { inflowDrivenStock } from './inflowDrivenStock'
import { requireShares } from './requireShares'

export interface CascadeInputs {
  /** Outflow of the first use by year [kg], ≥ 0; years beyond its end have none. */
  readonly outflowKg: ArrayLike<number>
  /** r, share of the outflow that is recovered [–]. */
  readonly recoveryShare: number
  /** l, share of the recovered lost in processing [–]. */
  readonly processLossShare: number
  /** S(j + o) of the second use, as long as the years [–]. */
  readonly secondSurvival: Float64Array
  /** Share of the second outflow recovered again [–]. */
  readonly secondRecoveryShare: number
  readonly years: number
}

/** Series by year [kg]. */
export interface CascadeCourse {
  readonly secondInflowKg: Float64Array
  readonly secondStockKg: Float64Array
  readonly secondOutflowKg: Float64Array
  readonly recoveredAgainKg: Float64Array
  readonly processLossKg: Float64Array
  /** Not recovered, from the first and from the second use. */
  readonly disposalKg: Float64Array
}

/**
 * What becomes of an outflow: a share is recovered, loses something in processing and is used a second time with
 * its own lifetime; what is not recovered from either use is disposed of,
 *
 *     second inflow = r(1 − l)·out,   disposal = (1 − r)·out + (1 − r₂)·second outflow.
 *
 * @returns recovered again + process loss + disposal + second stock add up to all outflow so far
 * @throws {ComputeError} `share-out-of-range`, `negative-amount`, `length-mismatch`
 * @see Sirkin, T. & ten Houten, M. (1994). The cascade chain. Resources, Conservation and Recycling 10, 213–276.
 * @example
 * cascade({ outflowKg: [100, 0], recoveryShare: 0.8, processLossShare: 0.5, secondSurvival: Float64Array.of(1, 0),
 *   secondRecoveryShare: 0.25, years: 2 }).disposalKg // => [20, 30]
 */
export function cascade(inputs: CascadeInputs): CascadeCourse {
  const { recoveryShare, processLossShare, secondSurvival, secondRecoveryShare, years } = inputs
  requireShares({ recoveryShare, processLossShare, secondRecoveryShare })
  if (inputs.outflowKg.length > years) {
    throw new ComputeError('length-mismatch', { outflow: inputs.outflowKg.length, years })
  }
  const outflowKg = Float64Array.from({ length: years }, (_, year) => inputs.outflowKg[year] ?? 0)
  const negative = outflowKg.find((mass) => !(mass >= 0))
  if (negative !== undefined) throw new ComputeError('negative-amount', { outflowKg: negative })
  const recoveredKg = outflowKg.map((mass) => recoveryShare * mass)
  const processLossKg = recoveredKg.map((mass) => processLossShare * mass)
  const secondInflowKg = recoveredKg.map((mass, year) => mass - processLossKg[year]!)
  const second = inflowDrivenStock(secondInflowKg, secondSurvival)
  const recoveredAgainKg = second.outflow.map((mass) => secondRecoveryShare * mass)
  return {
    secondInflowKg,
    secondStockKg: second.stock,
    secondOutflowKg: second.outflow,
    recoveredAgainKg,
    processLossKg,
    disposalKg: outflowKg.map(
      (mass, year) => mass - recoveredKg[year]! + second.outflow[year]! - recoveredAgainKg[year]!,
    ),
  }
}
