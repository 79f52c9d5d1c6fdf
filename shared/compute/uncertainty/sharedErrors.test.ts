import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { demolitionFlowOfYear } from './demolitionFlowOfYear'
import type { FactorGroup } from './factorGroup.types'
import type { MassGroup } from './massGroup.types'
import { sharedFactorStock } from './sharedFactorStock'
import { varianceByCause, type CausesOfVariance } from './varianceByCause'

const area = fc.double({ min: 0.1, max: 1e4, noNaN: true })
/** Nothing at all, or an amount that somebody could have measured: squares of 1e-200 are zero and test rounding only. */
const noneOrFrom = (least: number, most: number) =>
  fc.oneof(
    { weight: 1, arbitrary: fc.constant(0) },
    { weight: 9, arbitrary: fc.double({ min: least, max: most, noNaN: true }) },
  )
const cv = noneOrFrom(1e-6, 1)
const areas = fc.array(area, { minLength: 1, maxLength: 80, size: 'max' })
const factorGroup: fc.Arbitrary<FactorGroup> = fc.record({
  factorMeanKgPerM2: fc.double({ min: 1, max: 2000, noNaN: true }),
  factorCv: cv,
  areasM2: areas,
  areaCv: cv,
})
const factorGroups = fc.array(factorGroup, { minLength: 1, maxLength: 8, size: 'max' })

/** A group whose factor is one of four, whose buildings may come down by one of three lives. */
const massGroup: fc.Arbitrary<MassGroup> = fc
  .record({
    factors: fc.array(fc.record({ which: fc.nat(3), mean: noneOrFrom(1e-3, 900) }), {
      minLength: 1,
      maxLength: 4,
    }),
    buildings: fc.array(fc.tuple(area, cv, noneOrFrom(1e-9, 0.5)), {
      minLength: 1,
      maxLength: 40,
      size: 'max',
    }),
    betweenBuildingsCv: cv,
    life: fc.constantFrom('stands', 'certain', 'slow', 'quick'),
  })
  .map(({ factors, buildings, betweenBuildingsCv, life }): MassGroup => {
    const chances = buildings.map(([, , chance]) => chance)
    const lives = {
      stands: {},
      certain: { comingDown: chances },
      slow: { comingDown: lifeOf('slow', chances, 0.3) },
      quick: { comingDown: lifeOf('quick', chances, 0.6) },
    }
    return {
      factors: factors.map(({ which, mean }) => ({ factorId: `f${which}`, meanKgPerM2: mean, sharedCv: 0.1 * which })),
      areasM2: buildings.map(([areaM2]) => areaM2),
      areaCv: buildings.map(([, areaCv]) => areaCv),
      betweenBuildingsCv,
      ...lives[life],
    }
  })
const massGroups = fc.array(massGroup, { minLength: 1, maxLength: 6, size: 'max' })

function lifeOf(lifeId: string, chances: readonly number[], slope: number) {
  return { lifeId, chancesAt: (z: number) => chances.map((chance) => Math.min(1, chance * Math.exp(-slope * z))) }
}

const whole = ({ measurement, variability, factor, lifetime, chance }: CausesOfVariance) =>
  measurement + variability + factor + lifetime + chance
const isNear = (got: number, expected: number, rel = 1e-9) =>
  Math.abs(got - expected) <= Math.max(1e-12, rel * Math.abs(expected))

