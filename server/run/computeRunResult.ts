import type { Material } from '@/shared/compute/factors/vocabulary'
import { computeDistrict, massOfBuilding, type DistrictComputation } from '@/shared/compute/run/computeDistrict'
import type { EditionRows } from '@/shared/schemas/factorBook'
import type { RunBuilding, RunResult } from '@/shared/schemas/run'
import { lifetimesOf } from './lifetimesOf'
import { presentBasis } from './presentBasis'
import { presentStock } from './presentStock'
import { presentYearsAhead } from './presentYearsAhead'
import type { RunInputs } from './runInputs.types'
import { sliceBuildings, type SlicedBuildings } from './sliceBuildings'

export interface ComputedRun {
  readonly result: RunResult
  readonly buildings: readonly RunBuilding[]
}

/** From frozen inputs and one edition to the result: pure, so equal inputs give equal bytes. */
export function computeRunResult(
  inputs: RunInputs,
  edition: Pick<EditionRows, 'intensities' | 'lifetimes'>,
): ComputedRun {
  const { scenario, surveyYear, sheets } = inputs
  const sliced = sliceBuildings(sheets, scenario)
  const district = computeDistrict(sliced.buildings, edition.intensities, lifetimesOf(edition.lifetimes, scenario), {
    surveyYear,
    horizonYears: scenario.horizonYears,
    yearOffset: scenario.yearOffset,
  })
  return {
    result: {
      basis: presentBasis(inputs, district),
      stock: presentStock(district, edition.intensities),
      yearsAhead: presentYearsAhead(inputs, district),
    },
    buildings: presentBuildings(inputs, sliced, district),
  }
}

function presentBuildings(
  { sheets, scenario }: RunInputs,
  { placesOf }: SlicedBuildings,
  { cells, archetypes, chances }: DistrictComputation,
): RunBuilding[] {
  const last = scenario.horizonYears - 1
  return sheets.map((sheet, index): RunBuilding => {
    const slices = cells.slice(...placesOf[index]!)
    const masses = addUp(slices.map((cell) => massOfBuilding(cell, archetypes[cell.archetype]!)))
    // the main part decides when a building comes down
    const soFar = chances.comingDown(slices[0]!).givenSoFar
    return {
      buildingId: sheet.buildingId,
      outlineId: sheet.outlineId,
      blockId: sheet.blockId,
      label: sheet.label,
      use: sheet.use,
      structure: sheet.structure,
      yearFrom: sheet.yearFrom,
      yearTo: sheet.yearTo,
      footprintM2: sheet.footprintM2,
      grossFloorAreaM2: sheet.grossFloorAreaM2,
      floorAreaCv: sheet.floorAreaCv,
      massKg: [...masses.values()].reduce((total, mass) => total + mass, 0),
      massByMaterialKg: Object.fromEntries(masses),
      chanceTenYears: soFar[Math.min(9, last)]!,
      chanceThirtyYears: soFar[Math.min(29, last)]!,
    }
  })
}

function addUp(parts: readonly ReadonlyMap<Material, number>[]): ReadonlyMap<Material, number> {
  const [first = new Map<Material, number>(), ...further] = parts
  if (further.length === 0) return first
  const sum = new Map(first)
  for (const part of further)
    for (const [material, massKg] of part) sum.set(material, (sum.get(material) ?? 0) + massKg)
  return sum
}
