import type { SurveyedBuilding } from '@/shared/compute/run/computeDistrict'
import type { Scenario } from '@/shared/schemas/run'
import { hazardMultiplierOf } from './hazardMultiplierOf'
import type { RunSheet } from './runInputs.types'

export interface SlicedBuildings {
  /** One a building, or one a slice where it has several uses or parts, in the order of the sheets. */
  readonly buildings: readonly SurveyedBuilding[]
  /** For each sheet, the place of its first slice and the place after its last. */
  readonly placesOf: readonly (readonly [from: number, to: number])[]
}

/** Sheets as the computation takes them: each slice with its own archetype, bound to the whole it stands and falls with. */
export function sliceBuildings(sheets: readonly RunSheet[], scenario: Scenario): SlicedBuildings {
  const buildings: SurveyedBuilding[] = []
  const placesOf = sheets.map((sheet) => {
    const from = buildings.length
    const hazardMultiplier = hazardMultiplierOf(sheet, scenario)
    if (!sheet.slices || sheet.slices.length === 0) buildings.push({ ...sheet, hazardMultiplier })
    else buildings.push(...slicesOf(sheet, sheet.slices, hazardMultiplier))
    return [from, buildings.length] as const
  })
  return { buildings, placesOf }
}

function slicesOf(
  { buildingId, floorAreaCv, grossFloorAreaM2: wholeFloorAreaM2 }: RunSheet,
  slices: NonNullable<RunSheet['slices']>,
  hazardMultiplier: number,
): SurveyedBuilding[] {
  return slices.map((slice, index) => ({
    ...slice,
    buildingId,
    floorAreaCv,
    hazardMultiplier,
    wholeFloorAreaM2,
    isFurtherSlice: index > 0,
  }))
}
