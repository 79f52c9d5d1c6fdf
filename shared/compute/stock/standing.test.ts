import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'
import { tabulateSurvival } from '@/shared/compute/lifetime/tabulateSurvival'
import { tabulateUniformYear } from '@/shared/compute/lifetime/tabulateUniformYear'
import { anyLifetime } from '@/tests/support/anyLifetime'
import { ageAtYearEnd } from './ageAtYearEnd'
import { cohortOutflow } from './cohortOutflow'
import { combinedMultiplier } from './combinedMultiplier'
import { comingDownChances } from './comingDownChances'
import { countQuantile } from './countQuantile'
import { flowCovariance } from './flowCovariance'
import { impliedDemolitionRate } from './impliedDemolitionRate'
import { poissonBinomial } from './poissonBinomial'
import { recentredMultipliers } from './recentredMultipliers'
import { standingChancesOfGroups } from './standingChancesOfGroups'
import { standingFlows } from './standingFlows'
import type { ConstructionYear, StandingGroup, SurveyConventions, YearOffset } from './stock.types'
import { withPermit } from './withPermit'

const weibull: Lifetime = { model: 'weibull', shape: 3.059114961, scaleYears: 78.32083206 }
const conventions: SurveyConventions = { surveyYear: 2025, horizonYears: 30, yearOffset: 0.5 }
const anyAge = fc.double({ min: 0, max: 300, noNaN: true })
const anyMultiplier = fc.double({ min: 0.2, max: 5, noNaN: true })
const anyOffset = fc.constantFrom<YearOffset>(0, 0.5, 1)
const total = (values: Iterable<number>) => [...values].reduce((sum, value) => sum + value, 0)

function anyGroups(constructionYear: fc.Arbitrary<ConstructionYear>): fc.Arbitrary<StandingGroup[]> {
  const group = fc.record({
    lifetime: anyLifetime(),
    constructionYear,
    amount: fc.double({ min: 0, max: 1e6, noNaN: true }),
    buildingCount: fc.integer({ min: 1, max: 400 }),
    hazardMultiplier: anyMultiplier,
  })
  return fc.array(group, { minLength: 1, maxLength: 40, size: 'max' })
}
const anyYear = fc.integer({ min: 1800, max: 2025 })
const anyRange = fc
  .tuple(anyYear, fc.integer({ min: 0, max: 40 }), fc.constantFrom('judgement', 'register'))
  .map(([yearTo, length, rule]): ConstructionYear => ({ yearFrom: yearTo - length, yearTo, rule }))

describe('chances of a standing building', () => {
  it('lie within 0 and 1 and add up to 1 with what remains', () => {
    fc.assert(
      fc.property(anyLifetime(), anyAge, anyMultiplier, (lifetime, age, hazardMultiplier) => {
        const { chances, remaining } = comingDownChances(lifetime, age, 60, { hazardMultiplier })
        for (const chance of chances) expect(chance >= 0 && chance <= 1).toBe(true)
        expect(Math.abs(total(chances) + remaining - 1)).toBeLessThan(1e-12)
      }),
      { numRuns: 500 },
    )
  })

  it('are those of a new cohort at age 0', () => {
    fc.assert(
      fc.property(anyLifetime(), (lifetime) => {
        const { chances } = comingDownChances(lifetime, 0, 60)
        const { outflow } = cohortOutflow(tabulateSurvival(lifetime, 0, 61), 1)
        chances.forEach((chance, k) => expect(Math.abs(chance - outflow[k + 1]!)).toBeLessThan(1e-14))
      }),
    )
  })

  it('are the same with a multiplier of 1 as with none', () => {
    fc.assert(
      fc.property(anyLifetime(), anyAge, (lifetime, age) => {
        const plain = comingDownChances(lifetime, age, 40)
        expect(comingDownChances(lifetime, age, 40, { hazardMultiplier: 1 })).toEqual(plain)
      }),
    )
  })

  it('do not depend on age for an exponential life', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1e5, noNaN: true }), (age) => {
        const [chance] = comingDownChances({ model: 'exponential', meanYears: 70 }, age, 1).chances
        expect(chance).toBeCloseTo(-Math.expm1(-1 / 70), 10)
      }),
    )
  })

  it('rise with the multiplier of the first year', () => {
    const first = (hazardMultiplier: number) => comingDownChances(weibull, 60, 1, { hazardMultiplier }).chances[0]!
    expect(first(0.5)).toBeLessThan(first(1))
    expect(first(2)).toBeGreaterThan(first(1))
  })

  it('of an overdue building are all in the first year, or spread over the years asked for', () => {
    const fixed: Lifetime = { model: 'fixed', lifetimeYears: 60 }
    const at = comingDownChances(fixed, 75, 4)
    expect([...at.chances, at.remaining, at.overdueShare]).toEqual([1, 0, 0, 0, 0, 1])
    const spread = comingDownChances(fixed, 75, 4, { overdueSpreadYears: 5 })
    expect([...spread.chances]).toEqual([0.2, 0.2, 0.2, 0.2])
    expect(spread.remaining).toBeCloseTo(0.2, 15)
  })

  it('are refused for ages, multipliers and spreads that are none', () => {
    expect(() => comingDownChances(weibull, NaN, 5)).toThrow('negative-age')
    expect(() => comingDownChances(weibull, -1, 5)).toThrow('negative-age')
    expect(() => comingDownChances(weibull, 5, 5, { hazardMultiplier: NaN })).toThrow('parameter-not-positive')
    expect(() => comingDownChances({ model: 'fixed', lifetimeYears: 1 }, 5, 5, { overdueSpreadYears: 0 })).toThrow(
      'parameter-not-positive',
    )
  })
})

