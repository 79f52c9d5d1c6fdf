import { describe, expect, it } from 'vitest'
import { csvText } from '@/components/ui/csvText'
import type { StockCell } from '@/shared/schemas/run'
import { agePyramidRows } from './agePyramidRows'
import { groupCsvRows } from './stockCsv'
import { stockGroups } from './stockGroups'

const cells: StockCell[] = [
  {
    use: 'terraced',
    structure: 'masonry-timber-floors',
    period: 'before-1919',
    buildingCount: 3,
    floorAreaM2: 300,
    massKg: { 'masonry-units': 240_000.125, timber: 9_000 },
  },
  {
    use: 'office',
    structure: 'reinforced-concrete',
    period: '1961-1975',
    buildingCount: 1,
    floorAreaM2: 900,
    massKg: { concrete: 1_350_000 },
  },
  {
    use: 'terraced',
    structure: 'unknown',
    period: 'unknown',
    buildingCount: 2,
    floorAreaM2: 180,
    massKg: {},
  },
]

describe('stockGroups', () => {
  it('adds cells up along a dimension and puts the heaviest first', () => {
    expect(stockGroups(cells, 'use')).toEqual([
      { key: 'office', buildingCount: 1, floorAreaM2: 900, massKg: 1_350_000 },
      { key: 'terraced', buildingCount: 5, floorAreaM2: 480, massKg: 249_000.125 },
    ])
  })
})

describe('groupCsvRows', () => {
  it('writes all digits', () => {
    expect(csvText(groupCsvRows('use', stockGroups(cells, 'use')))).toContain('terraced,5,480,249000.125')
  })
})

describe('agePyramidRows', () => {
  it('sets masonry against the other structures and leaves the unknown period out', () => {
    const rows = agePyramidRows(cells)

    expect(rows[0]).toEqual({ period: 'before-1919', masonryM2: 300, otherM2: 0 })
    expect(rows.reduce((sum, { masonryM2, otherM2 }) => sum + masonryM2 + otherM2, 0)).toBe(1200)
  })
})
