import { MATERIALS, type Material } from '@/shared/compute/factors/vocabulary'
import type { RunResult } from '@/shared/schemas/run'

/** Which flow is shown. */
export type FlowKind = 'demolition' | 'refurbishment' | 'both'

/** What comes out in one year. */
export interface FlowRow {
  readonly year: number
  readonly totalKg: number
  /** P10 and P90 of the total; null where two flows are added, for bands cannot be. */
  readonly lowKg: number | null
  readonly highKg: number | null
  readonly massKg: Readonly<Partial<Record<Material, number>>>
  readonly expectedBuildings: number
  readonly expectedFloorAreaM2: number
}

type YearsAhead = RunResult['yearsAhead']

/** Flows of the first years of a run, one row a year. */
export function flowRows(yearsAhead: YearsAhead, kind: FlowKind, yearCount: number): FlowRow[] {
  const kinds = kind === 'both' ? (['demolition', 'refurbishment'] as const) : [kind]
  const flows = kinds.map((one) => yearsAhead[one])
  const band = flows.length === 1 ? flows[0]?.total : undefined
  return yearsAhead.years.slice(0, yearCount).map((year, place) => ({
    year,
    totalKg: flows.reduce((sum, { total }) => sum + (total.meanKg[place] ?? 0), 0),
    lowKg: band?.p10Kg[place] ?? null,
    highKg: band?.p90Kg[place] ?? null,
    massKg: massOfYear(flows, place),
    expectedBuildings: yearsAhead.expectedBuildings[place] ?? 0,
    expectedFloorAreaM2: yearsAhead.expectedFloorAreaM2[place] ?? 0,
  }))
}

function massOfYear(flows: readonly YearsAhead['demolition'][], place: number): Partial<Record<Material, number>> {
  const massKg: Partial<Record<Material, number>> = {}
  for (const { byMaterial } of flows) {
    for (const material of MATERIALS) {
      const found = byMaterial[material]?.meanKg[place]
      if (found !== undefined) massKg[material] = (massKg[material] ?? 0) + found
    }
  }
  return massKg
}

/** Materials that flow in these rows, heaviest over all years first. */
export function flowMaterials(rows: readonly FlowRow[]): Material[] {
  const sumKg = (material: Material): number => rows.reduce((sum, { massKg }) => sum + (massKg[material] ?? 0), 0)
  return MATERIALS.map((material) => ({ material, massKg: sumKg(material) }))
    .filter(({ massKg }) => massKg > 0)
    .sort((one, other) => other.massKg - one.massKg)
    .map(({ material }) => material)
}

/** Rows for a CSV file with all digits, head first. */
export function flowCsvRows(rows: readonly FlowRow[]): (string | number | null)[][] {
  const materials = flowMaterials(rows)
  return [
    [
      'year',
      'total_mean_kg',
      'total_p10_kg',
      'total_p90_kg',
      ...materials.map((material) => `${material}_mean_kg`),
      'expected_buildings',
      'expected_floor_area_m2',
    ],
    ...rows.map((row) => [
      row.year,
      row.totalKg,
      row.lowKg,
      row.highKg,
      ...materials.map((material) => row.massKg[material] ?? null),
      row.expectedBuildings,
      row.expectedFloorAreaM2,
    ]),
  ]
}