describe('a cohort', () => {
  it('leaves or stands, whole, under every convention', () => {
    fc.assert(
      fc.property(anyLifetime(), anyOffset, fc.double({ min: 0, max: 1e9, noNaN: true }), (lifetime, o, amount) => {
        for (const table of [tabulateSurvival(lifetime, o, 80), tabulateUniformYear(lifetime, 0, 80)]) {
          const { outflow, standing } = cohortOutflow(table, amount)
          expect(Math.abs(total(outflow) + standing.at(-1)! - amount)).toBeLessThanOrEqual(1e-12 * amount + 1e-300)
          expect(outflow.every((mass) => mass >= 0)).toBe(true)
        }
      }),
      { numRuns: 40 },
    )
  })

  it('has the age of its convention at the end of a year', () => {
    expect(ageAtYearEnd(1960, 2025, 0)).toBe(65)
    expect(ageAtYearEnd(1960, 2025, 1)).toBe(66)
    expect(() => ageAtYearEnd(NaN, 2025, 1)).toThrow('not-a-number')
  })
})

describe('flows of standing groups', () => {
  it('keep the balance to 1e-9: expected and remaining are what was surveyed', () => {
    fc.assert(
      fc.property(anyGroups(fc.oneof(anyYear, anyRange)), anyOffset, (groups, yearOffset) => {
        const flows = standingFlows(groups, { ...conventions, yearOffset })
        const left = total(flows.expected) + flows.remaining
        expect(Math.abs(left - flows.surveyed)).toBeLessThanOrEqual(1e-9 * Math.max(1, flows.surveyed))
        flows.cumulativeExpected.forEach((now, k) => {
          expect(now).toBeGreaterThanOrEqual(k === 0 ? 0 : flows.cumulativeExpected[k - 1]!)
        })
      }),
      { numRuns: 60 },
    )
  })

  it('have cumulative variances that are yearly variances and covariances together', () => {
    fc.assert(
      fc.property(anyGroups(anyYear), (groups) => {
        const short = { ...conventions, horizonYears: 5 }
        const flows = standingFlows(groups, short)
        const chances = standingChancesOfGroups(groups, short)
        let sum = 0
        for (let j = 1; j <= 5; j++) for (let k = 1; k <= 5; k++) sum += flowCovariance(groups, chances, j, k)
        const scale = total(groups.map(({ amount, buildingCount }) => amount ** 2 / buildingCount))
        expect(Math.abs(sum - flows.cumulativeVariance[4]!)).toBeLessThanOrEqual(1e-9 * Math.max(scale, 1))
      }),
      { numRuns: 40 },
    )
  })

  it('do not depend on the order of the buildings, double with the areas, and add up over districts', () => {
    fc.assert(
      fc.property(anyGroups(anyYear), anyGroups(anyRange), (one, other) => {
        const close = (a: Float64Array, b: Float64Array) =>
          a.forEach((value, k) => expect(Math.abs(value - b[k]!)).toBeLessThanOrEqual(1e-9 * Math.max(1, value)))
        const [here, there] = [standingFlows(one, conventions), standingFlows(other, conventions)]
        const both = standingFlows([...one, ...other], conventions)
        close(
          both.expected,
          here.expected.map((value, k) => value + there.expected[k]!),
        )
        close(
          both.variance,
          here.variance.map((value, k) => value + there.variance[k]!),
        )
        close(standingFlows([...one].reverse(), conventions).expected, here.expected)
        const doubled = standingFlows(
          one.map((group) => ({ ...group, amount: 2 * group.amount })),
          conventions,
        )
        close(
          doubled.expected,
          here.expected.map((value) => 2 * value),
        )
        close(
          doubled.variance,
          here.variance.map((value) => 4 * value),
        )
      }),
      { numRuns: 30 },
    )
  })

  it('are those of its buildings one by one, for a group of equal buildings', () => {
    const group = { lifetime: weibull, constructionYear: 1960, amount: 5000, buildingCount: 10 }
    const alone = Array.from({ length: 10 }, () => ({ ...group, amount: 500, buildingCount: 1 }))
    const [grouped, single] = [standingFlows([group], conventions), standingFlows(alone, conventions)]
    expect(grouped.expected[7]).toBeCloseTo(single.expected[7]!, 9)
    expect(grouped.variance[7]).toBeCloseTo(single.variance[7]!, 6)
  })

  it('count overdue buildings and let them go first', () => {
    const fixed: Lifetime = { model: 'fixed', lifetimeYears: 60 }
    const flows = standingFlows(
      [
        { lifetime: fixed, constructionYear: 1900, amount: 300, buildingCount: 3 },
        { lifetime: fixed, constructionYear: 2000, amount: 50, buildingCount: 1 },
      ],
      conventions,
    )
    expect(flows).toMatchObject({ overdueBuildingCount: 3, overdueAmount: 300, remaining: 50 })
    expect(flows.expected[0]).toBe(300)
  })

  it('are refused without buildings, with a negative area or a year after the survey', () => {
    const group = { lifetime: weibull, constructionYear: 1960, amount: 100, buildingCount: 1 }
    expect(() => standingFlows([{ ...group, buildingCount: 0 }], conventions)).toThrow('parameter-not-positive')
    expect(() => standingFlows([{ ...group, amount: NaN }], conventions)).toThrow('negative-amount')
    expect(() => standingFlows([{ ...group, constructionYear: 2026 }], conventions)).toThrow('negative-age')
    expect(() => standingFlows([{ ...group, constructionYear: NaN }], conventions)).toThrow('not-a-number')
  })
})

