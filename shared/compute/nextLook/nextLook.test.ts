import { expect, describe, it } from 'vitest'
import type { LifetimeFigure } from '@/shared/compute/run/resolveArchetype'
import { bandAfterLooks } from './bandAfterLooks'
import { districtDoubt } from './districtDoubt'
import { expectedFall } from './expectedFall'
import { floorAreaPrior } from './floorAreaPrior'
import { nextLook } from './nextLook'
import type { DoubtfulBuilding, WeighedKind } from './nextLook.types'
import { possibleKinds } from './possibleKinds'

interface KindOrder {
  readonly weight: number
  readonly content: Readonly<Record<string, number>>
  readonly chance?: number
  readonly year?: number
  readonly structure?: WeighedKind['structure']
}

/** Relative error of every factor of the small town. */
const FACTOR_CV = 0.3

function kind({ weight, content, chance = 1, year = 1950, structure = 'hybrid' }: KindOrder): WeighedKind {
  const contents = Object.entries(content)
  return {
    weight,
    use: 'office',
    structure,
    constructionYear: year,
    figure: {
      contentKgPerM2: contents.reduce((sum, [, kg]) => sum + kg, 0),
      factors: contents.map(([factorId, kg]) => ({ factorId, sdKgPerM2: kg * FACTOR_CV })),
      betweenVariance: 0,
      chance,
      chanceIfShorter: chance,
      chanceIfLonger: chance,
      lifetimeId: null,
    },
  }
}
const contentsOf = new Map<WeighedKind, Readonly<Record<string, number>>>()
function tracked(order: KindOrder): WeighedKind {
  const made = kind(order)
  contentsOf.set(made, order.content)
  return made
}

/** Three buildings, two shared factors, chances to come down: small enough to write out every state of the world. */
const town: readonly DoubtfulBuilding[] = [
  {
    buildingId: 'known kind, area by eye',
    floorAreaM2: 300,
    floorAreaCv: 0.25,
    floorAreaCvAfter: 0.06,
    kinds: [tracked({ weight: 1, content: { timber: 70, brick: 400 }, chance: 0.4 })],
  },
  {
    buildingId: 'structure not known',
    floorAreaM2: 500,
    floorAreaCv: 0.06,
    floorAreaCvAfter: 0.06,
    kinds: [
      tracked({ weight: 0.7, content: { brick: 900 }, chance: 0.2, structure: 'masonry-timber-floors' }),
      tracked({ weight: 0.3, content: { timber: 120 }, chance: 0.5, structure: 'timber-frame' }),
    ],
  },
  {
    buildingId: 'nothing known',
    floorAreaM2: 200,
    floorAreaCv: 0.4,
    floorAreaCvAfter: 0.1,
    kinds: [
      tracked({ weight: 0.5, content: { brick: 600, timber: 30 }, chance: 0.1, year: 1990 }),
      tracked({ weight: 0.2, content: { brick: 600, timber: 30 }, chance: 0.6, year: 1900 }),
      tracked({ weight: 0.3, content: { timber: 90 }, chance: 0.9, year: 1900, structure: 'timber-frame' }),
    ],
  },
]

interface Outcome {
  readonly probability: number
  readonly massByFactor: Readonly<Record<string, number>>
  /** What a look would have shown. */
  readonly answer: string
}

/** Every state of one building: what a look settles (U, kind), what it does not (E, coming down). Two points a quantity. */
function outcomesOf({ floorAreaM2, floorAreaCv, floorAreaCvAfter, kinds }: DoubtfulBuilding): Outcome[] {
  const settledSd = Math.sqrt((1 + floorAreaCv ** 2) / (1 + floorAreaCvAfter ** 2) - 1)
  return kinds.flatMap((one) =>
    [-1, 1].flatMap((u) =>
      [-1, 1].flatMap((e) =>
        [0, 1].map((comesDown): Outcome => {
          const areaM2 = floorAreaM2 * (1 + u * settledSd) * (1 + e * floorAreaCvAfter) * comesDown
          const { chance } = one.figure
          const content = Object.entries(contentsOf.get(one)!).map(([id, kg]) => [id, kg * areaM2] as const)
          return {
            probability: one.weight * 0.25 * (comesDown ? chance : 1 - chance),
            massByFactor: Object.fromEntries(content),
            answer: `${kinds.indexOf(one)}|${u}`,
          }
        }),
      ),
    ),
  )
}

