import { describe, expect, it } from 'vitest'
import { COMPONENTS } from '@/shared/compute/factors/vocabulary'
import type { Archetype, BuildingCell, FactorUse } from './run.types'
import { sharesOfVariance, stockOfCells, totalVariance } from './stockOfCells'
import { yearsAheadOfCells } from './yearsAheadOfCells'

const whole: FactorUse = {
  material: 'concrete',
  component: 'whole',
  factorId: 'figure',
  meanKgPerM2: 1_000,
  sharedCv: 0.2,
  betweenBuildingsCv: 0.5,
}
const split = [0.04, 0.8, 0.06, 0.1].map((share, index): FactorUse => ({
  ...whole,
  component: COMPONENTS[index] ?? 'structure',
  meanKgPerM2: share * whole.meanKgPerM2,
}))
const lifetime = { model: 'weibull', shape: 2, scaleYears: 100 } as const
const archetypeOf = (factors: readonly FactorUse[]): Archetype => ({
  use: 'office',
  structure: 'reinforced-concrete',
  period: '1961-1975',
  factors,
  life: { lifetimeId: 'life', lifetime, shorter: lifetime, longer: lifetime },
  componentLives: {},
})
const cells: BuildingCell[] = [
  {
    archetype: 0,
    yearFrom: 1965,
    yearTo: 1965,
    hazardMultiplier: 1,
    buildingCount: 3,
    floorAreaM2: 3_000,
    floorAreaSquaredM4: 3_000_000,
    floorAreaVarianceM4: 30_000,
  },
]
const conventions = { surveyYear: 2026, horizonYears: 10, yearOffset: 0.5, unknownYears: () => [] } as const

describe('a figure that is split by component', () => {
  it('has the stock and the doubt it has whole: its parts err together', () => {
    const one = stockOfCells(cells, [archetypeOf([whole])]).total
    const parts = stockOfCells(cells, [archetypeOf(split)]).total

    expect(parts.meanKg).toBeCloseTo(one.meanKg, 6)
    for (const cause of ['measurement', 'factor'] as const) {
      expect(parts.varianceByCauseKg2[cause] / one.varianceByCauseKg2[cause]).toBeCloseTo(1, 12)
    }
    expect(sharesOfVariance(parts.varianceByCauseKg2).factor).toBeGreaterThan(0)
    // Var F (ΣA)² + Var F Var ΣA of one shared factor, Goodman (1960)
    expect(one.varianceByCauseKg2.factor).toBeCloseTo(200 ** 2 * (3_000 ** 2 + 30_000), 0)
    expect(totalVariance(parts.varianceByCauseKg2)).toBeCloseTo(totalVariance(one.varianceByCauseKg2), 0)
  })

  it('has the same doubt of what comes down', () => {
    const one = yearsAheadOfCells(cells, [archetypeOf([whole])], conventions).demolition.total
    const parts = yearsAheadOfCells(cells, [archetypeOf(split)], conventions).demolition.total

    for (const cause of ['measurement', 'factor', 'chance'] as const) {
      for (let year = 0; year < conventions.horizonYears; year++) {
        const ratio = (parts.varianceByCauseKg2[cause][year] ?? 0) / (one.varianceByCauseKg2[cause][year] ?? 1)
        expect(ratio).toBeCloseTo(1, 12)
      }
    }
  })
})
