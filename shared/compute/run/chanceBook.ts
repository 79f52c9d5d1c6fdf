import type { Component } from '@/shared/compute/factors/vocabulary'
import { ComputeError } from '@/shared/compute/errors'
import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'
import type { SurvivalTable } from '@/shared/compute/lifetime/survivalTable'
import { tabulateSurvival } from '@/shared/compute/lifetime/tabulateSurvival'
import { comingDownFromTable } from '@/shared/compute/stock/comingDownFromTable'
import { newComponentRenewals } from '@/shared/compute/stock/newComponentRenewals'
import type { YearWeight } from '@/shared/compute/stock/stock.types'
import type { Archetype, BuildingCell, LifetimeUse, YearsAheadConventions } from './run.types'

/** A yearly series under the life as given, and with its mean one standard error shorter and longer. */
export interface ThreeWays {
  readonly given: Float64Array
  readonly shorter: Float64Array
  readonly longer: Float64Array
}

export interface CellChances extends ThreeWays {
  readonly givenSoFar: Float64Array
  readonly shorterSoFar: Float64Array
  readonly longerSoFar: Float64Array
  readonly overdueShare: number
}

export interface ChanceBook {
  /** Chances to come down in each year and so far. */
  comingDown(cell: BuildingCell): CellChances
  /** Expected renewals a year of a component in a building that still stands. */
  renewals(cell: BuildingCell, component: Component): ThreeWays
}

/**
 * Computes the chances of a cell once for each life, range of years and multiplier, and remembers them.
 *
 * @throws {ComputeError} `interval-reversed`, `negative-age` for a construction year after the survey
 * @see Kalbfleisch, J. D. & Prentice, R. L. (2002). The Statistical Analysis of Failure Time Data, 2nd ed., §1.2 and §4.1.
 * @example
 * makeChanceBook([], [], { surveyYear: 2026, horizonYears: 10, yearOffset: 0.5, unknownYears: () => [] }).comingDown !== undefined // => true
 */
export function makeChanceBook(
  cells: readonly BuildingCell[],
  archetypes: readonly Archetype[],
  conventions: YearsAheadConventions,
): ChanceBook {
  const { surveyYear, horizonYears, yearOffset } = conventions
  const length = oldestAge(cells, archetypes, conventions) + horizonYears + 2
  const tables = new Map<Lifetime, SurvivalTable>()
  const tableOf = (lifetime: Lifetime) =>
    remember(tables, lifetime, () => tabulateSurvival(lifetime, yearOffset, length))
  const densities = new Map<Lifetime, Float64Array>()
  const densityOf = (lifetime: Lifetime) =>
    remember(densities, lifetime, () => newComponentRenewals(lifetime, length).all)
  const chancesByKey = new Map<string, CellChances>()
  const renewalsByKey = new Map<string, ThreeWays>()

  const comingDown = (cell: BuildingCell): CellChances => {
    const { life } = archetypes[cell.archetype]!
    return remember(chancesByKey, keyOf(cell, life.lifetimeId), () => {
      const years = possibleYears(cell, conventions)
      const one = (lifetime: Lifetime) => chancesOver(years, tableOf(lifetime), cell, conventions)
      const [given, shorter, longer] = [one(life.lifetime), one(life.shorter), one(life.longer)]
      return {
        given: given.comingDown,
        shorter: shorter.comingDown,
        longer: longer.comingDown,
        givenSoFar: runningSum(given.comingDown),
        shorterSoFar: runningSum(shorter.comingDown),
        longerSoFar: runningSum(longer.comingDown),
        overdueShare: given.overdueShare,
      }
    })
  }
  const renewals = (cell: BuildingCell, component: Component): ThreeWays => {
    const archetype = archetypes[cell.archetype]!
    const life = archetype.componentLives[component]
    if (!life) throw new ComputeError('factor-missing', { component, what: 'lifetime' })
    return remember(renewalsByKey, keyOf(cell, `${archetype.life.lifetimeId}|${component}|${life.lifetimeId}`), () => {
      const years = possibleYears(cell, conventions)
      const standing = comingDown(cell).givenSoFar
      const one = (lifetime: Lifetime) => renewalsAhead(densityOf(lifetime), standing, years, surveyYear)
      return threeWays(life, one)
    })
  }
  return { comingDown, renewals }
}

/** Chances averaged over the possible construction years. */
function chancesOver(
  years: readonly YearWeight[],
  table: SurvivalTable,
  { hazardMultiplier }: BuildingCell,
  { surveyYear, horizonYears }: YearsAheadConventions,
): { comingDown: Float64Array; overdueShare: number } {
  const comingDown = new Float64Array(horizonYears)
  let overdueShare = 0
  for (const { year, weight } of years) {
    const one = comingDownFromTable(table, surveyYear - year, horizonYears, { hazardMultiplier })
    for (let k = 0; k < horizonYears; k++) comingDown[k]! += weight * one.chances[k]!
    overdueShare += weight * one.overdueShare
  }
  return { comingDown, overdueShare }
}

function threeWays(life: LifetimeUse, one: (lifetime: Lifetime) => Float64Array): ThreeWays {
  return { given: one(life.lifetime), shorter: one(life.shorter), longer: one(life.longer) }
}

/** Renewal density n = Y − c + k years after construction, times the share of buildings that outlive year k. */
function renewalsAhead(
  density: Float64Array,
  downSoFar: Float64Array,
  years: readonly YearWeight[],
  surveyYear: number,
): Float64Array {
  return downSoFar.map((down, k) => {
    let rate = 0
    for (const { year, weight } of years) rate += weight * density[surveyYear - year + k]!
    return (1 - down) * rate
  })
}

/** Equal weights on the years a surveyor held possible: the judgement is about the building that stands. */
function possibleYears(cell: BuildingCell, conventions: YearsAheadConventions): readonly YearWeight[] {
  const { yearFrom, yearTo } = cell
  if (yearFrom === null || yearTo === null) return conventions.unknownYears(cell.archetype)
  if (yearFrom > yearTo) throw new ComputeError('interval-reversed', { yearFrom, yearTo })
  const count = yearTo - yearFrom + 1
  return Array.from({ length: count }, (_, step) => ({ year: yearFrom + step, weight: 1 / count }))
}

function oldestAge(
  cells: readonly BuildingCell[],
  archetypes: readonly Archetype[],
  conventions: YearsAheadConventions,
): number {
  let oldestYear = conventions.surveyYear
  for (const { yearFrom } of cells) if (yearFrom !== null && yearFrom < oldestYear) oldestYear = yearFrom
  archetypes.forEach((_, index) => {
    for (const { year } of conventions.unknownYears(index)) if (year < oldestYear) oldestYear = year
  })
  return conventions.surveyYear - oldestYear
}

function keyOf(cell: BuildingCell, life: string): string {
  const years =
    cell.yearFrom === null || cell.yearTo === null ? `?${cell.archetype}` : `${cell.yearFrom}-${cell.yearTo}`
  return `${life}|${years}|${cell.hazardMultiplier}`
}

function runningSum(list: Float64Array): Float64Array {
  let soFar = 0
  // rounding may carry a sum of chances a hair above one
  return list.map((value) => (soFar = Math.min(1, soFar + value)))
}

function remember<Key, Value>(kept: Map<Key, Value>, key: Key, make: () => Value): Value {
  const known = kept.get(key)
  if (known !== undefined) return known
  const made = make()
  kept.set(key, made)
  return made
}
