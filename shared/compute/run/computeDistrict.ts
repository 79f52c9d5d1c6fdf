import { periodOfYear } from '@/shared/compute/factors/periodOfYear'
import type { IntensityFigure } from '@/shared/compute/factors/intensity.types'
import {
  UNKNOWN,
  type Material,
  type PeriodIdOrUnknown,
  type StructureOrUnknown,
  type UseOrUnknown,
} from '@/shared/compute/factors/vocabulary'
import { ComputeError } from '@/shared/compute/errors'
import type { YearWeight } from '@/shared/compute/stock/stock.types'
import { resolveArchetype, type LifetimeFigure, type ResolvedArchetype } from './resolveArchetype'
import type { BuildingCell, YearsAheadConventions } from './run.types'
import { makeChanceBook, type ChanceBook } from './chanceBook'
import { stockOfCells, type StockEstimate } from './stockOfCells'
import { yearsAheadOfCells, type YearsAhead } from './yearsAheadOfCells'

/** A recorded building as a run takes it. */
export interface SurveyedBuilding {
  readonly buildingId: string
  readonly use: UseOrUnknown
  readonly structure: StructureOrUnknown
  readonly yearFrom: number | null
  readonly yearTo: number | null
  readonly grossFloorAreaM2: number
  readonly floorAreaCv: number
  readonly hazardMultiplier: number
  /**
   * For a slice of a building with another use, structure or age: the floor area of the whole building [m²]. Slices stand
   * and fall together, so their squares count as A·A(whole), which add up to the square of the whole.
   */
  readonly wholeFloorAreaM2?: number
  /** A slice that is not the main one is no further building. */
  readonly isFurtherSlice?: boolean
}

export interface DistrictConventions {
  readonly surveyYear: number
  readonly horizonYears: number
  readonly yearOffset: number
}

export interface DistrictComputation {
  readonly archetypes: readonly ResolvedArchetype[]
  /** One cell a building, or a slice of one, in their order: receipts end here. */
  readonly cells: readonly BuildingCell[]
  readonly stock: StockEstimate
  readonly yearsAhead: YearsAhead
  /** Chances of single cells, for maps and receipts. */
  readonly chances: ChanceBook
}

/** Years taken for a building of unknown age where no neighbour's is known: open, so it is wide. */
const NOTHING_KNOWN_SPAN_YEARS = 120

/**
 * Stock and years ahead of a district's recorded buildings with one edition of the factor book.
 *
 * A building of unknown age gets the ages of the buildings of its use and structure in the district, else of its
 * use, else of all: the district's own distribution stands for what is not known.
 *
 * @example
 * computeDistrict([{ buildingId: 'a', use: 'office', structure: 'steel-frame', yearFrom: 1976, yearTo: 1976, grossFloorAreaM2: 10, floorAreaCv: 0, hazardMultiplier: 1 }], [], [{ rowId: 'l', use: 'all', structure: 'all', component: 'building', model: 'exponential', meanYears: 50, sdYears: 50, sharedCv: 0 }], { surveyYear: 2026, horizonYears: 1, yearOffset: 0.5 }).yearsAhead.expectedFloorAreaM2[0] // => 0.198013266932447
 *
 * @throws {ComputeError} `empty-input` without buildings, `negative-area`, `factor-missing`, `negative-age`
 */
export function computeDistrict(
  buildings: readonly SurveyedBuilding[],
  figures: readonly IntensityFigure[],
  lifetimes: readonly LifetimeFigure[],
  conventions: DistrictConventions,
): DistrictComputation {
  if (buildings.length === 0) throw new ComputeError('empty-input', { what: 'buildings' })
  const indexByKey = new Map<string, number>()
  const archetypes: ResolvedArchetype[] = []
  const cells = buildings.map((building): BuildingCell => {
    const periodId = periodOf(building)
    const key = `${building.use}|${building.structure}|${periodId}`
    let archetype = indexByKey.get(key)
    if (archetype === undefined) {
      archetype =
        archetypes.push(
          resolveArchetype({ use: building.use, structure: building.structure, periodId }, figures, lifetimes),
        ) - 1
      indexByKey.set(key, archetype)
    }
    return toCell(building, archetype)
  })
  const yearConventions: YearsAheadConventions = {
    ...conventions,
    unknownYears: makeUnknownYears(buildings, archetypes, conventions.surveyYear),
  }
  return {
    archetypes,
    cells,
    stock: stockOfCells(cells, archetypes),
    yearsAhead: yearsAheadOfCells(cells, archetypes, yearConventions),
    chances: makeChanceBook(cells, archetypes, yearConventions),
  }
}

