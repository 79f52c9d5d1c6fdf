import type { RunResult } from '@/shared/schemas/run'

/** Ten years of demolition and refurbishment in several runs. */
export interface DecadeRow {
  readonly fromYear: number
  readonly toYear: number
  /** Expected mass [kg] in each run; null where its horizon ends before these years do. */
  readonly demolitionKg: readonly (number | null)[]
  readonly refurbishmentKg: readonly (number | null)[]
}

const YEARS = 10

/** Expected flows added up by ten years of the calendar of the earliest run. */
export function decadeRows(results: readonly RunResult[]): DecadeRow[] {
  const years = results.flatMap(({ yearsAhead }) => yearsAhead.years)
  if (years.length === 0) return []
  const [first, last] = [Math.min(...years), Math.max(...years)]
  return Array.from({ length: Math.floor((last - first + 1) / YEARS) }, (_, decade): DecadeRow => {
    const fromYear = first + decade * YEARS
    const toYear = fromYear + YEARS - 1
    const sumOf = (flow: 'demolition' | 'refurbishment') =>
      results.map(({ yearsAhead }) => sumBetween(yearsAhead.years, yearsAhead[flow].total.meanKg, fromYear, toYear))
    return { fromYear, toYear, demolitionKg: sumOf('demolition'), refurbishmentKg: sumOf('refurbishment') }
  })
}

function sumBetween(
  years: readonly number[],
  massesKg: readonly number[],
  fromYear: number,
  toYear: number,
): number | null {
  if (!years.includes(fromYear) || !years.includes(toYear)) return null
  return massesKg.reduce((sum, massKg, place) => {
    const year = years[place] ?? 0
    return year >= fromYear && year <= toYear ? sum + massKg : sum
  }, 0)
}
