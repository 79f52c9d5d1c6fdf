import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'
import { tabulateSurvival } from '@/shared/compute/lifetime/tabulateSurvival'
import type { SurvivalTable } from '@/shared/compute/lifetime/survivalTable'
import { comingDownChances } from './comingDownChances'
import { comingDownFromTable } from './comingDownFromTable'
import type { ComingDown, StandingGroup, SurveyConventions, YearWeight } from './stock.types'
import { withPermit } from './withPermit'
import { yearWeights } from './yearWeights'

/**
 * Chances of many groups of standing buildings. Each lifetime is tabulated once, each pair of construction year and
 * multiplier is computed once, so the cost hardly grows with the number of buildings.
 *
 * @param groups groups that share a lifetime share the object, too
 * @returns chances by group, same order
 * @throws {ComputeError} those of `yearWeights`, `comingDownFromTable`, `withPermit`
 * @see Kalbfleisch, J. D. & Prentice, R. L. (2002). The Statistical Analysis of Failure Time Data, 2nd ed., §1.2.
 * @example
 * standingChancesOfGroups(
 *   [{ lifetime: { model: 'fixed', lifetimeYears: 60 }, constructionYear: 1967, amount: 100, buildingCount: 1 }],
 *   { surveyYear: 2025, horizonYears: 3, yearOffset: 0 },
 * )[0].chances // => [0, 1, 0]
 */
export function standingChancesOfGroups(
  groups: readonly StandingGroup[],
  conventions: SurveyConventions,
): readonly ComingDown[] {
  const ofYear = makeYearBook(conventions)
  const ofRange = new Map<string, ComingDown>()
  const lifetimeIds = new Map<Lifetime, number>()
  return groups.map(({ lifetime, constructionYear, hazardMultiplier = 1, permit }) => {
    const lifetimeId = lifetimeIds.get(lifetime) ?? lifetimeIds.size
    lifetimeIds.set(lifetime, lifetimeId)
    const key = `${lifetimeId}|${hazardMultiplier}|${JSON.stringify(constructionYear)}`
    let ordinary = ofRange.get(key)
    if (!ordinary) {
      const weights = yearWeights(constructionYear, lifetime, conventions)
      ordinary = mixed(weights, conventions.horizonYears, (year) => ofYear(lifetime, year, hazardMultiplier))
      ofRange.set(key, ordinary)
    }
    return permit ? withPermit(ordinary, permit) : ordinary
  })
}

type YearBook = (lifetime: Lifetime, year: number, hazardMultiplier: number) => ComingDown

function makeYearBook({ surveyYear, horizonYears, yearOffset }: SurveyConventions): YearBook {
  const books = new Map<Lifetime, { table: SurvivalTable; known: Map<string, ComingDown> }>()
  const bookFor = (lifetime: Lifetime, age: number) => {
    let book = books.get(lifetime)
    if (!book || book.table.survival.length <= age + horizonYears) {
      // twice as far as asked for, so that ever older buildings do not tabulate ever again
      const length = 2 * (age + horizonYears + 1)
      book = { table: tabulateSurvival(lifetime, yearOffset, length), known: book?.known ?? new Map() }
      books.set(lifetime, book)
    }
    return book
  }
  return (lifetime, year, hazardMultiplier) => {
    const age = surveyYear - year
    if (!Number.isInteger(age)) {
      return comingDownChances(lifetime, age + yearOffset, horizonYears, { hazardMultiplier })
    }
    const { table, known } = bookFor(lifetime, age)
    const key = `${year}|${hazardMultiplier}`
    let chances = known.get(key)
    if (!chances) {
      chances = comingDownFromTable(table, age, horizonYears, { hazardMultiplier })
      known.set(key, chances)
    }
    return chances
  }
}

function mixed(weights: readonly YearWeight[], years: number, ofYear: (year: number) => ComingDown): ComingDown {
  const [only] = weights
  if (only && weights.length === 1) return ofYear(only.year)
  const chances = new Float64Array(years)
  let [remaining, overdueShare] = [0, 0]
  for (const { year, weight } of weights) {
    if (weight === 0) continue
    const one = ofYear(year)
    for (let k = 0; k < years; k++) chances[k]! += weight * one.chances[k]!
    remaining += weight * one.remaining
    overdueShare += weight * one.overdueShare
  }
  return { chances, remaining, overdueShare }
}
