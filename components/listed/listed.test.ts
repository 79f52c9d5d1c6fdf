import { describe, expect, it } from 'vitest'
import { comparisonVerdict } from './comparisonVerdict'
import { inventoryCsvRows } from './InventoryTable'

const row = (weighedKg: number | null, low = 80, high = 120) => ({
  code: '17 01 01',
  text: 'concrete',
  expectedKg: { low, likely: (low + high) / 2, high },
  weighedKg,
  tickets: 1,
})

describe('what was weighed beside what was expected', () => {
  it('lies inside its band, under it, over it, or was not expected at all', () => {
    expect([80, 120, 79, 121].map((weighed) => comparisonVerdict(row(weighed)))).toEqual([
      'inside',
      'inside',
      'below',
      'above',
    ])
    expect(comparisonVerdict(row(5, 0, 0))).toBe('unexpected')
    expect(comparisonVerdict(row(null))).toBeNull()
  })
})

describe('inventoryCsvRows', () => {
  it('writes all digits, the other codes and the suspicion', () => {
    const [, line] = inventoryCsvRows([
      {
        material: 'timber',
        component: 'roof',
        massKg: { low: 1.25, likely: 2.5, high: 5.125 },
        looseVolumeM3: 0.75,
        code: '17 02 01',
        alternatives: ['17 02 04*'],
        mustAsk: true,
      },
    ])

    expect(line).toEqual(['timber', 'roof', 1.25, 2.5, 5.125, 0.75, '17 02 01', '17 02 04*', 'have it sampled'])
  })
})