/**
 * Mean mass of one building by material [kg].
 *
 * @example
 * massOfBuilding({ archetype: 0, yearFrom: 1900, yearTo: 1900, hazardMultiplier: 1, buildingCount: 1, floorAreaM2: 100, floorAreaSquaredM4: 10000, floorAreaVarianceM4: 0 }, { factors: [{ material: 'glass', component: 'openings', factorId: 'g', meanKgPerM2: 3, sharedCv: 0, betweenBuildingsCv: 0 }] }).get('glass') // => 300
 */
export function massOfBuilding(cell: BuildingCell, archetype: ResolvedArchetype): Map<Material, number> {
  const masses = new Map<Material, number>()
  for (const { material, meanKgPerM2 } of archetype.factors) {
    masses.set(material, (masses.get(material) ?? 0) + cell.floorAreaM2 * meanKgPerM2)
  }
  return masses
}

/** Period of a building; a range over a break of building practice is of no one period. */
function periodOf({ yearFrom, yearTo }: SurveyedBuilding): PeriodIdOrUnknown {
  if (yearFrom === null || yearTo === null) return UNKNOWN
  const [first, last] = [periodOfYear(yearFrom), periodOfYear(yearTo)]
  return first === last ? first : UNKNOWN
}

function toCell(building: SurveyedBuilding, archetype: number): BuildingCell {
  const { grossFloorAreaM2, floorAreaCv, wholeFloorAreaM2 = grossFloorAreaM2 } = building
  if (!(grossFloorAreaM2 > 0) || !(floorAreaCv >= 0))
    throw new ComputeError('negative-area', { buildingId: building.buildingId, grossFloorAreaM2, floorAreaCv })
  return {
    archetype,
    yearFrom: building.yearFrom,
    yearTo: building.yearTo,
    hazardMultiplier: building.hazardMultiplier,
    buildingCount: building.isFurtherSlice ? 0 : 1,
    floorAreaM2: grossFloorAreaM2,
    floorAreaSquaredM4: grossFloorAreaM2 * wholeFloorAreaM2,
    floorAreaVarianceM4: grossFloorAreaM2 * floorAreaCv * (wholeFloorAreaM2 * floorAreaCv),
  }
}

function makeUnknownYears(
  buildings: readonly SurveyedBuilding[],
  archetypes: readonly ResolvedArchetype[],
  surveyYear: number,
): (archetype: number) => readonly YearWeight[] {
  const dated = buildings.filter(({ yearFrom, yearTo }) => yearFrom !== null && yearTo !== null)
  const kept = new Map<number, readonly YearWeight[]>()
  return (index) => {
    const known = kept.get(index)
    if (known) return known
    const { use, structure } = archetypes[index]!
    const likeness = [
      dated.filter((building) => building.use === use && building.structure === structure),
      dated.filter((building) => building.use === use),
      dated,
    ]
    const weights = weightsOf(likeness.find((group) => group.length > 0) ?? [], surveyYear)
    kept.set(index, weights)
    return weights
  }
}

function weightsOf(dated: readonly SurveyedBuilding[], surveyYear: number): readonly YearWeight[] {
  if (dated.length === 0) {
    return Array.from({ length: NOTHING_KNOWN_SPAN_YEARS }, (_, step) => ({
      year: surveyYear - step,
      weight: 1 / NOTHING_KNOWN_SPAN_YEARS,
    }))
  }
  const weightByYear = new Map<number, number>()
  for (const { yearFrom, yearTo } of dated) {
    const count = yearTo! - yearFrom! + 1
    for (let year = yearFrom!; year <= yearTo!; year++)
      weightByYear.set(year, (weightByYear.get(year) ?? 0) + 1 / count / dated.length)
  }
  return [...weightByYear].sort(([a], [b]) => a - b).map(([year, weight]) => ({ year, weight }))
}
