import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { anyLifetime } from '@/tests/support/anyLifetime'
import { densityPerYear } from './densityPerYear'
import { hazardPerYear } from './hazardPerYear'
import { integral } from './integral'
import vectors from './lifetime.vectors.json'
import type { Lifetime, LifetimeModel } from './lifetime.types'
import { lifetimeFromMeanSd } from './lifetimeFromMeanSd'
import { lifetimeMoments } from './lifetimeMoments'
import { logSurvival } from './logSurvival'
import { remainingLife } from './remainingLife'
import { scaleLifetime } from './scaleLifetime'
import { sumOfSurvival } from './sumOfSurvival'
import { survival } from './survival'
import { tabulateSurvival } from './tabulateSurvival'
import { tabulateUniformYear } from './tabulateUniformYear'

const weibull: Lifetime = { model: 'weibull', shape: 3.059114961, scaleYears: 78.32083206 }
const spreadModels: readonly LifetimeModel[] = [
  'normal',
  'truncatedNormal',
  'foldedNormal',
  'lognormal',
  'weibull',
  'gamma',
  'logistic',
  'truncatedLogistic',
  'logLogistic',
]

function relativeError(got: number, expected: number): number {
  return expected === 0 ? Math.abs(got) : Math.abs(got / expected - 1)
}

/** The file is data of this repository; its parameters are those of the model it names. */
const cases = vectors.vectors.map((row) => ({ ...row, lifetime: row.lifetime as Lifetime }))

describe.each(cases)('$lifetime against 40-digit arithmetic', ({ lifetime, ages, ...moments }) => {
  // measured: ln S 7e-14, hazard 7e-12 (130 mean lives out), moments 1e-15
  it('keeps its digits from the first quarter year to nine thousand years', () => {
    for (const { ageYears, logSurvival: log, hazardPerYear: hazard } of ages) {
      expect(relativeError(logSurvival(ageYears, lifetime), log), `ln S(${ageYears})`).toBeLessThan(1e-12)
      expect(relativeError(hazardPerYear(ageYears, lifetime), hazard), `h(${ageYears})`).toBeLessThan(1e-11)
    }
  })

  it('has the moments of its reference', () => {
    const got = lifetimeMoments(lifetime)
    expect(relativeError(got.meanYears, moments.meanYears)).toBeLessThan(1e-12)
    expect(relativeError(got.sdYears, moments.sdYears)).toBeLessThan(1e-12)
    expect(relativeError(got.medianYears, moments.medianYears)).toBeLessThan(1e-12)
  })

  it('is found again from its mean and sd', () => {
    if (lifetime.model === 'exponential') return
    const again = lifetimeMoments(lifetimeFromMeanSd(lifetime.model, moments.meanYears, moments.sdYears))
    expect(relativeError(again.meanYears, moments.meanYears)).toBeLessThan(1e-9)
    expect(relativeError(again.sdYears, moments.sdYears)).toBeLessThan(1e-9)
  })
})

