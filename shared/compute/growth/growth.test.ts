import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { doublingYears } from './doublingYears'
import { exponentialGrowth } from './exponentialGrowth'
import { logisticGrowth } from './logisticGrowth'
import { logisticLandmarks } from './logisticLandmarks'
import { logisticTime } from './logisticTime'
import { perCapitaStock } from './perCapitaStock'
import { saturatingGrowth } from './saturatingGrowth'
import { tableGrowth } from './tableGrowth'

const rate = fc.double({ min: 0.001, max: 0.5, noNaN: true })
const time = fc.double({ min: 0, max: 300, noNaN: true })
const paths = fc.record({
  start: fc.double({ min: 1, max: 1e6, noNaN: true }),
  ceiling: fc.double({ min: 1, max: 1e6, noNaN: true }),
  ratePerYear: rate,
})

describe('exponential growth', () => {
  it('doubles in its doubling time', () => {
    const compounding = fc.constantFrom('yearly', 'continuous')
    fc.assert(
      fc.property(rate, time, compounding, (ratePerYear, at, how) => {
        const path = { start: 100, ratePerYear, compounding: how }
        const later = exponentialGrowth(at + doublingYears(ratePerYear, how), path)
        expect(later / exponentialGrowth(at, path)).toBeCloseTo(2, 9)
      }),
    )
  })

  it('is refused where it has no meaning', () => {
    expect(() => exponentialGrowth(1, { start: 1, ratePerYear: -1, compounding: 'yearly' })).toThrow(
      'parameter-out-of-range',
    )
    expect(() => exponentialGrowth(NaN, { start: 1, ratePerYear: 0, compounding: 'yearly' })).toThrow('not-a-number')
    expect(() => exponentialGrowth(1, { start: NaN, ratePerYear: 0, compounding: 'yearly' })).toThrow('negative-amount')
    expect(() => doublingYears(0, 'continuous')).toThrow('parameter-out-of-range')
  })
})

describe('logistic and saturating growth', () => {
  it('stay between start and ceiling and begin at the start', () => {
    fc.assert(
      fc.property(paths, time, (path, at) => {
        const [low, high] = [Math.min(path.start, path.ceiling), Math.max(path.start, path.ceiling)]
        for (const growth of [logisticGrowth, saturatingGrowth]) {
          expect(growth(0, path)).toBeCloseTo(path.start, 6)
          const value = growth(at, path)
          expect(value >= low * (1 - 1e-12) && value <= high * (1 + 1e-12)).toBe(true)
        }
      }),
    )
  })

  it('reach a value at the time it is reached, steepest at half the ceiling', () => {
    const path = { start: 4000, ceiling: 80000, ratePerYear: 0.07 }
    const { inflectionYears, steepestSlopePerYear } = logisticLandmarks(path)
    expect(logisticGrowth(logisticTime(60000, path), path)).toBeCloseTo(60000, 6)
    const slope = logisticGrowth(inflectionYears + 0.5, path) - logisticGrowth(inflectionYears - 0.5, path)
    expect(slope).toBeCloseTo(steepestSlopePerYear, 0)
  })

  it('are refused where they have no meaning', () => {
    expect(() => logisticGrowth(1, { start: 0, ceiling: 1, ratePerYear: 0.1 })).toThrow('parameter-not-positive')
    expect(() => logisticGrowth(NaN, { start: 1, ceiling: 2, ratePerYear: 0.1 })).toThrow('not-a-number')
    expect(() => logisticTime(90, { start: 100, ceiling: 50, ratePerYear: 0.1 })).toThrow('undefined-statistic')
    expect(() => saturatingGrowth(1, { start: 1, ceiling: 2, ratePerYear: 0 })).toThrow('parameter-not-positive')
  })
})

describe('tables and persons', () => {
  it('pass through their points and stay level outside', () => {
    const points = [
      { year: 2020, value: 5 },
      { year: 2030, value: 15 },
      { year: 2031, value: 0 },
    ]
    expect([...tableGrowth(points, 2019, 14)]).toEqual([5, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 0, 0])
  })

  it('are refused when years do not rise, points are missing or lengths differ', () => {
    const twice = [
      { year: 2020, value: 5 },
      { year: 2020, value: 6 },
    ]
    expect(() => tableGrowth(twice, 2020, 2)).toThrow('interval-reversed')
    expect(() => tableGrowth([], 2020, 2)).toThrow('empty-input')
    expect(() => tableGrowth([{ year: 2020, value: NaN }], 2020, 2)).toThrow('not-a-number')
    expect(() => perCapitaStock([1], [1, 2])).toThrow('length-mismatch')
    expect(() => perCapitaStock([NaN], [1])).toThrow('negative-amount')
  })
})
