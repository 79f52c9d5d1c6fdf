import { PERIOD_IDS } from '@/shared/compute/factors/vocabulary'
import type { StockCell } from '@/shared/schemas/run'

/** Floor area of a period in masonry and in all other structures [m²]. */
export interface PeriodArea {
  readonly period: (typeof PERIOD_IDS)[number]
  readonly masonryM2: number
  readonly otherM2: number
}

/** Floor area by period of construction, oldest first; every period is there, an empty one as nought. */
export function agePyramidRows(cells: readonly StockCell[]): PeriodArea[] {
  return PERIOD_IDS.map((period) => {
    const ofPeriod = cells.filter((cell) => cell.period === period)
    const areaM2 = (isMasonry: boolean): number =>
      ofPeriod
        .filter(({ structure }) => structure.startsWith('masonry') === isMasonry)
        .reduce((sum, { floorAreaM2 }) => sum + floorAreaM2, 0)
    return { period, masonryM2: areaM2(true), otherM2: areaM2(false) }
  })
}
