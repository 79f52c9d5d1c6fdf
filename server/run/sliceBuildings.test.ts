import { describe, expect, it } from 'vitest'
import type { IntensityFigure } from '@/shared/compute/factors/intensity.types'
import { computeDistrict } from '@/shared/compute/run/computeDistrict'
import type { LifetimeFigure } from '@/shared/compute/run/resolveArchetype'
import { scenario } from '@/shared/schemas/run'
import type { RunSheet } from './runInputs.types'
import { sliceBuildings } from './sliceBuildings'

const plain = scenario.parse({ name: 'as it is' })
const conventions = { surveyYear: 2026, horizonYears: 20, yearOffset: 0.5 }

const sheet: RunSheet = {
  buildingId: 'a',
  outlineId: null,
  blockId: null,
  label: 'A',
  use: 'multi-family',
  structure: 'masonry-timber-floors',
  yearFrom: 1905,
  yearTo: 1905,
  footprintM2: 200,
  grossFloorAreaM2: 600,
  floorAreaCv: 0.1,
  isStoreysKnown: true,
  condition: 'fair',
  vacancy: 'occupied',
  isProtected: false,
}
const main = { use: sheet.use, structure: sheet.structure, yearFrom: 1905, yearTo: 1905 }

const factor = (use: IntensityFigure['use'], meanKgPerM2: number): IntensityFigure => ({
  rowId: use,
  figureId: use,
  use,
  structure: 'all',
  period: 'all',
  material: 'concrete',
  component: 'structure',
  areaBasis: 'GFA',
  meanKgPerM2,
  medianKgPerM2: null,
  gsdBetweenBuildings: 1.3,
  sharedCv: 0.25,
  sampleCount: 1,
  source: 'this test',
  provenance: 'common-practice',
})
const life: LifetimeFigure = {
  rowId: 'life',
  use: 'all',
  structure: 'all',
  component: 'building',
  model: 'exponential',
  meanYears: 80,
  sdYears: 80,
  sharedCv: 0.2,
}

function district(sheets: readonly RunSheet[], figures = [factor('all', 1000)]) {
  return computeDistrict(sliceBuildings(sheets, plain).buildings, figures, [life], conventions)
}

describe('sliceBuildings', () => {
  it('changes neither stock nor flow, nor their errors, where the slices are alike', () => {
    const slices = [
      { ...main, grossFloorAreaM2: 450 },
      { ...main, grossFloorAreaM2: 150 },
    ]
    const whole = district([sheet])
    const sliced = district([{ ...sheet, slices }])

    expect(sliced.stock.total.meanKg).toBeCloseTo(whole.stock.total.meanKg, 6)
    for (const cause of ['measurement', 'factor'] as const) {
      const of = (one: typeof whole) => one.stock.total.varianceByCauseKg2[cause]
      expect(of(sliced) / of(whole)).toBeCloseTo(1, 12)
    }
    const chance = (one: typeof whole) => one.yearsAhead.cumulativeDemolition.varianceByCauseKg2.chance[9]!
    expect(chance(sliced) / chance(whole)).toBeCloseTo(1, 12)
    expect(sliced.yearsAhead.expectedBuildings[0]).toBe(whole.yearsAhead.expectedBuildings[0])
  })

  it('tallies each slice with the factor of its own use', () => {
    const slices = [
      { ...main, grossFloorAreaM2: 400 },
      { ...main, use: 'retail' as const, grossFloorAreaM2: 200 },
    ]
    const { stock } = district([{ ...sheet, slices }], [factor('multi-family', 1000), factor('retail', 1500)])

    expect(stock.total.meanKg).toBe(400 * 1000 + 200 * 1500)
  })

  it('says which slices are of which sheet', () => {
    const slices = [
      { ...main, grossFloorAreaM2: 400 },
      { ...main, use: 'retail' as const, grossFloorAreaM2: 200 },
    ]

    expect(sliceBuildings([sheet, { ...sheet, slices }, sheet], plain).placesOf).toEqual([
      [0, 1],
      [1, 3],
      [3, 4],
    ])
  })
})