describe('an uncertain construction year', () => {
  const chancesOf = (constructionYear: ConstructionYear, lifetime: Lifetime = weibull) =>
    standingChancesOfGroups([{ lifetime, constructionYear, amount: 1, buildingCount: 1 }], conventions)[0]!

  it('of one year is that year, by either rule', () => {
    for (const rule of ['judgement', 'register', 'midpoint'] as const) {
      expect(chancesOf({ yearFrom: 1950, yearTo: 1950, rule }).chances).toEqual(chancesOf(1950).chances)
    }
  })

  it('counts older years less when the range is a register class', () => {
    const judged = chancesOf({ yearFrom: 1900, yearTo: 1970, rule: 'judgement' })
    const registered = chancesOf({ yearFrom: 1900, yearTo: 1970, rule: 'register' })
    expect(registered.remaining).toBeGreaterThan(judged.remaining)
  })

  it('leaves only years that could have lasted, when the range is a register class and the life is fixed', () => {
    const range = { yearFrom: 1960, yearTo: 1970, rule: 'register' } as const
    expect(chancesOf(range, { model: 'fixed', lifetimeYears: 60 }).overdueShare).toBe(0)
    const allOverdue = { yearFrom: 1900, yearTo: 1920, rule: 'register' } as const
    expect(chancesOf(allOverdue, { model: 'fixed', lifetimeYears: 60 }).overdueShare).toBeCloseTo(1, 12)
  })

  it('may weigh years of its own', () => {
    const { remaining } = chancesOf({
      possibleYears: [
        { year: 1950, weight: 0.25 },
        { year: 1990, weight: 0.75 },
      ],
    })
    expect(remaining).toBeCloseTo(0.25 * chancesOf(1950).remaining + 0.75 * chancesOf(1990).remaining, 12)
  })

  it.each([
    ['interval-open', { yearFrom: null, yearTo: 1919, rule: 'judgement' }],
    ['interval-reversed', { yearFrom: 1970, yearTo: 1950, rule: 'judgement' }],
    ['interval-reversed', { yearFrom: NaN, yearTo: 1950, rule: 'judgement' }],
    ['parameter-out-of-range', { yearFrom: 1950, yearTo: 1955, rule: 'midpoint' }],
    ['empty-input', { possibleYears: [] }],
    ['share-out-of-range', { possibleYears: [{ year: 1950, weight: 0.5 }] }],
  ] as const)('is refused: %s', (code, constructionYear) => {
    expect(() => chancesOf(constructionYear)).toThrow(code)
  })
})

