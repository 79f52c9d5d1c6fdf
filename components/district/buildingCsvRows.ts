import { MATERIALS } from '@/shared/compute/factors/vocabulary'
import type { RunBuilding } from '@/shared/schemas/run'

/** Buildings of a run for a CSV file with all digits, head first; a missing factor is an empty cell. */
export function buildingCsvRows(buildings: readonly RunBuilding[]): (string | number | null)[][] {
  return [
    [
      'building',
      'use',
      'structure',
      'year_from',
      'year_to',
      'footprint_m2',
      'gross_floor_area_m2',
      'floor_area_cv',
      'mass_kg',
      'chance_ten_years',
      'chance_thirty_years',
      'expected_ten_years_kg',
      ...MATERIALS.map((material) => `${material}_kg`),
    ],
    ...buildings.map((building) => [
      building.label,
      building.use,
      building.structure,
      building.yearFrom,
      building.yearTo,
      building.footprintM2,
      building.grossFloorAreaM2,
      building.floorAreaCv,
      building.massKg,
      building.chanceTenYears,
      building.chanceThirtyYears,
      building.massKg * building.chanceTenYears,
      ...MATERIALS.map((material) => building.massByMaterialKg[material] ?? null),
    ]),
  ]
}
