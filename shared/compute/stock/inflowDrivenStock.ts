import { ComputeError } from '@/shared/compute/errors'

/** Series by year, in the unit of the inflow. */
export interface StockCourse {
  readonly stock: Float64Array
  readonly outflow: Float64Array
}

/**
 * Stock that an inflow builds up, nothing standing before the first year,
 *
 *     stock_t = Σ_(c≤t) I_c S(t − c + o),   outflow_t = Σ_(c≤t) I_c [S(t − 1 − c + o) − S(t − c + o)].
 *
 * @param inflow by year, any sign
 * @param survival S(j + o), at least as long as the inflow [–]
 * @returns all that came in is standing or has left, every year
 * @throws {ComputeError} `length-mismatch`, `not-a-number`
 * @see Baccini, P. & Bader, H.-P. (1996). Regionaler Stoffhaushalt, ch. 3; Müller, D. B. (2006). Stock dynamics for
 *   forecasting material flows. Ecological Economics 59, 142–156.
 * @example
 * inflowDrivenStock([100, 0, 0], Float64Array.of(1, 0.5, 0.25)) // => { stock: [100, 50, 25], outflow: [0, 50, 25] }
 */
export function inflowDrivenStock(inflow: ArrayLike<number>, survival: Float64Array): StockCourse {
  const years = inflow.length
  if (survival.length < years) throw new ComputeError('length-mismatch', { years, survival: survival.length })
  const stock = new Float64Array(years)
  const outflow = new Float64Array(years)
  for (let built = 0; built < years; built++) {
    const amount = inflow[built]!
    if (!Number.isFinite(amount)) throw new ComputeError('not-a-number', { year: built, inflow: amount })
    if (amount === 0) continue
    let before = 1
    for (let age = 0; built + age < years; age++) {
      const now = survival[age]!
      stock[built + age]! += amount * now
      outflow[built + age]! += amount * (before - now)
      before = now
    }
  }
  return { stock, outflow }
}
