import { describe, expect, it } from 'vitest'
import type { IntensityFigure } from '@/shared/compute/factors/intensity.types'
import { STRUCTURES, type Structure } from '@/shared/compute/factors/vocabulary'
import { computeDistrict, type SurveyedBuilding } from './computeDistrict'
import type { LifetimeFigure } from './resolveArchetype'

/**
 * One building of each structure, worked out apart from the product: stock = area × factor, and flow of year k
 * = stock·[S(a + k − 1) − S(a + k)]/S(a) with S(t) = exp(−(t/λ)^k), a = 2026 − year + 0.5. The figures were computed
 * with decimal arithmetic of 50 digits (Python's decimal module), Weibull shape 2.3 and scale 146.7 years.
 */
const YEAR = 1926
const AREA_M2 = 1_000

const factorOf = (structure: Structure): number => 700 + 100 * STRUCTURES.indexOf(structure)

const figures = STRUCTURES.map((structure): IntensityFigure => ({
  rowId: structure,
  figureId: structure,
  use: 'all',
  structure,
  period: 'all',
  material: 'concrete',
  component: 'structure',
  areaBasis: 'GFA',
  meanKgPerM2: factorOf(structure),
  medianKgPerM2: null,
  gsdBetweenBuildings: null,
  sharedCv: 0.25,
  sampleCount: 1,
  source: 'this test',
  provenance: 'common-practice',
}))

/** Mean and sd of the Weibull above. */
const lifetimes: LifetimeFigure[] = [
  {
    rowId: 'life',
    use: 'all',
    structure: 'all',
    component: 'building',
    model: 'weibull',
    meanYears: 129.96368712587415,
    sdYears: 59.92414319927657,
    sharedCv: 0,
  },
]

/** Chance to come down in 2027 … 2036 of a building of 1926 that stands at the end of 2026. */
const CHANCES = [
  0.009604242627, 0.009634015675, 0.009661469806, 0.009686604545, 0.009709420653, 0.009729920119, 0.009748106154,
  0.009763983182, 0.009777556831, 0.009788833921,
]

describe('one building of each structure', () => {
  const buildings = STRUCTURES.map((structure): SurveyedBuilding => ({
    buildingId: structure,
    use: 'office',
    structure,
    yearFrom: YEAR,
    yearTo: YEAR,
    grossFloorAreaM2: AREA_M2,
    floorAreaCv: 0.065,
    hazardMultiplier: 1,
  }))

  it.each(buildings)('of $structure has the stock and the first ten years that a hand gets', (building) => {
    const { stock, yearsAhead } = computeDistrict([building], figures, lifetimes, {
      surveyYear: 2026,
      horizonYears: 10,
      yearOffset: 0.5,
    })

    const massKg = AREA_M2 * factorOf(building.structure as Structure)
    expect(stock.total.meanKg).toBe(massKg)
    CHANCES.forEach((chance, k) => expect(yearsAhead.demolition.total.meanKg[k]! / massKg).toBeCloseTo(chance, 9))
  })

  it('adds up over the structures', () => {
    const { stock } = computeDistrict(buildings, figures, lifetimes, {
      surveyYear: 2026,
      horizonYears: 10,
      yearOffset: 0.5,
    })

    expect(stock.total.meanKg).toBe(STRUCTURES.reduce((total, structure) => total + AREA_M2 * factorOf(structure), 0))
  })
})
