import { ComputeError } from '@/shared/compute/errors'

/** Series by year of one system, all masses in kg. */
export interface IndicatorInputs {
  /** In use at the end of each year. */
  readonly stockKg: ArrayLike<number>
  /** New construction. */
  readonly constructionKg: ArrayLike<number>
  /** Brought in by refurbishment. */
  readonly renewalKg: ArrayLike<number>
  readonly demolitionKg: ArrayLike<number>
  readonly refurbishmentKg: ArrayLike<number>
  /** Recovered from demolition and refurbishment, ready for use. */
  readonly recoveredKg: ArrayLike<number>
  /** People living in the district; left out when not known. */
  readonly population?: ArrayLike<number>
}

/** A figure that cannot be formed, because what it is relative to is 0, is null. */
export interface IndicatorRow {
  readonly year: number
  /** Recovered over all that comes out [–]. */
  readonly recoveryRate: number | null
  /** Recovered over all that is needed for construction and refurbishment [–]. */
  readonly recoveredSupplyToDemand: number | null
  readonly stockPerPersonKg: number | null
  /** Demolition over the stock before the year [1/yr]. */
  readonly demolitionRatePerYear: number | null
  /** Renewed by refurbishment over the stock before the year [1/yr]. */
  readonly renewalRatePerYear: number | null
}

/**
 * Indicators over time: how much is recovered, how much of the demand that could cover, and how fast the stock turns.
 *
 * @param openingStockKg stock before the first year [kg], ≥ 0
 * @returns one row a year
 * @throws {ComputeError} `length-mismatch`, `negative-amount`
 * @see Brunner, P. H. & Rechberger, H. (2016). Handbook of Material Flow Analysis, 2nd ed., ch. 2.
 * @example
 * stockIndicators({ stockKg: [100], constructionKg: [10], renewalKg: [10], demolitionKg: [8], refurbishmentKg: [2],
 *   recoveredKg: [5] }, 100)[0].recoveryRate // => 0.5
 */
export function stockIndicators(inputs: IndicatorInputs, openingStockKg: number): IndicatorRow[] {
  if (!(openingStockKg >= 0)) throw new ComputeError('negative-amount', { openingStockKg })
  const years = inputs.stockKg.length
  for (const [name, series] of Object.entries(inputs)) checkSeries(name, series, years)
  return Array.from({ length: years }, (_, year): IndicatorRow => {
    const before = year === 0 ? openingStockKg : inputs.stockKg[year - 1]!
    const comesOut = inputs.demolitionKg[year]! + inputs.refurbishmentKg[year]!
    const needed = inputs.constructionKg[year]! + inputs.renewalKg[year]!
    return {
      year,
      recoveryRate: over(inputs.recoveredKg[year]!, comesOut),
      recoveredSupplyToDemand: over(inputs.recoveredKg[year]!, needed),
      stockPerPersonKg: inputs.population ? over(inputs.stockKg[year]!, inputs.population[year]!) : null,
      demolitionRatePerYear: over(inputs.demolitionKg[year]!, before),
      renewalRatePerYear: over(inputs.refurbishmentKg[year]!, before),
    }
  })
}

function over(part: number, whole: number): number | null {
  return whole > 0 ? part / whole : null
}

function checkSeries(name: string, series: ArrayLike<number> | undefined, years: number): void {
  if (!series) return
  if (series.length !== years) throw new ComputeError('length-mismatch', { [name]: series.length, years })
  for (let year = 0; year < years; year++) {
    if (!(series[year]! >= 0)) throw new ComputeError('negative-amount', { year, [name]: series[year] })
  }
}
