import { describe, expect, it } from 'vitest'
import type { RunResult } from '@/shared/schemas/run'
import { flowCsvRows, flowMaterials, flowRows } from './flowRows'

const series = (...meanKg: number[]) => ({
  meanKg,
  p10Kg: meanKg.map((massKg) => massKg / 2),
  p90Kg: meanKg.map((massKg) => massKg * 2),
})
const yearsAhead: RunResult['yearsAhead'] = {
  years: [2027, 2028],
  demolition: {
    total: series(110, 220),
    byMaterial: { timber: series(10, 20), concrete: series(100, 200) },
  },
  refurbishment: { total: series(1, 2), byMaterial: { timber: series(1, 2) } },
  expectedBuildings: [0.5, 0.75],
  expectedFloorAreaM2: [60, 80],
  cumulative: series(110, 330),
}

describe('flowRows', () => {
  it('gives one row a year with the band of its flow', () => {
    expect(flowRows(yearsAhead, 'demolition', 1)).toEqual([
      {
        year: 2027,
        totalKg: 110,
        lowKg: 55,
        highKg: 220,
        massKg: { concrete: 100, timber: 10 },
        expectedBuildings: 0.5,
        expectedFloorAreaM2: 60,
      },
    ])
  })

  it('adds means of two flows but never their bands', () => {
    const [, second] = flowRows(yearsAhead, 'both', 10)

    expect(second).toMatchObject({ totalKg: 222, lowKg: null, highKg: null, massKg: { timber: 22 } })
  })
})

describe('flowMaterials', () => {
  it('puts the heaviest material first', () => {
    expect(flowMaterials(flowRows(yearsAhead, 'demolition', 2))).toEqual(['concrete', 'timber'])
  })
})

describe('flowCsvRows', () => {
  it('heads each material and leaves a band out that is not known', () => {
    expect(flowCsvRows(flowRows(yearsAhead, 'both', 1))).toEqual([
      [
        'year',
        'total_mean_kg',
        'total_p10_kg',
        'total_p90_kg',
        'concrete_mean_kg',
        'timber_mean_kg',
        'expected_buildings',
        'expected_floor_area_m2',
      ],
      [2027, 111, null, null, 100, 11, 0.5, 60],
    ])
  })
})
