import { describe, expect, it } from 'vitest'
import { comingDownDraw } from './comingDownDraw'
import { groupMoments } from './groupMoments'
import { lognormalBand } from './lognormalBand'
import { lognormalFromMean } from './lognormalFromMean'
import type { MassGroup } from './massGroup.types'
import { monteCarloBand } from './monteCarloBand'
import { seededRandom } from './seededRandom'
import { varianceByCause } from './varianceByCause'

const TRIALS = 20_000

/** Fifty groups of a hundred buildings, five sets of eight factors, four lives. */
function largeDistrict(kind: 'stock' | 'flow', leastChance = 0.02, span = 0.2): MassGroup[] {
  const random = seededRandom(11)
  return Array.from({ length: 50 }, (_, g): MassGroup => {
    const areasM2 = Float64Array.from({ length: 100 }, () => 80 + 900 * random.uniform() ** 2)
    const chances = Float64Array.from({ length: 100 }, () => leastChance + span * random.uniform())
    const chancesAt = (z: number) => chances.map((chance) => Math.min(1, chance * Math.exp(-0.3 * z)))
    const factors = Array.from({ length: 8 }, (_unused, material) => ({
      factorId: `${g % 5}/${material}`,
      meanKgPerM2: 50 + 40 * material,
      sharedCv: 0.25,
    }))
    const group = { factors, areasM2, areaCv: 0.15, betweenBuildingsCv: 0.3 }
    return kind === 'stock' ? group : { ...group, comingDown: { lifeId: `life ${g % 4}`, chancesAt } }
  })
}

const within = (got: number, expected: number, rel: number) => Math.abs(got - expected) <= rel * Math.abs(expected)

describe('monteCarloBand', () => {
  it.each(['stock', 'flow'] as const)('agrees with the analytic band of a %s within 2 %%', (kind) => {
    const groups = largeDistrict(kind)
    const analytic = varianceByCause(groups)
    const band = lognormalBand(lognormalFromMean(analytic.meanKg, analytic.cv))
    const drawn = monteCarloBand(groups, TRIALS, 1)

    expect(within(drawn.meanKg, analytic.meanKg, 0.01)).toBe(true)
    expect(within(drawn.sdKg, analytic.sdKg, 0.02)).toBe(true)
    expect(within(drawn.p10Kg, band.p10, 0.02)).toBe(true)
    expect(within(drawn.p50Kg, band.p50, 0.02)).toBe(true)
    expect(within(drawn.p90Kg, band.p90, 0.02)).toBe(true)
  })

  it('draws 20 000 trials of 5 000 buildings in little time', () => {
    for (const [kind, leastChance, span] of [
      ['stock', 0, 0],
      ['flow', 0.005, 0.01],
      ['flow', 0.1, 0.4],
    ] as const) {
      const groups = largeDistrict(kind, leastChance, span)
      const before = process.cpuUsage()
      monteCarloBand(groups, TRIALS, 1)
      const { user, system } = process.cpuUsage(before)
      console.info(
        `20 000 trials of 5 000 buildings, ${kind} from ${leastChance}: ${((user + system) / 1e6).toFixed(2)} s`,
      )

      // the aim is 2 s; the bound leaves room for a machine that does other things as well
      expect((user + system) / 1e6).toBeLessThan(6)
    }
  })

  it('gives the same band for the same seed, another for the next, and percentiles in order', () => {
    const groups = largeDistrict('stock')
    const [one, again, other] = [5, 5, 6].map((seed) => monteCarloBand(groups, 2000, seed))

    expect(one).toEqual(again)
    expect(other!.p50Kg).not.toBe(one!.p50Kg)
    expect(one!.p10Kg).toBeLessThanOrEqual(one!.p50Kg)
    expect(one!.p50Kg).toBeLessThanOrEqual(one!.p90Kg)
  })

  it('doubles with the areas to the last digit', () => {
    const groups = largeDistrict('flow').slice(0, 4)
    const doubled = groups.map((group) => ({ ...group, areasM2: Float64Array.from(group.areasM2, (a) => 2 * a) }))

    expect(monteCarloBand(doubled, 2000, 9).p90Kg).toBeCloseTo(2 * monteCarloBand(groups, 2000, 9).p90Kg, 6)
  })

  it('keeps a shared factor shared: two halves of a district are as doubtful as the whole', () => {
    const [first] = largeDistrict('stock')
    const certain = { ...first!, areaCv: 0, betweenBuildingsCv: 0 }
    const half = { ...certain, areasM2: Float64Array.from(certain.areasM2, (a) => a / 2) }
    const [whole, halves] = [[certain], [half, half]].map((groups) => monteCarloBand(groups, 2000, 3))

    expect(halves!.sdKg).toBeCloseTo(whole!.sdKg, 3)
  })

  it('refuses less than two trials and what the analytic way refuses', () => {
    const group: MassGroup = { factors: [], areasM2: [1], areaCv: 0, comingDown: [2] }

    expect(() => monteCarloBand([], 1, 1)).toThrow('parameter-out-of-range')
    expect(() => monteCarloBand([group], 10, 1)).toThrow('share-out-of-range')
    expect(() => monteCarloBand([{ ...group, areasM2: [-1] }], 10, 1)).toThrow('negative-area')
  })
})

describe('comingDownDraw', () => {
  /** Every building by itself, errors and all: what the draws stand for. */
  function drawnOneByOne({ areasM2 }: MassGroup, chances: readonly number[], logSd: number, trials: number) {
    const random = seededRandom(99)
    return Float64Array.from({ length: trials }, () => {
      let area = 0
      for (let i = 0; i < areasM2.length; i++)
        if (random.uniform() < chances[i]!) area += areasM2[i]! * Math.exp(logSd * random.normal() - logSd ** 2 / 2)
      return area
    }).sort()
  }

  it.each([
    ['a few buildings of middling chances', 6, 0.3, 0.2],
    ['many buildings of small chances', 200, 0.01, 0.005],
    ['many buildings of middling chances', 150, 0.25, 0.1],
  ])('has the distribution of buildings drawn one by one: %s', (_name, count, chance, spread) => {
    const shape = seededRandom(count)
    const areasM2 = Array.from({ length: count }, () => 80 + 900 * shape.uniform() ** 2)
    const chances = areasM2.map(() => chance + spread * (shape.uniform() - 0.5))
    const group: MassGroup = { factors: [], areasM2, areaCv: 0.2, comingDown: chances }
    const draw = comingDownDraw(group)
    const random = seededRandom(4)

    const drawn = Float64Array.from({ length: 60_000 }, () => draw(0, random)).sort()
    const expected = drawnOneByOne(group, chances, Math.sqrt(Math.log1p(0.04)), 60_000)
    const { meanM2, sdM2 } = groupMoments(group, chances)

    expect(Math.abs(drawn.reduce((all, m2) => all + m2, 0) / drawn.length - meanM2)).toBeLessThan(sdM2 / 50)
    for (const place of [0.1, 0.25, 0.5, 0.75, 0.9].map((p) => Math.floor(p * drawn.length)))
      expect(Math.abs(drawn[place]! - expected[place]!)).toBeLessThan(0.04 * sdM2)
  })

  it('draws nothing where nothing comes down, and all where all does', () => {
    const group: MassGroup = { factors: [], areasM2: [100, 60], areaCv: 0 }
    const random = seededRandom(1)

    expect(comingDownDraw({ ...group, comingDown: [0, 0] })(0, random)).toBe(0)
    expect(comingDownDraw({ ...group, comingDown: [1, 1] })(0, random)).toBe(160)
  })
})
