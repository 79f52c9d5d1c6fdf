import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ComputeError } from '@/shared/compute/errors'
import { chiSquareQuantile } from './chiSquareQuantile'
import { lognormalBand } from './lognormalBand'
import { lognormalFromMean } from './lognormalFromMean'
import { lognormalFromMedian } from './lognormalFromMedian'
import { lognormalMoments } from './lognormalMoments'
import { normalQuantile } from './normalQuantile'
import { percentile } from './percentile'
import { productCv } from './productCv'
import vectors from './quantiles.vectors.json'
import { studentQuantile } from './studentQuantile'

const probability = fc.double({ min: 1e-12, max: 1 - 1e-12, noNaN: true })
const relativeError = (got: number, expected: number) => Math.abs(got - expected) / Math.abs(expected)
const worstOf = (errors: readonly number[]) => errors.reduce((worst, error) => Math.max(worst, error), 0)

describe('quantiles', () => {
  it('agree with 40-digit arithmetic for the normal law, far into the tail', () => {
    const worst = worstOf(vectors.normal.map(([p, z]) => relativeError(normalQuantile(p!), z!)))

    expect(worst).toBeLessThan(1e-14)
    expect(normalQuantile(1e-300)).toBeCloseTo(-37.0470962993612, 12)
  })

  it("agree with 40-digit arithmetic for Student's law, middle and tails", () => {
    const worst = worstOf(vectors.student.map(([p, freedom, t]) => relativeError(studentQuantile(p!, freedom!), t!)))

    expect(worst).toBeLessThan(1e-11)
  })

  it('agree with 40-digit arithmetic for the chi-square law, few and many degrees of freedom', () => {
    const worst = worstOf(
      vectors.chiSquare.map(([p, freedom, x]) => relativeError(chiSquareQuantile(p!, freedom!), x!)),
    )

    expect(worst).toBeLessThan(1e-11)
  })

  it('are symmetric for the laws that are', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.001, max: 0.499, noNaN: true }),
        fc.double({ min: 1, max: 1e4, noNaN: true }),
        (p, freedom) => {
          expect(normalQuantile(1 - p)).toBeCloseTo(-normalQuantile(p), 9)
          expect(studentQuantile(1 - p, freedom)).toBeCloseTo(-studentQuantile(p, freedom), 7)
        },
      ),
    )
  })

  it('rise with the probability', () => {
    fc.assert(
      fc.property(probability, probability, fc.double({ min: 0.5, max: 500, noNaN: true }), (p, q, freedom) => {
        const [low, high] = [Math.min(p, q), Math.max(p, q)]
        expect(normalQuantile(low)).toBeLessThanOrEqual(normalQuantile(high))
        const above = studentQuantile(high, freedom)
        expect(studentQuantile(low, freedom)).toBeLessThanOrEqual(above + 1e-12 * Math.max(1, Math.abs(above)))
        expect(chiSquareQuantile(low, freedom)).toBeLessThanOrEqual(chiSquareQuantile(high, freedom) * (1 + 1e-12))
      }),
    )
  })

  it('of Student go over into the normal ones', () => {
    expect(studentQuantile(0.9, 1e7)).toBeCloseTo(normalQuantile(0.9), 6)
  })

  it.each([0, 1, -0.1, NaN])('refuse the probability %s', (p) => {
    expect(() => normalQuantile(p)).toThrow(ComputeError)
    expect(() => studentQuantile(p, 3)).toThrow('share-out-of-range')
    expect(() => chiSquareQuantile(p, 3)).toThrow('share-out-of-range')
  })

  it.each([0, -1, NaN])('refuse %s degrees of freedom', (freedom) => {
    expect(() => studentQuantile(0.9, freedom)).toThrow('parameter-not-positive')
    expect(() => chiSquareQuantile(0.9, freedom)).toThrow('parameter-not-positive')
  })
})

describe('lognormal laws', () => {
  it('are the same by median and GSD as by mean and CV', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-6, max: 1e9, noNaN: true }),
        fc.double({ min: 1, max: 5, noNaN: true }),
        (median, gsd) => {
          const { mean, cv } = lognormalMoments(lognormalFromMedian(median, gsd))
          const back = lognormalFromMean(mean, cv)

          expect(back.logMean).toBeCloseTo(Math.log(median), 9)
          expect(back.logSd).toBeCloseTo(Math.log(gsd), 7)
        },
      ),
    )
  })

  it('keep P10 ≤ P50 ≤ P90, and scale with their mean', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-6, max: 1e9, noNaN: true }),
        fc.double({ min: 0, max: 3, noNaN: true }),
        (mean, cv) => {
          const band = lognormalBand(lognormalFromMean(mean, cv))
          const doubled = lognormalBand(lognormalFromMean(2 * mean, cv))

          expect(band.p10).toBeLessThanOrEqual(band.p50)
          expect(band.p50).toBeLessThanOrEqual(band.p90)
          expect(doubled.p90 / band.p90).toBeCloseTo(2, 9)
        },
      ),
    )
  })

  it('refuse a median of nothing and a GSD below one', () => {
    expect(() => lognormalFromMedian(0, 2)).toThrow('parameter-not-positive')
    expect(() => lognormalFromMedian(1, 0.9)).toThrow('parameter-out-of-range')
    expect(() => lognormalFromMean(-1, 0.2)).toThrow('parameter-not-positive')
    expect(() => lognormalFromMean(1, NaN)).toThrow('parameter-out-of-range')
  })
})

describe('percentile', () => {
  it('interpolates between neighbours and stays within the values', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 1, maxLength: 200, size: 'max' }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (values, p) => {
          const sorted = Float64Array.from(values).sort()
          const got = percentile(sorted, p)

          expect(got).toBeGreaterThanOrEqual(sorted[0]! - 1e-9)
          expect(got).toBeLessThanOrEqual(sorted.at(-1)! + 1e-9)
        },
      ),
    )
  })

  it('refuses no values and a share beyond one', () => {
    expect(() => percentile([], 0.5)).toThrow('empty-input')
    expect(() => percentile([1], 1.1)).toThrow('share-out-of-range')
  })
})

describe('productCv', () => {
  it('is at least its first order, whatever the order of the parts', () => {
    const parts = fc.array(fc.double({ min: 0, max: 2, noNaN: true }), { maxLength: 30, size: 'max' })
    fc.assert(
      fc.property(parts, (cvs) => {
        const { exact, firstOrder } = productCv(cvs)

        expect(exact).toBeGreaterThanOrEqual(firstOrder * (1 - 1e-12))
        expect(productCv([...cvs].reverse()).exact).toBeCloseTo(exact, 6)
      }),
    )
  })

  it('refuses a negative part', () => {
    expect(() => productCv([0.2, -0.1])).toThrow('parameter-out-of-range')
  })
})
