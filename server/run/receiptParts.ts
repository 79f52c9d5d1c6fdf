import { intensityFor } from '@/shared/compute/factors/intensityFor'
import type { IntensityFigure } from '@/shared/compute/factors/intensity.types'
import { PERIOD_IDS, UNKNOWN, type PeriodIdOrUnknown } from '@/shared/compute/factors/vocabulary'
import type { DistrictComputation } from '@/shared/compute/run/computeDistrict'
import type { ResolvedArchetype } from '@/shared/compute/run/resolveArchetype'
import type { BuildingCell, FactorUse } from '@/shared/compute/run/run.types'
import { sum } from '@/shared/compute/sum'
import type { ReceiptBuilding, ReceiptFigure, ReceiptGroup, ReceiptTerm } from '@/shared/schemas/receipt'
import type { RunInputs } from './runInputs.types'
import type { SlicedBuildings } from './sliceBuildings'

export interface ReceiptBasis {
  readonly inputs: RunInputs
  readonly sliced: SlicedBuildings
  readonly district: DistrictComputation
  readonly intensities: readonly IntensityFigure[]
}

/** Places of the first and the last year that count in the series of a run; of no meaning for the stock. */
export interface YearPlaces {
  readonly first: number
  readonly last: number
}

/** A figure with the places of its years. */
type PlacedFigure = ReceiptFigure & YearPlaces

export interface ReceiptParts {
  readonly massKg: number
  readonly groups: readonly ReceiptGroup[]
  readonly buildings: readonly ReceiptBuilding[]
}

/**
 * A figure down to its parts: for each building floor area × share counted, added up by group; times what the factor
 * book says a square metre holds. Groups add up to the figure, buildings and terms to their group.
 */
export function receiptParts(basis: ReceiptBasis, wanted: ReceiptFigure, places: YearPlaces): ReceiptParts {
  const figure = { ...wanted, ...places }
  const { district } = basis
  const counted = placesIn(basis, figure)
  const byArchetype = new Map<number, number[]>()
  for (const place of counted) {
    const { archetype } = district.cells[place]!
    const known = byArchetype.get(archetype)
    if (known) known.push(place)
    else byArchetype.set(archetype, [place])
  }
  const groups = [...byArchetype].map(([archetype, own]) =>
    groupOf(basis, figure, district.archetypes[archetype]!, own),
  )
  const isReadable = figure.buildingId !== null || groups.length === 1
  return {
    massKg: sum(groups.map(({ massKg }) => massKg)),
    groups: groups.sort((a, b) => b.massKg - a.massKg),
    buildings: isReadable
      ? counted.map((place) => buildingAt(basis, figure, place)).sort((a, b) => b.massKg - a.massKg)
      : [],
  }
}

/** Cells the figure counts. */
function placesIn(
  { inputs, sliced, district }: ReceiptBasis,
  { use, structure, period, buildingId }: ReceiptFigure,
): number[] {
  const [from, to] =
    buildingId === null
      ? [0, district.cells.length]
      : (sliced.placesOf[inputs.sheets.findIndex((sheet) => sheet.buildingId === buildingId)] ?? [0, 0])
  return Array.from({ length: to - from }, (_, step) => from + step).filter((place) => {
    const archetype = district.archetypes[district.cells[place]!.archetype]!
    return (
      (use === null || archetype.use === use) &&
      (structure === null || archetype.structure === structure) &&
      (period === null || archetype.period === period)
    )
  })
}

function groupOf(
  { district, intensities }: ReceiptBasis,
  figure: PlacedFigure,
  archetype: ResolvedArchetype,
  places: readonly number[],
): ReceiptGroup {
  const cells = places.map((place) => district.cells[place]!)
  const terms = wantedFactors(archetype, figure).map((factor): ReceiptTerm => {
    const countedAreaM2 = sum(cells.map((cell) => cell.floorAreaM2 * countedShare(district, figure, cell, factor)))
    const { material, component, meanKgPerM2: contentKgPerM2 } = factor
    const massKg = countedAreaM2 * contentKgPerM2
    return {
      material,
      component,
      countedAreaM2,
      contentKgPerM2,
      massKg,
      rowIds: rowIdsOf(archetype, factor, intensities),
    }
  })
  return {
    use: archetype.use,
    structure: archetype.structure,
    period: archetype.period,
    buildingCount: cells.reduce((count, { buildingCount }) => count + buildingCount, 0),
    floorAreaM2: sum(cells.map(({ floorAreaM2 }) => floorAreaM2)),
    massKg: sum(terms.map(({ massKg }) => massKg)),
    terms: terms.sort((a, b) => b.massKg - a.massKg),
    missing: archetype.missing.filter((material) => figure.material === 'all' || figure.material === material),
  }
}

/** Factors that count: a renewal needs a component of its own with a life. */
function wantedFactors({ factors, componentLives }: ResolvedArchetype, { kind, material }: ReceiptFigure): FactorUse[] {
  return factors.filter(
    (factor) =>
      (material === 'all' || factor.material === material) &&
      (kind !== 'refurbishment' || (factor.component !== 'whole' && componentLives[factor.component] !== undefined)),
  )
}

/** How often a square metre of a building counts: once in the stock, by its chance or its renewals in a flow. */
function countedShare(
  { chances }: DistrictComputation,
  { kind, first, last }: PlacedFigure,
  cell: BuildingCell,
  { component }: Pick<FactorUse, 'component'>,
): number {
  if (kind === 'stock') return 1
  const series =
    kind === 'demolition' || component === 'whole'
      ? chances.comingDown(cell).given
      : chances.renewals(cell, component).given
  return sum(series.subarray(first, last + 1))
}

function buildingAt({ inputs, sliced, district }: ReceiptBasis, figure: PlacedFigure, place: number): ReceiptBuilding {
  const cell = district.cells[place]!
  const archetype = district.archetypes[cell.archetype]!
  const { buildingId, floorAreaCv } = sliced.buildings[place]!
  const masses = wantedFactors(archetype, figure).map(
    (factor) => cell.floorAreaM2 * countedShare(district, figure, cell, factor) * factor.meanKgPerM2,
  )
  return {
    buildingId,
    label: inputs.sheets.find((sheet) => sheet.buildingId === buildingId)?.label ?? '',
    use: archetype.use,
    structure: archetype.structure,
    period: archetype.period,
    yearFrom: cell.yearFrom,
    yearTo: cell.yearTo,
    floorAreaM2: cell.floorAreaM2,
    floorAreaCv,
    hazardMultiplier: cell.hazardMultiplier,
    chance:
      figure.kind === 'stock'
        ? null
        : countedShare(district, { ...figure, kind: 'demolition' }, cell, { component: 'whole' }),
    massKg: sum(masses),
  }
}

function rowIdsOf(
  { use, structure, period }: ResolvedArchetype,
  { material, component }: FactorUse,
  intensities: readonly IntensityFigure[],
): string[] {
  const found = intensityFor({ use, structure, periodId: periodIdOf(period) }, material, intensities)
  if (found.kind !== 'known') return []
  return found.parts.filter((part) => part.component === component).flatMap(({ rowIds }) => rowIds)
}

function periodIdOf(period: string): PeriodIdOrUnknown {
  return PERIOD_IDS.find((id) => id === period) ?? UNKNOWN
}