/** Mean and variance of the total over all states, factors at one standard error either way. */
function exhaustive(outcomes: readonly (readonly Outcome[])[]): { mean: number; variance: number } {
  let [first, second] = [0, 0]
  const walk = (place: number, probability: number, timber: number, brick: number): void => {
    if (place === outcomes.length) {
      for (const t of [1 - FACTOR_CV, 1 + FACTOR_CV]) {
        for (const b of [1 - FACTOR_CV, 1 + FACTOR_CV]) {
          const total = timber * t + brick * b
          first += (probability / 4) * total
          second += (probability / 4) * total ** 2
        }
      }
      return
    }
    for (const { probability: own, massByFactor } of outcomes[place]!)
      walk(place + 1, probability * own, timber + (massByFactor['timber'] ?? 0), brick + (massByFactor['brick'] ?? 0))
  }
  walk(0, 1, 0, 0)
  return { mean: first, variance: second - first ** 2 }
}

/** Σ over the answers of P(answer) · Var(T | answer): the long way to the expected fall. */
function varianceAfterLook(place: number): number {
  const all = town.map(outcomesOf)
  const own = all[place]!
  let expected = 0
  for (const answer of new Set(own.map((outcome) => outcome.answer))) {
    const given = own.filter((outcome) => outcome.answer === answer)
    const probability = given.reduce((sum, outcome) => sum + outcome.probability, 0)
    const conditional = given.map((outcome) => ({ ...outcome, probability: outcome.probability / probability }))
    expected += probability * exhaustive(all.map((list, index) => (index === place ? conditional : list))).variance
  }
  return expected
}

describe('where to look next', () => {
  const whole = exhaustive(town.map(outcomesOf))

  it('finds mean and variance of the district as the list of all states of the world gives them', () => {
    const { meanKg, varianceByCauseKg2: cause } = districtDoubt(town)

    expect(Math.abs(meanKg / whole.mean - 1)).toBeLessThan(1e-12)
    const variance = cause.measurement + cause.factor + cause.lifetime + cause.chance
    expect(Math.abs(variance / whole.variance - 1)).toBeLessThan(1e-12)
  })

  it.each(town.map(({ buildingId }, place) => [buildingId, place] as const))(
    'expects the fall that the list of all answers gives: %s',
    (_, place) => {
      const long = whole.variance - varianceAfterLook(place)

      expect(Math.abs(expectedFall(town[place]!).wholeKg2 - long)).toBeLessThan(1e-9 * whole.variance)
    },
  )

  it('lets looks at two buildings add up, and never promises more than there is', () => {
    const falls = town.map((building) => expectedFall(building).wholeKg2)

    expect(falls.reduce((sum, fall) => sum + fall, 0)).toBeLessThan(whole.variance)
    expect(bandAfterLooks(whole.mean, whole.variance, falls, 3).p90Kg).toBeLessThan(
      bandAfterLooks(whole.mean, whole.variance, falls, 0).p90Kg,
    )
  })

  it('considers each attribute apart: none says more than all of them together', () => {
    for (const building of town) {
      const { wholeKg2, byAttributeKg2 } = expectedFall(building)
      for (const part of Object.values(byAttributeKg2)) expect(part).toBeLessThanOrEqual(wholeKg2 * (1 + 1e-12))
    }
    const [byEye, noStructure] = town.map((building) => expectedFall(building).byAttributeKg2)
    expect(byEye!.constructionYear).toBe(0)
    expect(byEye!.floorArea).toBeGreaterThan(0)
    expect(noStructure!.structure).toBeGreaterThan(0)
    expect(noStructure!.floorArea).toBe(0)
  })

  it('leaves the shared error of a factor as it is', () => {
    const surer = (building: DoubtfulBuilding) => ({
      ...building,
      kinds: building.kinds.map((one) => ({ ...one, figure: { ...one.figure, factors: [] } })),
    })
    for (const building of town) expect(expectedFall(surer(building))).toEqual(expectedFall(building))
  })

  it('refuses weights that do not add up, no kind and no area', () => {
    const [first] = town
    const faulty = (change: Partial<DoubtfulBuilding>) => () => expectedFall({ ...first!, ...change })

    expect(faulty({ kinds: [] })).toThrow(/empty-input/)
    expect(faulty({ kinds: [kind({ weight: 0.4, content: {} })] })).toThrow(/share-out-of-range/)
    expect(faulty({ floorAreaM2: 0 })).toThrow(/negative-area/)
  })
})

