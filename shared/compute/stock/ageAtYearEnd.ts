import { ComputeError } from '@/shared/compute/errors'
import type { YearOffset } from './stock.types'

/**
 * Age of a cohort at the end of a year, a = t − c + o.
 *
 * @param constructionYear c
 * @param year t
 * @returns age [yr]; negative before the cohort was built, where S = 1
 * @throws {ComputeError} `not-a-number`
 * @see Common practice of cohort models; o = 0.5 is the midpoint rule.
 * @example
 * ageAtYearEnd(1960, 2025, 0.5) // => 65.5
 */
export function ageAtYearEnd(constructionYear: number, year: number, yearOffset: YearOffset): number {
  const age = year - constructionYear + yearOffset
  if (!Number.isFinite(age)) throw new ComputeError('not-a-number', { constructionYear, year, yearOffset })
  return age
}
