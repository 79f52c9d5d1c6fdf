import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { buildingStock, type StockBuilding } from './buildingStock'
import { combinedCv } from './combinedCv'
import { COMPONENT_SHARES } from './componentShares'
import { componentSplit } from './componentSplit'
import type { IntensityFigure } from './intensity.types'
import { intensityFor } from './intensityFor'
import { meanFactorCv } from './meanFactorCv'
import { periodOfYear } from './periodOfYear'
import { plausibilityBand } from './plausibilityBand'
import { pooledPart } from './pooledPart'
import { DEFAULT_SHARED_CV } from './sharedCvDefaults'
import { type Component, MATERIAL_GROUP_OF, MATERIALS, PERIOD_IDS, PERIODS, STRUCTURES, USES } from './vocabulary'

function buildFigure(overrides: Partial<IntensityFigure> = {}): IntensityFigure {
  const base: IntensityFigure = {
    rowId: 'row',
    figureId: 'figure',
    use: 'all',
    structure: 'all',
    period: 'all',
    material: 'concrete',
    component: 'whole',
    areaBasis: 'GFA',
    meanKgPerM2: 1000,
    medianKgPerM2: 900,
    gsdBetweenBuildings: 1.8,
    sharedCv: 0.22,
    sampleCount: 100,
    source: 'a test',
    provenance: 'open-dataset',
  }
  return { ...base, ...overrides }
}

const office = { use: 'office', structure: 'steel-frame', periodId: '1961-1975' } as const
const book = [
  buildFigure({ rowId: 'all', meanKgPerM2: 700 }),
  buildFigure({ rowId: 'steel', structure: 'steel-frame', meanKgPerM2: 500 }),
  buildFigure({ rowId: 'steel-office', structure: 'steel-frame', use: 'office', meanKgPerM2: 450 }),
]

describe('periods', () => {
  it('follow each other without gap or overlap', () => {
    PERIODS.slice(1).forEach(({ fromYear }, index) => expect(fromYear).toBe(PERIODS[index]?.toYear))
    expect(PERIODS.map(({ id }) => id)).toEqual([...PERIOD_IDS])
  })

  it('hold every year once', () => {
    expect([1700, 1945, 1946, 1960, 1961, 2005, 2006, 2026].map(periodOfYear)).toEqual([
      'before-1919',
      '1919-1945',
      '1946-1960',
      '1946-1960',
      '1961-1975',
      '1991-2005',
      'from-2006',
      'from-2006',
    ])
    expect(() => periodOfYear(Number.NaN)).toThrow('not-a-number')
  })
})

