import { ComputeError } from '@/shared/compute/errors'
import { PERIODS, type PeriodId } from './vocabulary'

/**
 * Construction period of a year. Periods are half-open: 1919 opens `1919-1945`.
 *
 * @param constructionYear calendar year
 * @returns id of the one period that holds it
 * @throws {ComputeError} `not-a-number`
 * @example
 * periodOfYear(1918) // => 'before-1919'
 * periodOfYear(1919) // => '1919-1945'
 */
export function periodOfYear(constructionYear: number): PeriodId {
  const period = PERIODS.find(
    ({ fromYear, toYear }) => constructionYear >= (fromYear ?? -Infinity) && constructionYear < (toYear ?? Infinity),
  )
  if (period === undefined) throw new ComputeError('not-a-number', { constructionYear })
  return period.id
}