describe('every lifetime', () => {
  it('stands whole at age 0 and before, whatever the model', () => {
    fc.assert(
      fc.property(anyLifetime(), fc.double({ min: -500, max: 0, noNaN: true }), (lifetime, age) => {
        expect(survival(age, lifetime)).toBe(1)
      }),
    )
  })

  it('never rises with age and stays within 0 and 1', () => {
    const age = fc.double({ min: 0, max: 3000, noNaN: true })
    fc.assert(
      fc.property(anyLifetime(), age, age, (lifetime, one, other) => {
        const [young, old] = one < other ? [one, other] : [other, one]
        const [before, after] = [logSurvival(young, lifetime), logSurvival(old, lifetime)]
        expect(before).toBeLessThanOrEqual(0)
        // 1e-13 of the value is the rounding of two evaluations far out
        expect(after).toBeLessThanOrEqual(before * (1 - 1e-13) + 1e-300)
      }),
      { numRuns: 500 },
    )
  })

  it('has a hazard that is the slope of its cumulative hazard', () => {
    const spread = anyLifetime().filter(({ model }) => model !== 'fixed')
    fc.assert(
      fc.property(spread, fc.double({ min: 1, max: 400, noNaN: true }), (lifetime, age) => {
        const step = 1e-5 * age
        const slope = (logSurvival(age - step, lifetime) - logSurvival(age + step, lifetime)) / (2 * step)
        const hazard = hazardPerYear(age, lifetime)
        expect(Math.abs(hazard - slope)).toBeLessThanOrEqual(1e-3 * Math.max(hazard, 1e-9))
      }),
    )
  })

  it('has a density that adds up to the share that leaves', () => {
    const spread = anyLifetime().filter(({ model }) => model !== 'fixed')
    fc.assert(
      fc.property(spread, (lifetime) => {
        const { meanYears } = lifetimeMoments(lifetime)
        const [low, high] = [0.8 * meanYears, meanYears]
        const left = integral((age) => densityPerYear(age, lifetime), { low, high })
        expect(left).toBeCloseTo(survival(low, lifetime) - survival(high, lifetime), 9)
      }),
    )
  })

  it('has the mean that remains at age 0 and settles a constant inflow near it', () => {
    const cut = anyLifetime().filter(({ model }) => model !== 'normal' && model !== 'logistic')
    fc.assert(
      fc.property(cut, (lifetime) => {
        const { meanYears } = lifetimeMoments(lifetime)
        expect(relativeError(remainingLife(0, lifetime).meanYears, meanYears)).toBeLessThan(1e-9)
        const settled = sumOfSurvival(lifetime, 0.5)
        expect(Math.abs(settled - meanYears)).toBeLessThan(0.500001)
      }),
    )
  })

  it('stretches mean, sd and median alike', () => {
    fc.assert(
      fc.property(anyLifetime(), fc.double({ min: 0.2, max: 5, noNaN: true }), (lifetime, stretch) => {
        const [one, other] = [lifetimeMoments(lifetime), lifetimeMoments(scaleLifetime(lifetime, stretch))]
        expect(other.meanYears).toBeCloseTo(stretch * one.meanYears, 6)
        expect(other.sdYears).toBeCloseTo(stretch * one.sdYears, 6)
        expect(other.medianYears).toBeCloseTo(stretch * one.medianYears, 6)
      }),
    )
  })
})

describe('lifetime from mean and sd', () => {
  it.each(spreadModels)('%s has the mean and sd asked for', (model) => {
    const mean = fc.double({ min: 1, max: 500, noNaN: true })
    fc.assert(
      fc.property(mean, fc.double({ min: 0.01, max: 0.74, noNaN: true }), (meanYears, cv) => {
        const got = lifetimeMoments(lifetimeFromMeanSd(model, meanYears, cv * meanYears))
        expect(relativeError(got.meanYears, meanYears)).toBeLessThan(1e-9)
        expect(relativeError(got.sdYears, cv * meanYears)).toBeLessThan(1e-9)
      }),
    )
  })

  it.each([
    ['truncatedNormal', 70, 71],
    ['truncatedLogistic', 70, 71],
    ['foldedNormal', 70, 54],
    ['exponential', 70, 25],
    ['fixed', 70, 1],
  ] as const)('refuses a %s life of %d ± %d years, which no parameters give', (model, mean, sd) => {
    expect(() => lifetimeFromMeanSd(model, mean, sd)).toThrow('parameter-out-of-range')
  })

  it.each([
    [NaN, 25],
    [0, 25],
    [-70, 25],
    [Infinity, 25],
    [70, NaN],
    [70, 0],
    [70, -1],
  ])('refuses %d ± %d years', (mean, sd) => {
    expect(() => lifetimeFromMeanSd('weibull', mean, sd)).toThrow('parameter-not-positive')
  })
})

