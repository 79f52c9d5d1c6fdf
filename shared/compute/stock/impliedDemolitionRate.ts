import { ComputeError } from '@/shared/compute/errors'

/** Yearly demolition rates seen in national statistics [1/yr]; outside of these a lifetime needs a second look. */
export const PLAUSIBLE_DEMOLITION_RATE = { least: 0.001, most: 0.01 } as const

export interface ImpliedRate {
  readonly ratePerYear: number
  readonly isPlausible: boolean
}

/**
 * Rate of demolition that a lifetime implies for the surveyed stock: first year's expected flow over what stands.
 * Ages at demolition mistaken for lifetimes show here, as rates some ten times those observed.
 *
 * @param firstYearFlow expected flow of the first year, ≥ 0
 * @param surveyed what stands at the survey, same unit, > 0
 * @throws {ComputeError} `negative-amount`, `parameter-not-positive`
 * @see Andersen, R. & Negendahl, K. (2023) for an observed rate near 0.2 %/yr; the bounds are common practice.
 * @example
 * impliedDemolitionRate(27, 1000) // => { ratePerYear: 0.027, isPlausible: false }
 */
export function impliedDemolitionRate(firstYearFlow: number, surveyed: number): ImpliedRate {
  if (!(firstYearFlow >= 0)) throw new ComputeError('negative-amount', { firstYearFlow })
  if (!(surveyed > 0)) throw new ComputeError('parameter-not-positive', { surveyed })
  const ratePerYear = firstYearFlow / surveyed
  const { least, most } = PLAUSIBLE_DEMOLITION_RATE
  return { ratePerYear, isPlausible: ratePerYear >= least && ratePerYear <= most }
}
