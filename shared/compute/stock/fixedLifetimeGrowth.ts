import { ComputeError } from '@/shared/compute/errors'

export interface FixedLifetimeGrowth {
  readonly outflowToInflow: number
  readonly inflowToStock: number
  readonly outflowToStock: number
}

/**
 * Steady ratios of a stock whose inflow grows by α a year and lasts exactly L years (built at the end of its year),
 *
 *     out/in = (1 + α)^(−L),   in/stock = (1 − 1/(1 + α))/(1 − (1 + α)^(−L)):
 *
 * a young and growing stock sends out little for a long time.
 *
 * @param growthRate α [1/yr], > −1; for 0 the ratios are 1 and 1/L
 * @param lifetimeYears L, a whole number ≥ 1
 * @throws {ComputeError} `parameter-out-of-range`, `parameter-not-positive`
 * @see Closed form: geometric series of the last L inflows.
 * @example
 * fixedLifetimeGrowth(0, 40) // => { outflowToInflow: 1, inflowToStock: 0.025, outflowToStock: 0.025 }
 */
export function fixedLifetimeGrowth(growthRate: number, lifetimeYears: number): FixedLifetimeGrowth {
  if (!(growthRate > -1 && growthRate < Infinity)) throw new ComputeError('parameter-out-of-range', { growthRate })
  if (!(Number.isInteger(lifetimeYears) && lifetimeYears >= 1)) {
    throw new ComputeError('parameter-not-positive', { lifetimeYears })
  }
  const log = Math.log1p(growthRate)
  const outflowToInflow = Math.exp(-lifetimeYears * log)
  const inflowToStock = log === 0 ? 1 / lifetimeYears : Math.expm1(-log) / Math.expm1(-lifetimeYears * log)
  return { outflowToInflow, inflowToStock, outflowToStock: outflowToInflow * inflowToStock }
}