describe('sharedFactorStock', () => {
  it('keeps the error of a shared factor whole while the errors of areas average out', () => {
    const groupOf = (count: number): FactorGroup => ({
      factorMeanKgPerM2: 800,
      factorCv: 0.25,
      areasM2: new Array<number>(count).fill(100),
      areaCv: 0.5,
    })

    expect(sharedFactorStock([groupOf(1)]).cv).toBeCloseTo(Math.sqrt(1.25 * 1.0625 - 1), 12)
    expect(sharedFactorStock([groupOf(10_000)]).cv).toBeCloseTo(0.25, 3)
  })

  it('doubles mean and standard deviation when all areas double, and does not mind the order of buildings', () => {
    fc.assert(
      fc.property(factorGroups, (groups) => {
        const once = sharedFactorStock(groups)
        const twice = sharedFactorStock(groups.map((group) => ({ ...group, areasM2: group.areasM2.map((a) => 2 * a) })))
        const turned = sharedFactorStock(groups.map((group) => ({ ...group, areasM2: [...group.areasM2].reverse() })))

        expect(isNear(twice.meanKg, 2 * once.meanKg)).toBe(true)
        expect(isNear(twice.sdKg, 2 * once.sdKg)).toBe(true)
        expect(isNear(turned.sdKg, once.sdKg)).toBe(true)
      }),
    )
  })

  it('adds variances over groups, and standard deviations of the factors when they move together', () => {
    fc.assert(
      fc.property(factorGroups, (groups) => {
        const singles = groups.map((group) => sharedFactorStock([group]))
        const apart = sharedFactorStock(groups)
        const certain = groups.map((group) => ({ ...group, areaCv: 0 }))
        const together = sharedFactorStock(certain, 1)

        expect(
          isNear(
            apart.sdKg ** 2,
            singles.reduce((all, { sdKg }) => all + sdKg ** 2, 0),
          ),
        ).toBe(true)
        expect(
          isNear(
            together.sdKg,
            certain.reduce((all, group) => all + sharedFactorStock([group]).sdKg, 0),
          ),
        ).toBe(true)
      }),
    )
  })

  it('takes a matrix of correlations as well as one for all', () => {
    const groups: FactorGroup[] = [820, 610, 300].map((factorMeanKgPerM2) => ({
      factorMeanKgPerM2,
      factorCv: 0.3,
      areasM2: [450, 450],
      areaCv: 0.1,
    }))
    const matrix = [
      [1, 0.4, 0.4],
      [0.4, 1, 0.4],
      [0.4, 0.4, 1],
    ]

    expect(sharedFactorStock(groups, matrix).sdKg).toBeCloseTo(sharedFactorStock(groups, 0.4).sdKg, 6)
  })

  it('refuses negative areas, lists of different lengths and impossible correlations', () => {
    const group: FactorGroup = { factorMeanKgPerM2: 800, factorCv: 0.2, areasM2: [100, 50], areaCv: 0.1 }

    expect(() => sharedFactorStock([{ ...group, areasM2: [-1, 2] }])).toThrow('negative-area')
    expect(() => sharedFactorStock([{ ...group, areaCv: [0.1] }])).toThrow('length-mismatch')
    expect(() => sharedFactorStock([{ ...group, factorCv: NaN }])).toThrow('parameter-out-of-range')
    expect(() => sharedFactorStock([group, group], 1.2)).toThrow('share-out-of-range')
    expect(() => sharedFactorStock([group, group], [[1]])).toThrow('length-mismatch')
  })
})

describe('demolitionFlowOfYear', () => {
  it('lays all variance on the factor when every building comes down', () => {
    expect(demolitionFlowOfYear(800, 0.25, [100, 50], [1, 1])).toEqual({
      meanKg: 120_000,
      sdKg: 30_000,
      cv: 0.25,
      factorShareOfVariance: 1,
    })
  })

  it('refuses chances beyond one and lists of different lengths', () => {
    expect(() => demolitionFlowOfYear(800, 0.2, [100], [1.2])).toThrow('share-out-of-range')
    expect(() => demolitionFlowOfYear(800, 0.2, [100], [])).toThrow('length-mismatch')
    expect(() => demolitionFlowOfYear(800, 0.2, [-100], [0.5])).toThrow('negative-area')
    expect(() => demolitionFlowOfYear(-800, 0.2, [100], [0.5])).toThrow('parameter-out-of-range')
  })
})

