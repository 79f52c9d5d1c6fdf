import { periodOfYear } from '@/shared/compute/factors/periodOfYear'
import type { IntensityFigure } from '@/shared/compute/factors/intensity.types'
import { makeChanceBook, type ChanceBook } from '@/shared/compute/run/chanceBook'
import { resolveArchetype, type LifetimeFigure, type ResolvedArchetype } from '@/shared/compute/run/resolveArchetype'
import type { BuildingCell } from '@/shared/compute/run/run.types'
import { spreadByFactor } from '@/shared/compute/run/spreadByFactor'
import type { KindFigure, LookFigure, PossibleKind } from './nextLook.types'

export interface KindConventions {
  readonly surveyYear: number
  readonly yearOffset: number
}

export interface KindBook {
  readonly intensities: readonly IntensityFigure[]
  readonly lifetimes: readonly LifetimeFigure[]
}

/**
 * Gives each possible kind what a square metre of it contributes to the figure, from one edition of the factor book and
 * the chances of standing buildings; looked up once a kind.
 *
 * @param oldestYear earliest construction year that will be asked for
 * @returns (kind, hazardMultiplier) → its figures
 * @throws {ComputeError} of the returned function: `factor-missing` without a lifetime, `negative-age` for a year after the survey
 * @see `resolveArchetype`, `makeChanceBook`.
 * @example
 * kindFigures({ material: 'all', byYear: null }, { intensities: [], lifetimes: [{ rowId: 'l', use: 'all', structure: 'all', component: 'building', model: 'exponential', meanYears: 50, sdYears: 50, sharedCv: 0 }] }, { surveyYear: 2026, yearOffset: 0.5 }, 1900)({ weight: 1, use: 'office', structure: 'hybrid', constructionYear: 1980 }, 1).contentKgPerM2 // => 0
 */
export function kindFigures(
  figure: LookFigure,
  { intensities, lifetimes }: KindBook,
  { surveyYear, yearOffset }: KindConventions,
  oldestYear: number,
): (kind: PossibleKind, hazardMultiplier: number) => KindFigure {
  const archetypes: ResolvedArchetype[] = []
  const indexOf = new Map<string, number>()
  const kept = new Map<string, KindFigure>()
  const horizonYears = figure.byYear === null ? 0 : Math.max(1, figure.byYear - surveyYear)
  const conventions = { surveyYear, yearOffset, horizonYears, unknownYears: () => [] }
  const book = horizonYears === 0 ? null : makeChanceBook([cellOf(0, oldestYear, 1)], archetypes, conventions)

  return (kind, hazardMultiplier) => {
    const { use, structure, constructionYear } = kind
    const periodId = periodOfYear(constructionYear)
    const archetypeKey = `${use}|${structure}|${periodId}`
    const key = `${archetypeKey}|${book ? `${constructionYear}|${hazardMultiplier}` : ''}`
    const known = kept.get(key)
    if (known) return known
    let index = indexOf.get(archetypeKey)
    if (index === undefined) {
      index = archetypes.push(resolveArchetype({ use, structure, periodId }, intensities, lifetimes)) - 1
      indexOf.set(archetypeKey, index)
    }
    const made = {
      ...contentOf(archetypes[index]!, figure),
      ...chancesOf(book, cellOf(index, constructionYear, hazardMultiplier), archetypes[index]!),
    }
    kept.set(key, made)
    return made
  }
}

function contentOf({ factors }: ResolvedArchetype, { material }: LookFigure) {
  const spreads = spreadByFactor(factors.filter((factor) => material === 'all' || factor.material === material))
  let [contentKgPerM2, betweenVariance] = [0, 0]
  for (const { meanKgPerM2, betweenSdKgPerM2 } of spreads) {
    contentKgPerM2 += meanKgPerM2
    betweenVariance += betweenSdKgPerM2 ** 2
  }
  return {
    contentKgPerM2,
    betweenVariance,
    factors: spreads.map(({ factorId, sdKgPerM2 }) => ({ factorId, sdKgPerM2 })),
  }
}

function chancesOf(book: ChanceBook | null, cell: BuildingCell, { life }: ResolvedArchetype) {
  if (!book) return { chance: 1, chanceIfShorter: 1, chanceIfLonger: 1, lifetimeId: null }
  const { givenSoFar, shorterSoFar, longerSoFar } = book.comingDown(cell)
  return {
    chance: givenSoFar.at(-1)!,
    chanceIfShorter: shorterSoFar.at(-1)!,
    chanceIfLonger: longerSoFar.at(-1)!,
    lifetimeId: life.lifetimeId,
  }
}

function cellOf(archetype: number, year: number, hazardMultiplier: number): BuildingCell {
  const area = { floorAreaM2: 1, floorAreaSquaredM4: 1, floorAreaVarianceM4: 0 }
  return { archetype, yearFrom: year, yearTo: year, hazardMultiplier, buildingCount: 1, ...area }
}