describe('a factor looked up', () => {
  it('is the row of the archetype where there is one', () => {
    const found = intensityFor(office, 'concrete', book)

    expect(found).toMatchObject({
      kind: 'known',
      meanKgPerM2: 450,
      sharedCv: expect.closeTo(0.22, 12),
      pooledOver: [],
      isSplit: false,
    })
  })

  it('falls back on the structure when the use has no row, with a wider error', () => {
    const found = intensityFor({ ...office, use: 'retail' }, 'concrete', book)

    expect(found).toMatchObject({ kind: 'known', meanKgPerM2: 500, pooledOver: ['use'] })
    expect(found.kind === 'known' && found.sharedCv).toBeCloseTo(combinedCv([0.22, 0.15]), 12)
  })

  it('takes the pooled row for an unknown structure, with a still wider error', () => {
    const found = intensityFor({ use: 'unknown', structure: 'unknown', periodId: 'unknown' }, 'concrete', book)

    expect(found).toMatchObject({ kind: 'known', meanKgPerM2: 700, pooledOver: ['structure', 'use'] })
  })

  it('pools single rows by their buildings where the book has no pooled one', () => {
    const rows = [
      buildFigure({ structure: 'steel-frame', meanKgPerM2: 500, sampleCount: 30 }),
      buildFigure({ structure: 'timber-frame', meanKgPerM2: 300, sampleCount: 10 }),
    ]
    const found = intensityFor({ ...office, structure: 'unknown' }, 'concrete', rows)

    expect(found).toMatchObject({ kind: 'known', meanKgPerM2: 450 })
    expect(found.kind === 'known' && found.sharedCv).toBeGreaterThan(combinedCv([0.22, 0.35]))
  })

  it('adds components and prefers them to a whole-building row', () => {
    const rows = [
      ...book,
      buildFigure({ rowId: 's', structure: 'steel-frame', use: 'office', component: 'structure', meanKgPerM2: 400 }),
      buildFigure({ rowId: 'f', structure: 'steel-frame', use: 'office', component: 'fit-out', meanKgPerM2: 30 }),
    ]

    expect(intensityFor(office, 'concrete', rows)).toMatchObject({ kind: 'known', meanKgPerM2: 430, isSplit: true })
  })

  it('tells missing, trace and zero apart', () => {
    const unreported = buildFigure({ meanKgPerM2: null, medianKgPerM2: null })

    expect(intensityFor(office, 'glass', book)).toEqual({ kind: 'missing', reason: 'no-row' })
    expect(intensityFor(office, 'concrete', [unreported])).toEqual({ kind: 'missing', reason: 'not-reported' })
    expect(intensityFor(office, 'concrete', [{ ...unreported, isTrace: true }])).toEqual({ kind: 'trace' })
    expect(intensityFor(office, 'concrete', [buildFigure({ meanKgPerM2: 0 })])).toMatchObject({
      kind: 'known',
      meanKgPerM2: 0,
    })
  })

  it('goes past a row that was not reported to a wider one', () => {
    const rows = [
      ...book,
      buildFigure({ structure: 'steel-frame', use: 'retail', meanKgPerM2: null, medianKgPerM2: null }),
    ]

    expect(intensityFor({ ...office, use: 'retail' }, 'concrete', rows)).toMatchObject({ meanKgPerM2: 500 })
  })

  it('refuses to add figures on different area bases', () => {
    const rows = [buildFigure({ component: 'roof' }), buildFigure({ component: 'structure', areaBasis: 'NFA' })]

    expect(() => intensityFor(office, 'concrete', rows)).toThrow('mixed-area-bases')
  })

  it('is never zero and never narrower for knowing less', () => {
    const known = intensityFor(office, 'concrete', book)
    fc.assert(
      fc.property(
        fc.constantFrom(...USES, 'unknown' as const),
        fc.constantFrom(...STRUCTURES, 'unknown' as const),
        fc.constantFrom(...PERIOD_IDS, 'unknown' as const),
        (use, structure, periodId) => {
          const found = intensityFor({ use, structure, periodId }, 'concrete', book)

          expect(found.kind === 'known' && found.meanKgPerM2).toBeGreaterThan(0)
          expect(found.kind === 'known' && known.kind === 'known' && found.sharedCv >= known.sharedCv).toBe(true)
        },
      ),
    )
  })

  it('turns a median into a mean by the spread', () => {
    const part = pooledPart([buildFigure({ meanKgPerM2: null, medianKgPerM2: 100, gsdBetweenBuildings: 2 })])

    expect(part.meanKgPerM2).toBeCloseTo(100 * Math.exp(Math.LN2 ** 2 / 2), 10)
    expect(() => pooledPart([])).toThrow('empty-input')
    expect(() => pooledPart([buildFigure({ meanKgPerM2: null, medianKgPerM2: null })])).toThrow('factor-missing')
  })
})

describe('the error of a mean factor', () => {
  it('shrinks with the buildings behind it, but never below the transfer', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 5, noNaN: true }),
        fc.integer({ min: 1, max: 999 }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (gsd, n, transfer) => {
          expect(meanFactorCv(gsd, n + 1, transfer)).toBeLessThanOrEqual(meanFactorCv(gsd, n, transfer) + 1e-12)
          expect(meanFactorCv(gsd, n, transfer)).toBeGreaterThanOrEqual(transfer - 1e-12)
        },
      ),
    )
  })

  it('refuses a spread below one, no buildings, a negative transfer', () => {
    expect(() => meanFactorCv(0.9, 1, 0)).toThrow('parameter-out-of-range')
    expect(() => meanFactorCv(1.5, 0, 0)).toThrow('parameter-out-of-range')
    expect(() => meanFactorCv(1.5, 1, -1)).toThrow('parameter-out-of-range')
    expect(() => combinedCv([-0.1])).toThrow('parameter-out-of-range')
  })

  it('has a default for every material', () => {
    for (const material of MATERIALS) expect(DEFAULT_SHARED_CV[material]).toBeGreaterThan(0)
  })
})

