import { ComputeError } from '@/shared/compute/errors'

/** One process of a system and what went through it, by year, all in one unit. */
export interface ProcessCourse {
  readonly process: string
  readonly inflow: ArrayLike<number>
  readonly outflow: ArrayLike<number>
  /** Stock at the end of each year; a process that holds nothing has none. */
  readonly stock?: ArrayLike<number>
  /** Stock before the first year; 0 unless given. */
  readonly openingStock?: number
}

export interface BalanceRow {
  readonly process: string
  /** Index of the year, from 0. */
  readonly year: number
  readonly inflow: number
  readonly outflow: number
  readonly stockChange: number
  /** inflow − outflow − stock change, in the unit of the flows. */
  readonly residual: number
  readonly relativeResidual: number
}

/** Largest relative residual of a run that may be shown. */
export const BALANCE_TOLERANCE = 1e-9
/** What a process once held or moved rounds what little is left of it later. */
const PEAK_SCALE = 1e-3
/** Below this a double has no digits left to be relative to. */
const LEAST_SCALE = 1e-290

/**
 * Mass balance of every process and year, inflow − outflow = Δstock, as the table that goes with a run. The residual
 * is taken relative to the largest of inflow, outflow, stock change and a thousandth of the largest stock or flow that
 * the process has had so far.
 *
 * @returns one row a process and year
 * @throws {ComputeError} `mass-not-balanced` naming process and year when a relative residual exceeds 1e−9 or is not a
 *   number, `length-mismatch`
 * @see Brunner, P. H. & Rechberger, H. (2016). Handbook of Material Flow Analysis, 2nd ed., ch. 2.
 * @example
 * massBalance([{ process: 'use', inflow: [3, 4], outflow: [1, 4], stock: [2, 2] }])[0].stockChange // => 2
 */
export function massBalance(processes: readonly ProcessCourse[]): BalanceRow[] {
  return processes.flatMap((course) => {
    const { process, inflow, outflow, stock, openingStock = 0 } = course
    if (outflow.length !== inflow.length || (stock && stock.length !== inflow.length)) {
      throw new ComputeError('length-mismatch', { process, inflow: inflow.length, outflow: outflow.length })
    }
    let peak = Math.abs(openingStock)
    return Array.from({ length: inflow.length }, (_, year): BalanceRow => {
      const row = { process, year, inflow: inflow[year]!, outflow: outflow[year]! }
      const [before, now] = stock ? [year === 0 ? openingStock : stock[year - 1]!, stock[year]!] : [0, 0]
      peak = Math.max(peak, Math.abs(row.inflow), Math.abs(row.outflow), Math.abs(now))
      return balanced({ ...row, stockChange: now - before }, peak)
    })
  })
}

function balanced(row: Omit<BalanceRow, 'residual' | 'relativeResidual'>, peak: number): BalanceRow {
  const { inflow, outflow, stockChange } = row
  const residual = inflow - outflow - stockChange
  const scale = Math.max(Math.abs(inflow), Math.abs(outflow), Math.abs(stockChange), PEAK_SCALE * peak, LEAST_SCALE)
  const relativeResidual = Math.abs(residual) / scale
  if (!(relativeResidual <= BALANCE_TOLERANCE)) {
    throw new ComputeError('mass-not-balanced', { ...row, residual, relativeResidual })
  }
  return { ...row, residual, relativeResidual }
}
