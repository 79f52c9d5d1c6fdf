import { ComputeError } from '@/shared/compute/errors'
import type { SurvivalTable } from '@/shared/compute/lifetime/survivalTable'

const ROUNDING = 1e-13

/** Part of the stock that stands before the first year. */
export interface OpeningCohort {
  /** Whole years since its construction at the end of the year before the first, ≥ 0: table entry. */
  readonly sinceYears: number
  readonly amount: number
}

/** Which buildings go when more has to go than would by itself. */
export type ExtraDemolitionRule = 'oldest-first' | 'proportional'

export interface StockDrivenInputs {
  /** Stock at the end of each year, ≥ 0, any unit. */
  readonly stock: ArrayLike<number>
  /** Survival at ages o, 1 + o, …: entries up to the oldest opening cohort at the end of all years. */
  readonly table: SurvivalTable
  readonly opening?: readonly OpeningCohort[]
  readonly extraDemolitionRule?: ExtraDemolitionRule
}

/** Series by year, in the unit of the stock. */
export interface StockDrivenCourse {
  readonly inflow: Float64Array
  /** What leaves by its own life. */
  readonly outflow: Float64Array
  /** What has to be taken down besides, because the stock falls faster. */
  readonly extraDemolition: Float64Array
  readonly openingStock: number
}

/**
 * Inflow that keeps a stock on its path,
 *
 *     I_t = [Stock_t − Σ_(c<t) survivors_c]/S(o),
 *
 * the survivors of an opening stock by its ages, S(a + k)/S(a). Where the stock falls faster than it would by itself
 * the inflow is 0 and the rest is taken from standing cohorts as extra demolition; a clipped inflow alone would
 * break the balance.
 *
 * @returns inflow − outflow − extra demolition is the change of the stock, every year
 * @throws {ComputeError} `negative-amount`, `negative-age`, `length-mismatch` for a short table, `parameter-not-positive`
 *   when nothing survives its construction year
 * @remarks cost (years + cohorts) · years
 * @see Müller, D. B. (2006). Stock dynamics for forecasting material flows. Ecological Economics 59, 142–156;
 *   the opening stock by ages after Sartori, I., Sandberg, N. H. & Brattebø, H. (2016). Dynamic building stock
 *   modelling. Energy and Buildings 132, 13–25.
 * @example
 * stockDrivenInflow({ stock: [100, 100], table: tabulateSurvival({ model: 'fixed', lifetimeYears: 2 }, 0, 4),
 *   opening: [{ sinceYears: 1, amount: 40 }, { sinceYears: 0, amount: 60 }] }).inflow // => [40, 60]
 */
export function stockDrivenInflow({
  stock,
  table,
  opening = [],
  extraDemolitionRule = 'oldest-first',
}: StockDrivenInputs): StockDrivenCourse {
  const years = stock.length
  const yieldOfYear = table.survival[0]!
  if (years > 0 && !(yieldOfYear > 0)) throw new ComputeError('parameter-not-positive', { firstYear: yieldOfYear })
  const cohorts = openingCohorts(opening, table, years)
  const openingStock = cohorts.reduce((total, { amount }) => total + amount, 0)
  const course = {
    inflow: new Float64Array(years),
    outflow: new Float64Array(years),
    extraDemolition: new Float64Array(years),
    openingStock,
  }
  for (let year = 0; year < years; year++) {
    const asked = stock[year]!
    if (!(asked >= 0 && asked < Infinity)) throw new ComputeError('negative-amount', { year, stock: asked })
    course.outflow[year] = ageOneYear(cohorts, table)
    const missing = withoutRounding(asked - cohorts.reduce((total, { amount }) => total + amount, 0), asked)
    if (missing >= 0) {
      const built = missing / yieldOfYear
      course.inflow[year] = built
      course.outflow[year]! += built - missing
      cohorts.push({ amount: missing, since: 0 })
    } else {
      course.extraDemolition[year] = -missing
      takeDown(cohorts, -missing, extraDemolitionRule)
    }
  }
  return course
}

/** A difference that is nothing but the rounding of its parts is no demolition. */
function withoutRounding(difference: number, of: number): number {
  return Math.abs(difference) <= ROUNDING * of ? 0 : difference
}

interface Cohort {
  amount: number
  since: number
}

function openingCohorts(opening: readonly OpeningCohort[], table: SurvivalTable, years: number): Cohort[] {
  const cohorts = opening.map(({ sinceYears, amount }): Cohort => {
    if (!(amount >= 0 && amount < Infinity)) throw new ComputeError('negative-amount', { sinceYears, amount })
    if (!(Number.isInteger(sinceYears) && sinceYears >= 0)) throw new ComputeError('negative-age', { sinceYears })
    return { amount, since: sinceYears }
  })
  const oldest = cohorts.reduce((most, { since }) => Math.max(most, since), -1)
  if (oldest + years >= table.logSurvival.length) {
    throw new ComputeError('length-mismatch', { oldest, years, tableLength: table.survival.length })
  }
  // oldest first, so that the order of the list is the order in which they go
  return cohorts.sort((a, b) => b.since - a.since)
}

/** Lets a year pass over all cohorts; returns what left. */
function ageOneYear(cohorts: Cohort[], { logSurvival }: SurvivalTable): number {
  let left = 0
  for (const cohort of cohorts) {
    const now = logSurvival[cohort.since]!
    cohort.since++
    if (cohort.amount === 0) continue
    // what stands although the model leaves no survivor is overdue and goes
    const leavingShare = now === -Infinity ? 1 : -Math.expm1(logSurvival[cohort.since]! - now)
    const lost = cohort.amount * leavingShare
    cohort.amount -= lost
    left += lost
  }
  return left
}

function takeDown(cohorts: Cohort[], amount: number, rule: ExtraDemolitionRule): void {
  const standing = cohorts.reduce((total, cohort) => total + cohort.amount, 0)
  if (rule === 'proportional') {
    const kept = Math.max(0, 1 - amount / standing)
    for (const cohort of cohorts) cohort.amount *= kept
    return
  }
  let left = amount
  for (const cohort of cohorts) {
    const taken = Math.min(left, cohort.amount)
    cohort.amount -= taken
    left -= taken
    if (left === 0) return
  }
}
