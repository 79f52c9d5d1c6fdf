import type { StockCell } from '@/shared/schemas/run'

/** What a stock is grouped by. */
export type StockDimension = 'use' | 'structure' | 'period'

/** The part of a stock in one use, structure or period. */
export interface StockGroup {
  readonly key: string
  readonly buildingCount: number
  readonly floorAreaM2: number
  /** Mass of all materials that have a factor [kg]. */
  readonly massKg: number
}

/** Mass of a cell over its materials [kg]; a missing factor adds nothing, and is counted elsewhere. */
export function cellMassKg(cell: StockCell): number {
  return Object.values(cell.massKg).reduce((sum, massKg) => sum + massKg, 0)
}

/** Cells of a stock added up along one dimension, heaviest first. */
export function stockGroups(cells: readonly StockCell[], dimension: StockDimension): StockGroup[] {
  const groups = new Map<string, StockGroup>()
  for (const cell of cells) {
    const key = cell[dimension]
    const known = groups.get(key)
    groups.set(key, {
      key,
      buildingCount: (known?.buildingCount ?? 0) + cell.buildingCount,
      floorAreaM2: (known?.floorAreaM2 ?? 0) + cell.floorAreaM2,
      massKg: (known?.massKg ?? 0) + cellMassKg(cell),
    })
  }
  return [...groups.values()].sort((one, other) => other.massKg - one.massKg)
}
