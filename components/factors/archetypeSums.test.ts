import { describe, expect, it } from 'vitest'
import type { IntensityRow } from '@/shared/schemas/factorBook'
import { archetypeSums } from './archetypeSums'

const row = (part: Partial<IntensityRow>): IntensityRow => ({
  rowId: '0191c0de-0000-7000-8000-000000000001',
  figureId: '0191c0de-0000-7000-8000-000000000002',
  structure: 'timber-frame',
  use: 'all',
  period: 'all',
  region: 'all',
  material: 'timber',
  component: 'whole',
  areaBasis: 'GFA',
  medianKgPerM2: null,
  meanKgPerM2: 300,
  p10KgPerM2: null,
  p90KgPerM2: null,
  gsdBetweenBuildings: null,
  sharedCv: 0.2,
  sampleCount: null,
  source: 'an invented survey',
  provenance: 'published',
  note: null,
  ...part,
})

describe('archetypeSums', () => {
  it('adds materials and parts up, and takes the general figure where a use has none of its own', () => {
    const rows = [
      row({ component: 'structure' }),
      row({ component: 'roof', meanKgPerM2: 100 }),
      row({ material: 'concrete', use: 'office', meanKgPerM2: 700 }),
    ]

    expect(archetypeSums(rows).map(({ key, totalKgPerM2, verdict }) => [key, totalKgPerM2, verdict])).toEqual([
      ['timber-frame/all', 1_100, 'above'],
      ['timber-frame/office', 1_100, 'above'],
    ])
  })

  it('warns below 288 kg/m² of timber buildings, the published P10, and not above it', () => {
    expect(archetypeSums([row({ meanKgPerM2: 287 })])[0]?.verdict).toBe('below')
    expect(archetypeSums([row({ meanKgPerM2: 289 })])[0]?.verdict).toBe('within')
  })
})