describe('a permit', () => {
  it('adds up to 1 with what remains, wherever its year lies', () => {
    const share = fc.double({ min: 0, max: 1, noNaN: true })
    fc.assert(
      fc.property(anyLifetime(), anyAge, fc.integer({ min: 1, max: 60 }), share, (lifetime, age, inYear, q) => {
        const permitted = withPermit(comingDownChances(lifetime, age, 30), { inYear, executionProbability: q })
        expect(Math.abs(total(permitted.chances) + permitted.remaining - 1)).toBeLessThan(1e-12)
      }),
    )
  })

  it('is refused with a chance above 1 or a year before the first', () => {
    const ordinary = comingDownChances(weibull, 50, 5)
    expect(() => withPermit(ordinary, { inYear: 1, executionProbability: 1.2 })).toThrow('share-out-of-range')
    expect(() => withPermit(ordinary, { inYear: 0, executionProbability: 1 })).toThrow('parameter-not-positive')
  })
})

describe('multipliers', () => {
  it('are held within their bounds and say so', () => {
    expect(combinedMultiplier([0.25, 0.7])).toEqual({ product: 0.175, applied: 0.2, isClamped: true })
    expect(combinedMultiplier([])).toEqual({ product: 1, applied: 1, isClamped: false })
    expect(() => combinedMultiplier([1, NaN])).toThrow('parameter-not-positive')
    expect(() => combinedMultiplier([1], { least: 2, most: 1 })).toThrow('interval-reversed')
  })

  it('that are all alike change nothing once they are re-centred', () => {
    expect(recentredMultipliers([1.6, 1.6, 1.6])).toEqual([1, 1, 1])
    expect(recentredMultipliers([1, 4], [3, 1])).toEqual([4 / 7, 16 / 7])
    expect(() => recentredMultipliers([1, 2], [1])).toThrow('length-mismatch')
    expect(() => recentredMultipliers([])).toThrow('empty-input')
  })
})

describe('the number of demolitions', () => {
  const chances = fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { maxLength: 300, size: 'max' })

  it('has probabilities that add up to 1 and the mean and variance of its trials', () => {
    fc.assert(
      fc.property(chances, (list) => {
        const { probabilities, mean, variance, noneProbability } = poissonBinomial(list)
        const counted = probabilities.reduce((sum, chance, count) => sum + chance * count, 0)
        const spread = probabilities.reduce((sum, chance, count) => sum + chance * (count - mean) ** 2, 0)
        expect(Math.abs(total(probabilities) - 1)).toBeLessThan(1e-12)
        expect(Math.abs(counted - mean)).toBeLessThan(1e-9)
        expect(Math.abs(spread - variance)).toBeLessThan(1e-8)
        expect(Math.abs(noneProbability - probabilities[0]!)).toBeLessThan(1e-12)
      }),
      { numRuns: 60 },
    )
  })

  // measured against the exact distribution: 0.0042 for 6 expected demolitions, 0.0019 for 13, 0.0009 for 26
  it('is within 0.002 of the exact one beyond 2 000 buildings', () => {
    const list = Array.from({ length: 2000 }, (_, index) => 0.005 + 0.02 * ((index * 37) % 100) * 0.01)
    const exact = poissonBinomial(list)
    const near = poissonBinomial([...list, 0])
    expect([exact.isExact, near.isExact]).toEqual([true, false])
    let [exactSoFar, nearSoFar, worst] = [0, 0, 0]
    exact.probabilities.forEach((chance, count) => {
      exactSoFar += chance
      nearSoFar += near.probabilities[count]!
      worst = Math.max(worst, Math.abs(exactSoFar - nearSoFar))
    })
    expect(worst).toBeLessThan(0.002)
    expect(total(near.probabilities)).toBeCloseTo(1, 12)
    expect(near.noneProbability).toBe(exact.noneProbability)
  })

  it('has the smallest count that reaches a share as its quantile', () => {
    expect([0.1, 0.25, 0.26, 0.9].map((p) => countQuantile([0.25, 0.5, 0.25], p))).toEqual([0, 0, 1, 2])
    expect(() => countQuantile([1], 1)).toThrow('share-out-of-range')
    expect(() => poissonBinomial([0.5, 1.1])).toThrow('share-out-of-range')
    expect(() => poissonBinomial([NaN])).toThrow('share-out-of-range')
  })
})

it('calls a lifetime implausible that would take down one building in forty a year', () => {
  expect(impliedDemolitionRate(5, 1000).isPlausible).toBe(true)
  expect(impliedDemolitionRate(25, 1000).isPlausible).toBe(false)
  expect(() => impliedDemolitionRate(1, 0)).toThrow('parameter-not-positive')
})