describe('varianceByCause', () => {
  it('is the stock of one shared factor when nothing comes down', () => {
    fc.assert(
      fc.property(factorGroup, (group) => {
        const plain = sharedFactorStock([group])
        const factor = { factorId: 'f', meanKgPerM2: group.factorMeanKgPerM2, sharedCv: group.factorCv }
        const { meanKg, sdKg } = varianceByCause([{ factors: [factor], areasM2: group.areasM2, areaCv: group.areaCv }])

        expect(isNear(meanKg, plain.meanKg)).toBe(true)
        expect(isNear(sdKg, plain.sdKg)).toBe(true)
      }),
    )
  })

  it('is the demolition flow of a year when chances are certain', () => {
    const [areasM2, chances] = [
      [450, 600, 1200, 240],
      [0.02, 0.05, 0.01, 0.1],
    ]
    const flow = demolitionFlowOfYear(820, 0.25, areasM2, chances, 0.1)
    const factors = [{ factorId: 'f', meanKgPerM2: 820, sharedCv: 0.25 }]
    const apart = varianceByCause([{ factors, areasM2, areaCv: 0.1, comingDown: chances }])

    expect(apart.sdKg).toBeCloseTo(flow.sdKg, 6)
    expect(apart.shares.factor).toBeCloseTo(flow.factorShareOfVariance, 12)
  })

  it('has shares that add up to one, whatever the order of groups and buildings', () => {
    fc.assert(
      fc.property(massGroups, (groups) => {
        const { sdKg, byCauseKg2, shares } = varianceByCause(groups)
        const turned = varianceByCause([...groups].reverse())

        expect(isNear(whole(byCauseKg2), sdKg ** 2)).toBe(true)
        if (sdKg > 0) expect(whole(shares)).toBeCloseTo(1, 9)
        expect(isNear(turned.sdKg, sdKg)).toBe(true)
      }),
    )
  })

  it('doubles the mean and keeps the CV when all areas double', () => {
    fc.assert(
      fc.property(massGroups, (groups) => {
        const once = varianceByCause(groups)
        const doubled = groups.map((group) => ({ ...group, areasM2: Array.from(group.areasM2, (a) => 2 * a) }))
        const twice = varianceByCause(doubled)

        expect(isNear(twice.meanKg, 2 * once.meanKg)).toBe(true)
        expect(isNear(twice.cv, once.cv)).toBe(true)
      }),
    )
  })

  it('adds means over the union of two districts, and their shared errors more than independently', () => {
    fc.assert(
      fc.property(massGroups, massGroups, (one, other) => {
        const [a, b, both] = [varianceByCause(one), varianceByCause(other), varianceByCause([...one, ...other])]
        const independent = a.sdKg ** 2 + b.sdKg ** 2

        expect(isNear(both.meanKg, a.meanKg + b.meanKg)).toBe(true)
        expect(both.sdKg ** 2).toBeGreaterThanOrEqual(independent * (1 - 1e-9))
        expect(both.sdKg).toBeLessThanOrEqual((a.sdKg + b.sdKg) * (1 + 1e-9))
        expect(isNear(both.byCauseKg2.chance, a.byCauseKg2.chance + b.byCauseKg2.chance)).toBe(true)
      }),
    )
  })

  it('refuses one factor with two errors, chances beyond one and lists of different lengths', () => {
    const factors = [{ factorId: 'f', meanKgPerM2: 800, sharedCv: 0.2 }]
    const group: MassGroup = { factors, areasM2: [100], areaCv: 0.1 }
    const unlike = { ...group, factors: [{ factorId: 'f', meanKgPerM2: 800, sharedCv: 0.3 }] }

    expect(() => varianceByCause([group, unlike])).toThrow('factor-ambiguous')
    expect(() => varianceByCause([{ ...group, comingDown: [1.5] }])).toThrow('share-out-of-range')
    expect(() => varianceByCause([{ ...group, comingDown: [] }])).toThrow('length-mismatch')
    expect(() => varianceByCause([{ ...group, areaCv: [] }])).toThrow('length-mismatch')
    expect(() => varianceByCause([{ ...group, areasM2: [NaN] }])).toThrow('negative-area')
    expect(() => varianceByCause([{ ...group, betweenBuildingsCv: -1 }])).toThrow('parameter-out-of-range')
  })
})
