import { ComputeError } from '@/shared/compute/errors'

/** Series by year, in the unit of the stock. */
export interface FixedLifetimeCourse {
  readonly inflow: Float64Array
  readonly outflow: Float64Array
}

/**
 * Inflow that a stock of a fixed lifetime asks for, its first value all built in year 0 (end of the year),
 *
 *     inflow_t = stock_t − stock_(t−1) + inflow_(t−L),   outflow_t = inflow_(t−L).
 *
 * The opening year echoes every L years: allowed where that is meant, never for a surveyed stock.
 *
 * @param stock by year, ≥ 0
 * @param lifetimeYears L, a whole number ≥ 1
 * @throws {ComputeError} `negative-amount`, `parameter-not-positive`
 * @see Müller, D. B. (2006). Stock dynamics for forecasting material flows. Ecological Economics 59, 142–156.
 * @example
 * fixedLifetimeInflow([100, 100, 100], 2) // => { inflow: [100, 0, 100], outflow: [0, 0, 100] }
 */
export function fixedLifetimeInflow(stock: ArrayLike<number>, lifetimeYears: number): FixedLifetimeCourse {
  if (!(Number.isInteger(lifetimeYears) && lifetimeYears >= 1)) {
    throw new ComputeError('parameter-not-positive', { lifetimeYears })
  }
  const inflow = new Float64Array(stock.length)
  const outflow = new Float64Array(stock.length)
  for (let year = 0; year < stock.length; year++) {
    if (!(stock[year]! >= 0)) throw new ComputeError('negative-amount', { year, stock: stock[year] })
    outflow[year] = inflow[year - lifetimeYears] ?? 0
    inflow[year] = stock[year]! - (stock[year - 1] ?? 0) + outflow[year]!
  }
  return { inflow, outflow }
}
