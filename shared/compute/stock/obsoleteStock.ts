import { ComputeError } from '@/shared/compute/errors'
import { requireShares } from './requireShares'

export interface ObsoleteInputs {
  /** What goes out of use by year [kg], ≥ 0; years beyond its end have none. */
  readonly outflowKg: ArrayLike<number>
  /** Share that stays in place, out of use [–]. */
  readonly obsoleteShare: number
  /** Share of the obsolete stock collected in a year [1/yr], in [0, 1]. */
  readonly collectionRate: number
  readonly years: number
}

/** Series by year [kg]. */
export interface ObsoleteCourse {
  readonly collectedKg: Float64Array
  readonly stockKg: Float64Array
}

/**
 * Stock out of use but still in place, such as buried pipes and cables: a share of the outflow joins it, and a
 * constant share of it is collected each year, the year's addition included,
 *
 *     collected_t = (1 − s)·out_t + c·(B_(t−1) + s·out_t),   B_t = (1 − c)(B_(t−1) + s·out_t).
 *
 * @returns collected + stock add up to all outflow so far
 * @throws {ComputeError} `share-out-of-range`, `negative-amount`, `length-mismatch`
 * @see Krook, J. et al. (2011). Urban metal stocks hibernating in the ground. Resources, Conservation and Recycling 55.
 * @example
 * obsoleteStock({ outflowKg: [10], obsoleteShare: 0.5, collectionRate: 0.5, years: 2 }).collectedKg // => [7.5, 1.25]
 */
export function obsoleteStock({ outflowKg, obsoleteShare, collectionRate, years }: ObsoleteInputs): ObsoleteCourse {
  requireShares({ obsoleteShare, collectionRate })
  if (outflowKg.length > years) throw new ComputeError('length-mismatch', { outflow: outflowKg.length, years })
  const collectedKg = new Float64Array(years)
  const stockKg = new Float64Array(years)
  let inPlace = 0
  for (let year = 0; year < years; year++) {
    const out = outflowKg[year] ?? 0
    if (!(out >= 0)) throw new ComputeError('negative-amount', { year, outflowKg: out })
    inPlace += obsoleteShare * out
    const collected = collectionRate * inPlace
    collectedKg[year] = (1 - obsoleteShare) * out + collected
    inPlace -= collected
    stockKg[year] = inPlace
  }
  return { collectedKg, stockKg }
}
