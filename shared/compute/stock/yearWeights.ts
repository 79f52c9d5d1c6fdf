import { ComputeError } from '@/shared/compute/errors'
import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'
import { lifetimeLaw } from '@/shared/compute/lifetime/lifetimeLaw'
import type { ConstructionYear, SurveyConventions, YearWeight } from './stock.types'

const LONGEST_MIDPOINT_RANGE = 5
const ROUNDING = 1e-9

/**
 * Possible construction years of a standing building with their weights. By judgement all years of the range weigh
 * alike; by register a year weighs as much as S(age), since fewer of its buildings are left.
 *
 * @param constructionYear a year, a range, or years with weights
 * @returns weights that add up to 1
 * @throws {ComputeError} `interval-open` for a range without a first year, `interval-reversed`, `parameter-out-of-range`
 *   for a midpoint of more than five years, `negative-age` for a year after the survey, `share-out-of-range` for
 *   weights that do not add up to 1, `empty-input`, `not-a-number`
 * @see Lawless, J. F. (2003). Statistical Models and Methods for Lifetime Data, 2nd ed., §2.4 (selection by survival).
 * @example
 * yearWeights({ yearFrom: 1950, yearTo: 1951, rule: 'judgement' }, { model: 'fixed', lifetimeYears: 60 },
 *   { surveyYear: 2000, horizonYears: 30, yearOffset: 0.5 }) // => [{ year: 1950, weight: 0.5 }, { year: 1951, weight: 0.5 }]
 */
export function yearWeights(
  constructionYear: ConstructionYear,
  lifetime: Lifetime,
  conventions: SurveyConventions,
): readonly YearWeight[] {
  const weights = weighted(constructionYear, lifetime, conventions)
  for (const { year } of weights) {
    if (!Number.isFinite(year)) throw new ComputeError('not-a-number', { constructionYear: year })
    if (year > conventions.surveyYear) {
      throw new ComputeError('negative-age', { constructionYear: year, surveyYear: conventions.surveyYear })
    }
  }
  return weights
}

function weighted(
  constructionYear: ConstructionYear,
  lifetime: Lifetime,
  conventions: SurveyConventions,
): readonly YearWeight[] {
  if (typeof constructionYear === 'number') return [{ year: constructionYear, weight: 1 }]
  if ('possibleYears' in constructionYear) return checked(constructionYear.possibleYears)
  const { yearFrom, yearTo, rule } = constructionYear
  if (yearFrom === null) throw new ComputeError('interval-open', { yearTo })
  if (!(yearFrom <= yearTo)) throw new ComputeError('interval-reversed', { yearFrom, yearTo })
  const count = Math.floor(yearTo - yearFrom) + 1
  if (rule === 'midpoint') {
    if (count > LONGEST_MIDPOINT_RANGE) throw new ComputeError('parameter-out-of-range', { yearFrom, yearTo, rule })
    return [{ year: (yearFrom + yearTo) / 2, weight: 1 }]
  }
  const years = Array.from({ length: count }, (_, step) => yearFrom + step)
  return rule === 'judgement'
    ? years.map((year) => ({ year, weight: 1 / count }))
    : bySurvival(years, lifetime, conventions)
}

function bySurvival(
  years: readonly number[],
  lifetime: Lifetime,
  { surveyYear, yearOffset }: SurveyConventions,
): YearWeight[] {
  const law = lifetimeLaw(lifetime)
  const logs = years.map((year) => {
    const age = surveyYear - year + yearOffset
    return age > 0 ? law.logSurvival(age) : 0
  })
  const largest = logs.reduce((a, b) => Math.max(a, b), -Infinity)
  // none of the years has a survivor: the building is overdue whichever it was
  const shares = logs.map((log) => (largest === -Infinity ? 1 : Math.exp(log - largest)))
  const total = shares.reduce((a, b) => a + b, 0)
  return years.map((year, index) => ({ year, weight: shares[index]! / total }))
}

function checked(possibleYears: readonly YearWeight[]): readonly YearWeight[] {
  if (possibleYears.length === 0) throw new ComputeError('empty-input', { what: 'construction years' })
  const total = possibleYears.reduce((sum, { weight }) => sum + weight, 0)
  const isProper = possibleYears.every(({ weight }) => weight >= 0) && Math.abs(total - 1) <= ROUNDING
  if (!isProper) throw new ComputeError('share-out-of-range', { total })
  return possibleYears
}
