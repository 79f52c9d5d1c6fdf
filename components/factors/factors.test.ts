import { describe, expect, it } from 'vitest'
import type { IntensityRow } from '@/shared/schemas/factorBook'
import { factorCsvRows } from './factorCsvRows'
import { filteredIntensities } from './filteredIntensities'

const row = (part: Partial<IntensityRow>): IntensityRow => ({
  rowId: '0191c0de-0000-7000-8000-000000000001',
  figureId: '0191c0de-0000-7000-8000-000000000002',
  structure: 'all',
  use: 'all',
  period: 'all',
  region: 'all',
  material: 'concrete',
  component: 'whole',
  areaBasis: 'GFA',
  medianKgPerM2: 1_234.5678,
  meanKgPerM2: null,
  p10KgPerM2: null,
  p90KgPerM2: null,
  gsdBetweenBuildings: null,
  sharedCv: 0.2,
  sampleCount: null,
  source: 'a survey',
  provenance: 'published',
  note: null,
  ...part,
})
const rows = [
  row({ structure: 'masonry-timber-floors', material: 'timber' }),
  row({ structure: 'reinforced-concrete', use: 'office' }),
  row({ material: 'glass' }),
]

describe('filteredIntensities', () => {
  it('keeps the rows of a structure and those that hold for all', () => {
    const found = filteredIntensities(rows, { structure: 'reinforced-concrete', use: 'all', material: 'all' })

    expect(found.map(({ material }) => material)).toEqual(['concrete', 'glass'])
  })

  it('leaves out the rows of another use and another material', () => {
    expect(filteredIntensities(rows, { structure: 'all', use: 'hotel', material: 'concrete' })).toEqual([])
  })
})

describe('factorCsvRows', () => {
  it('writes all digits, and a missing factor as an empty cell', () => {
    const [head, first] = factorCsvRows(rows)

    expect(head?.slice(0, 3)).toEqual(['rowId', 'figureId', 'structure'])
    expect(first?.slice(9, 11)).toEqual([1_234.5678, null])
  })
})