describe('the stock of buildings', () => {
  const steel = { kind: 'known', kgPerM2: 30, areaBasis: 'GFA' } as const
  const buildBuilding = (
    overrides: Partial<StockBuilding<'steel' | 'glass'>> = {},
  ): StockBuilding<'steel' | 'glass'> => ({
    buildingId: 'b1',
    amount: 100,
    areaBasis: 'GFA',
    factors: { steel, glass: { kind: 'trace' } },
    ...overrides,
  })

  it('names buildings without a factor and counts traces apart', () => {
    const stock = buildingStock([buildBuilding(), buildBuilding({ buildingId: 'b2', factors: {} })], ['steel', 'glass'])

    expect(stock.steel).toEqual({ knownKg: 3000, missingBuildingIds: ['b2'], traceBuildingIds: [] })
    expect(stock.glass).toEqual({ knownKg: 0, missingBuildingIds: ['b2'], traceBuildingIds: ['b1'] })
  })

  it('takes a measured mass in place of the factor, even where none is known', () => {
    const stock = buildingStock([buildBuilding({ factors: {}, measuredKg: { steel: 1234 } })], ['steel'])

    expect(stock.steel).toEqual({ knownKg: 1234, missingBuildingIds: [], traceBuildingIds: [] })
  })

  it('refuses to multiply an area by a factor on another basis', () => {
    expect(() => buildingStock([buildBuilding({ areaBasis: 'NFA' })], ['steel'])).toThrow('mixed-area-bases')
    expect(() => buildingStock([buildBuilding({ amount: -1 })], ['steel'])).toThrow('negative-area')
  })

  it('does not depend on the order of the buildings and doubles with their areas', () => {
    const amounts = fc.array(fc.double({ min: 0, max: 1e5, noNaN: true }), { maxLength: 20 })
    fc.assert(
      fc.property(amounts, (areas) => {
        const of = (list: readonly number[]) =>
          buildingStock(
            list.map((amount) => buildBuilding({ amount })),
            ['steel'],
          ).steel.knownKg
        const total = of(areas)

        expect(Math.abs(of([...areas].reverse()) - total)).toBeLessThanOrEqual(1e-12 * total)
        expect(Math.abs(of(areas.map((area) => 2 * area)) - 2 * total)).toBeLessThanOrEqual(1e-12 * total)
      }),
    )
  })
})

describe('plausibility', () => {
  it('counts both limits of the band as within', () => {
    const { band } = plausibilityBand('unknown', 1000)

    expect(plausibilityBand('unknown', band.p10KgPerM2).verdict).toBe('within')
    expect(plausibilityBand('unknown', band.p90KgPerM2).verdict).toBe('within')
    expect(plausibilityBand('masonry-timber-floors', 500).verdict).toBe('below')
    expect(() => plausibilityBand('hybrid', Number.NaN)).toThrow('negative-amount')
  })
})

describe('components', () => {
  it('share each material out completely', () => {
    for (const material of MATERIALS) {
      const { parts } = componentSplit(material, 100, 'common-practice-shares')

      expect(parts.reduce((total, { kgPerM2 }) => total + kgPerM2, 0)).toBeCloseTo(100, 10)
    }
    expect(Object.keys(COMPONENT_SHARES)).toEqual([...MATERIALS])
    expect(() => componentSplit('glass', -1, 'not-split')).toThrow('negative-amount')
  })

  it('of a concrete building lie in the usual shares of its mass', () => {
    const median = {
      concrete: 932,
      'masonry-units': 234,
      'mortar-plaster': 55.2,
      steel: 38.4,
      timber: 21.2,
      gypsum: 27.2,
      'mineral-insulation': 4,
      glass: 2,
      ceramics: 8,
      aluminium: 0.95,
      copper: 0.18,
      plastics: 0.98,
      bitumen: 0.24,
    } as const
    const total = Object.values(median).reduce((sum, mass) => sum + mass, 0)
    const massOf = (component: Component) =>
      MATERIALS.reduce((sum, material) => {
        const whole = material in median ? median[material as keyof typeof median] : 0
        const part = componentSplit(material, whole, 'common-practice-shares').parts.find(
          (found) => found.component === component,
        )
        return sum + (part?.kgPerM2 ?? 0)
      }, 0)

    expect(massOf('structure') / total).toBeGreaterThan(0.75)
    expect(massOf('structure') / total).toBeLessThan(0.93)
    expect(massOf('fit-out') / total).toBeLessThan(0.12)
  })
})

it('puts every material into a group', () => {
  expect(Object.keys(MATERIAL_GROUP_OF)).toEqual(expect.arrayContaining([...MATERIALS]))
})