describe('what a building may be', () => {
  const sightings = [
    { use: 'office', structure: 'steel-frame', constructionYear: 1985, count: 4 },
    { use: 'office', structure: 'reinforced-concrete', constructionYear: 1970, count: 4 },
    { use: 'terraced', structure: 'timber-frame', constructionYear: 1900, count: 8 },
  ] as const
  const nothing = { use: null, structure: null, yearFrom: null, yearTo: null }

  it('is as the recorded buildings that agree in what is known', () => {
    const kinds = possibleKinds({ ...nothing, use: 'office' }, sightings, 2026)

    expect(kinds.map(({ structure, weight }) => [structure, weight])).toEqual([
      ['steel-frame', 0.5],
      ['reinforced-concrete', 0.5],
    ])
  })

  it('gives way where fewer than five agree, and keeps what is known', () => {
    const kinds = possibleKinds({ ...nothing, use: 'hotel', yearFrom: 1985, yearTo: 1985 }, sightings, 2026)

    expect(kinds.every(({ use, constructionYear }) => use === 'hotel' && constructionYear === 1985)).toBe(true)
    expect(kinds.reduce((sum, { weight }) => sum + weight, 0)).toBeCloseTo(1, 12)
    expect(kinds).toHaveLength(3)
  })

  it('may be of any of the last 120 years in a district of which nothing is known', () => {
    expect(possibleKinds(nothing, [], 2026)).toHaveLength(24)
  })

  it('takes its floor area from footprint, register and the ratios of the recorded', () => {
    const recorded = Array.from({ length: 6 }, (_, index) => ({
      use: 'office' as const,
      footprintM2: 100,
      registerStoreys: 4,
      grossFloorAreaM2: index % 2 ? 380 : 420,
    }))
    const { floorAreaM2, floorAreaCv } = floorAreaPrior(recorded)({
      use: 'office',
      footprintM2: 200,
      registerStoreys: 2,
    })

    expect(floorAreaM2).toBeCloseTo(400, 9)
    expect(floorAreaCv).toBe(0.065)
    expect(floorAreaPrior(recorded)({ use: 'hotel', footprintM2: 10, registerStoreys: null }).floorAreaM2).toBeCloseTo(
      40,
      9,
    )
  })
})

describe('the list', () => {
  const lifetimes: LifetimeFigure[] = [
    {
      rowId: 'life',
      use: 'all',
      structure: 'all',
      component: 'building',
      model: 'weibull',
      meanYears: 120,
      sdYears: 50,
      sharedCv: 0.2,
    },
  ]
  const figureOf = (structure: 'timber-frame' | 'reinforced-concrete', kg: number) => ({
    rowId: structure,
    figureId: structure,
    use: 'all' as const,
    structure,
    period: 'all',
    material: 'timber' as const,
    component: 'whole' as const,
    areaBasis: 'GFA' as const,
    meanKgPerM2: kg,
    medianKgPerM2: null,
    gsdBetweenBuildings: null,
    sharedCv: 0.3,
    sampleCount: 9,
    source: 'a test',
    provenance: 'published' as const,
  })
  const sightings = (['timber-frame', 'reinforced-concrete'] as const).flatMap((structure) =>
    [1890, 1930, 1970, 2010].map((constructionYear) => ({
      use: 'office' as const,
      structure,
      constructionYear,
      count: 3,
    })),
  )
  const seen = {
    hazardMultiplier: 1,
    floorAreaM2: 900,
    floorAreaCv: 0.065,
    floorAreaCvAfter: 0.065,
    known: { use: 'office', structure: 'timber-frame', yearFrom: 1900, yearTo: 1900 },
  } as const
  const buildings = [
    { ...seen, buildingId: 'recorded' },
    { ...seen, buildingId: 'large, year', known: { ...seen.known, yearFrom: null, yearTo: null } },
    { ...seen, buildingId: 'small, year', floorAreaM2: 90, known: { ...seen.known, yearFrom: null, yearTo: null } },
    { ...seen, buildingId: 'structure', floorAreaM2: 200, known: { ...seen.known, structure: null } },
  ]
  const looksFor = (byYear: number | null) =>
    nextLook({
      figure: { material: 'timber', byYear },
      buildings,
      sightings,
      book: { intensities: [figureOf('timber-frame', 90), figureOf('reinforced-concrete', 20)], lifetimes },
      conventions: { surveyYear: 2026, yearOffset: 0.5 },
    })

  it('names what is not known and whether the building is large; what is recorded is not on it', () => {
    expect(looksFor(2040).looks.map(({ buildingId, reason }) => [buildingId, reason.narrows, reason.isLarge])).toEqual([
      ['large, year', 'constructionYear', true],
      ['structure', 'structure', false],
      ['small, year', 'constructionYear', false],
    ])
  })

  it('answers to the figure: the year says nothing of what stands today where factors do not differ by it', () => {
    expect(looksFor(null).looks.map(({ buildingId }) => buildingId)).toEqual(['structure'])
  })

  it('adds up to less than the doubt there is', () => {
    const { looks, varianceKg2, doubt } = looksFor(2040)

    expect(looks.reduce((sum, { fallShare }) => sum + fallShare, 0)).toBeLessThan(1)
    expect(varianceKg2).toBeGreaterThan(doubt.varianceByCauseKg2.factor)
    expect(doubt.varianceByCauseKg2.lifetime).toBeGreaterThan(0)
  })
})
