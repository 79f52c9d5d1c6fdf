import type { RunResult } from '@/shared/schemas/run'
import type { StockDimension, StockGroup } from './stockGroups'

type CsvRow = readonly (string | number | null)[]

/** Stock by material with all digits, head first. */
export function materialCsvRows({ stock, basis }: RunResult): CsvRow[] {
  return [
    ['material', 'mean_kg', 'p10_kg', 'p50_kg', 'p90_kg', 'kg_per_m2_gfa', 'buildings_without_factor', 'from_memory'],
    ...stock.byMaterial.map(({ material, band, missingCount, isFromMemory }): CsvRow => [
      material,
      band.meanKg,
      band.p10Kg,
      band.p50Kg,
      band.p90Kg,
      basis.computedFloorAreaM2 > 0 ? band.meanKg / basis.computedFloorAreaM2 : null,
      missingCount,
      isFromMemory ? 'yes' : 'no',
    ]),
    ['total', stock.total.meanKg, stock.total.p10Kg, stock.total.p50Kg, stock.total.p90Kg, null, null, null],
  ]
}

/** Stock by use, structure or period with all digits, head first. */
export function groupCsvRows(dimension: StockDimension, groups: readonly StockGroup[]): CsvRow[] {
  return [
    [dimension, 'buildings', 'floor_area_m2', 'mean_kg'],
    ...groups.map(({ key, buildingCount, floorAreaM2, massKg }): CsvRow => [key, buildingCount, floorAreaM2, massKg]),
  ]
}