describe('a number that is none', () => {
  it.each([
    [{ model: 'weibull', shape: NaN, scaleYears: 80 }],
    [{ model: 'weibull', shape: 3, scaleYears: 0 }],
    [{ model: 'gamma', shape: -1, scaleYears: 80 }],
    [{ model: 'normal', meanYears: NaN, sdYears: 10 }],
    [{ model: 'normal', meanYears: 70, sdYears: NaN }],
    [{ model: 'lognormal', logMean: NaN, logSd: 0.3 }],
    [{ model: 'logistic', locationYears: Infinity, scaleYears: 10 }],
    [{ model: 'fixed', lifetimeYears: NaN }],
    [{ model: 'exponential', meanYears: Infinity }],
  ] as const)('%o is refused', (lifetime) => {
    expect(() => logSurvival(10, lifetime)).toThrow(/parameter-not-positive|not-a-number/)
    expect(() => lifetimeMoments(lifetime)).toThrow(/parameter-not-positive|not-a-number/)
    expect(() => tabulateSurvival(lifetime, 0, 3)).toThrow(/parameter-not-positive|not-a-number/)
  })

  it('is refused as an age', () => {
    expect(() => survival(NaN, weibull)).toThrow('not-a-number')
    expect(() => hazardPerYear(NaN, weibull)).toThrow('negative-age')
    expect(() => densityPerYear(-1, weibull)).toThrow('negative-age')
    expect(() => remainingLife(NaN, weibull)).toThrow('negative-age')
    expect(() => tabulateSurvival(weibull, NaN, 3)).toThrow('not-a-number')
  })
})

describe('tables', () => {
  it('hold what the function gives', () => {
    fc.assert(
      fc.property(anyLifetime(), fc.constantFrom(0, 0.5, 1, 17.25), (lifetime, first) => {
        const table = tabulateSurvival(lifetime, first, 40)
        for (let j = 0; j < 40; j++) {
          expect(table.logSurvival[j]).toBe(logSurvival(first + j, lifetime))
          const difference = survival(first + j, lifetime) - survival(first + j + 1, lifetime)
          expect(Math.abs(table.leaving[j]! - difference)).toBeLessThan(1e-14)
        }
      }),
      { numRuns: 30 },
    )
  })

  it('of a year of even construction lie within the year and near its middle', () => {
    const table = tabulateUniformYear(weibull, 60, 10)
    for (let j = 0; j < 10; j++) {
      expect(table.survival[j]).toBeLessThan(survival(60 + j, weibull))
      expect(table.survival[j]).toBeGreaterThan(survival(61 + j, weibull))
      expect(table.survival[j]).toBeCloseTo(survival(60.5 + j, weibull), 4)
    }
  })

  it('of a year of even construction reach where survival itself is smaller than any double', () => {
    const table = tabulateUniformYear({ model: 'weibull', shape: 3, scaleYears: 60 }, 600, 2)
    expect(table.survival[0]).toBe(0)
    expect(table.logSurvival[0]).toBeGreaterThan(-1005.1)
    expect(table.logSurvival[0]).toBeLessThan(-1000)
  })
})

describe('remaining life', () => {
  it('is that of a new one for an exponential life, at any age', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1000, noNaN: true }), (age) => {
        const { meanYears, medianYears } = remainingLife(age, { model: 'exponential', meanYears: 70 })
        expect(meanYears).toBeCloseTo(70, 8)
        expect(medianYears).toBeCloseTo(70 * Math.LN2, 8)
      }),
    )
  })

  it('is nothing where the model leaves no survivor, and endless for a log-logistic life without a mean', () => {
    expect(remainingLife(75, { model: 'fixed', lifetimeYears: 60 })).toEqual({ meanYears: 0, medianYears: 0 })
    expect(remainingLife(5, { model: 'logLogistic', shape: 0.9, scaleYears: 60 }).meanYears).toBe(Infinity)
  })
})

it('grows longer with age where the hazard falls, and shorter where it rises', () => {
  const lognormal: Lifetime = { model: 'lognormal', logMean: 4, logSd: 0.8 }
  expect(remainingLife(300, lognormal).meanYears).toBeGreaterThan(remainingLife(100, lognormal).meanYears)
  expect(remainingLife(100, weibull).meanYears).toBeLessThan(remainingLife(50, weibull).meanYears)
})
