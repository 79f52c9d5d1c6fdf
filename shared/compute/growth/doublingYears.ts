import { ComputeError } from '@/shared/compute/errors'

/**
 * Time in which a growing quantity doubles, or a falling one halves: ln 2/|g|, or ln 2/|ln(1 + g)| compounded by
 * the year.
 *
 * @param ratePerYear g [1/yr], not 0
 * @returns years
 * @throws {ComputeError} `parameter-out-of-range`
 * @see Closed form.
 * @example
 * doublingYears(Math.LN2, 'continuous') // => 1
 * doublingYears(1, 'yearly') // => 1
 */
export function doublingYears(ratePerYear: number, compounding: 'yearly' | 'continuous'): number {
  const isProper =
    Number.isFinite(ratePerYear) && ratePerYear !== 0 && (compounding === 'continuous' || ratePerYear > -1)
  if (!isProper) throw new ComputeError('parameter-out-of-range', { ratePerYear, compounding })
  return Math.LN2 / Math.abs(compounding === 'continuous' ? ratePerYear : Math.log1p(ratePerYear))
}
