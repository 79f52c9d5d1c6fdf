import { ComputeError } from '@/shared/compute/errors'

export interface UnconstrainedInflow {
  /** Negative where the stock falls faster than it would by itself. */
  readonly inflow: Float64Array
  readonly outflow: Float64Array
}

/**
 * Inflow that a stock asks for if construction could be negative, nothing standing before the first year,
 *
 *     I_t = [Stock_t − Σ_(c<t) I_c S(t − c + o)]/S(o).
 *
 * Shows where a path of the stock cannot be met; `stockDrivenInflow` says what happens then.
 *
 * @param stock by year, ≥ 0
 * @param survival S(j + o), at least as long as the stock, S(o) > 0 [–]
 * @returns inflow − outflow is the change of the stock, every year
 * @throws {ComputeError} `length-mismatch`, `negative-amount`, `parameter-not-positive` when nothing survives its year
 * @see Müller, D. B. (2006). Stock dynamics for forecasting material flows. Ecological Economics 59, 142–156.
 * @example
 * unconstrainedInflow([100, 20], Float64Array.of(1, 0.5)).inflow // => [100, -30]
 */
export function unconstrainedInflow(stock: ArrayLike<number>, survival: Float64Array): UnconstrainedInflow {
  const years = stock.length
  if (survival.length < years) throw new ComputeError('length-mismatch', { years, survival: survival.length })
  if (years > 0 && !(survival[0]! > 0)) throw new ComputeError('parameter-not-positive', { firstYear: survival[0] })
  const inflow = new Float64Array(years)
  const outflow = new Float64Array(years)
  let before = 0
  for (let year = 0; year < years; year++) {
    const asked = stock[year]!
    if (!(asked >= 0)) throw new ComputeError('negative-amount', { year, stock: asked })
    let survivors = 0
    for (let built = 0; built < year; built++) survivors += inflow[built]! * survival[year - built]!
    inflow[year] = (asked - survivors) / survival[0]!
    outflow[year] = before - survivors + inflow[year]! * (1 - survival[0]!)
    before = asked
  }
  return { inflow, outflow }
}
