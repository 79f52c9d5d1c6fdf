import { describe, expect, it } from 'vitest'
import type { RunBuilding } from '@/shared/schemas/run'
import { buildingMeasure } from './buildingMeasure'
import { legendSteps } from './legendSteps'

const building: RunBuilding = {
  buildingId: '0191c0de-0000-7000-8000-000000000001',
  outlineId: '0191c0de-0000-7000-8000-000000000002',
  blockId: null,
  label: 'Tar Lane 12',
  use: 'terraced',
  structure: 'masonry-timber-floors',
  yearFrom: 1900,
  yearTo: 1918,
  footprintM2: 100,
  grossFloorAreaM2: 200,
  floorAreaCv: 0.1,
  massKg: 250_000,
  massByMaterialKg: { 'masonry-units': 200_000 },
  chanceTenYears: 0.1,
  chanceThirtyYears: 0.3,
}

describe('buildingMeasure', () => {
  it('spreads the mass over the footprint in tonnes per square metre', () => {
    expect(buildingMeasure(building, 'perFootprint', 'all')).toBe(2.5)
  })

  it('expects the mass times the chance', () => {
    expect(buildingMeasure(building, 'expectedTenYears', 'masonry-units')).toBe(20_000)
  })

  it('does not take a missing factor for nought', () => {
    expect(buildingMeasure(building, 'standing', 'copper')).toBeNull()
  })
})

describe('legendSteps', () => {
  it('counts each value once, one on a limit in the step above', () => {
    expect(legendSteps([1, 2, 3, 4, 4], [2, 4])).toEqual([
      { low: 1, high: 2, count: 1 },
      { low: 2, high: 4, count: 2 },
      { low: 4, high: 4, count: 2 },
    ])
  })

  it('has no steps without values', () => {
    expect(legendSteps([], [])).toEqual([])
  })
})
