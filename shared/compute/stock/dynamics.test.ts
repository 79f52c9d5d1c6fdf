import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'
import { tabulateSurvival } from '@/shared/compute/lifetime/tabulateSurvival'
import { anyLifetime } from '@/tests/support/anyLifetime'
import { cascade } from './cascade'
import { fixedLifetimeGrowth } from './fixedLifetimeGrowth'
import { fixedLifetimeInflow } from './fixedLifetimeInflow'
import { inflowDrivenStock } from './inflowDrivenStock'
import { landfillLeaching } from './landfillLeaching'
import { massBalance } from './massBalance'
import { obsoleteStock } from './obsoleteStock'
import { standingFlows } from './standingFlows'
import { stationaryYear } from './stationaryYear'
import { stockDrivenInflow } from './stockDrivenInflow'
import { stockIndicators } from './stockIndicators'
import { unconstrainedInflow } from './unconstrainedInflow'

const weibull: Lifetime = { model: 'weibull', shape: 3.059114961, scaleYears: 78.32083206 }
const masses = fc.array(fc.double({ min: 0, max: 1e9, noNaN: true }), { minLength: 1, maxLength: 80, size: 'max' })
const share = fc.double({ min: 0, max: 1, noNaN: true })
const offset = fc.constantFrom(0, 0.5, 1)
const total = (values: Iterable<number>) => [...values].reduce((sum, value) => sum + value, 0)
/** Something survives its construction year: shorter lives cannot fill a stock. */
const lasting = anyLifetime().filter((lifetime) => lifetime.model !== 'fixed' || lifetime.lifetimeYears > 6)

describe('an inflow-driven stock', () => {
  it('keeps the balance to 1e-9 in every year', () => {
    fc.assert(
      fc.property(masses, anyLifetime(), offset, (inflow, lifetime, o) => {
        const { stock, outflow } = inflowDrivenStock(inflow, tabulateSurvival(lifetime, o, inflow.length).survival)
        expect(massBalance([{ process: 'use', inflow, outflow, stock }])).toHaveLength(inflow.length)
      }),
    )
  })

  it('is refused with too short a table or an inflow that is no number', () => {
    expect(() => inflowDrivenStock([1, 2], Float64Array.of(1))).toThrow('length-mismatch')
    expect(() => inflowDrivenStock([NaN], Float64Array.of(1))).toThrow('not-a-number')
  })
})

describe('a stock-driven inflow', () => {
  const opening = fc.array(
    fc.record({ sinceYears: fc.integer({ min: 0, max: 150 }), amount: fc.double({ min: 0, max: 1e8, noNaN: true }) }),
    { maxLength: 60, size: 'max' },
  )

  it('keeps the balance to 1e-9 in every year, with extra demolition where the stock falls fast', () => {
    const rule = fc.constantFrom('oldest-first', 'proportional')
    fc.assert(
      fc.property(masses, opening, lasting, offset, rule, (stock, cohorts, lifetime, o, extraDemolitionRule) => {
        const table = tabulateSurvival(lifetime, o, 151 + stock.length)
        const course = stockDrivenInflow({ stock, table, opening: cohorts, extraDemolitionRule })
        const outflow = course.outflow.map((mass, year) => mass + course.extraDemolition[year]!)
        const { inflow, openingStock } = course
        expect(massBalance([{ process: 'use', inflow, outflow, stock, openingStock }])).toHaveLength(stock.length)
        for (const year of inflow.keys()) {
          expect(inflow[year]! >= 0 && course.extraDemolition[year]! >= 0).toBe(true)
          expect(inflow[year]! * course.extraDemolition[year]!).toBe(0)
        }
      }),
    )
  })

  it('is the unconstrained one as long as nothing has to be taken down', () => {
    const stock = Array.from({ length: 120 }, (_, year) => 1000 * 1.02 ** year)
    const table = tabulateSurvival(weibull, 0.5, 121)
    const course = stockDrivenInflow({ stock, table })
    const free = unconstrainedInflow(stock, table.survival)
    free.inflow.forEach((mass, year) => expect(Math.abs(mass - course.inflow[year]!)).toBeLessThan(1e-6))
    expect(total(course.extraDemolition)).toBe(0)
  })

  it('lets an opening stock leave by its ages, as the standing buildings do', () => {
    const surveyed = [
      { year: 1950, amount: 4000 },
      { year: 1985, amount: 6000 },
    ]
    const flows = standingFlows(
      surveyed.map(({ year, amount }) => ({ lifetime: weibull, constructionYear: year, amount, buildingCount: 1 })),
      { surveyYear: 2025, horizonYears: 20, yearOffset: 0.5 },
    )
    const course = stockDrivenInflow({
      stock: flows.cumulativeExpected.map((gone) => 10000 - gone),
      table: tabulateSurvival(weibull, 0.5, 100),
      opening: surveyed.map(({ year, amount }) => ({ sinceYears: 2025 - year, amount })),
    })
    course.outflow.forEach((mass, k) => expect(mass).toBeCloseTo(flows.expected[k]!, 6))
    expect(total(course.inflow) + total(course.extraDemolition)).toBeLessThan(1e-6)
  })

  it('takes the oldest first or all alike, as it is told', () => {
    const inputs = {
      stock: [60, 60],
      table: tabulateSurvival({ model: 'fixed', lifetimeYears: 50 }, 0, 60),
      opening: [
        { sinceYears: 10, amount: 40 },
        { sinceYears: 48, amount: 60 },
      ],
    }
    // in the second year the 48-year-old part would have left by itself: what of it was taken down needs no replacement
    expect([...stockDrivenInflow({ ...inputs, extraDemolitionRule: 'oldest-first' }).inflow]).toEqual([0, 20])
    const alike = stockDrivenInflow({ ...inputs, extraDemolitionRule: 'proportional' })
    expect(alike.extraDemolition[0]).toBeCloseTo(40, 12)
    expect(alike.inflow[1]).toBeCloseTo(36, 12)
  })

  it('lets overdue opening cohorts go in the first year', () => {
    const course = stockDrivenInflow({
      stock: [100],
      table: tabulateSurvival({ model: 'fixed', lifetimeYears: 50 }, 0, 100),
      opening: [{ sinceYears: 70, amount: 100 }],
    })
    expect([course.outflow[0], course.inflow[0]]).toEqual([100, 100])
  })

  it('is refused when nothing survives its year, the stock is negative or the table too short', () => {
    const table = tabulateSurvival({ model: 'fixed', lifetimeYears: 1 }, 1, 5)
    expect(() => stockDrivenInflow({ stock: [1], table })).toThrow('parameter-not-positive')
    const proper = tabulateSurvival(weibull, 0.5, 5)
    expect(() => stockDrivenInflow({ stock: [-1], table: proper })).toThrow('negative-amount')
    expect(() => stockDrivenInflow({ stock: [NaN], table: proper })).toThrow('negative-amount')
    expect(() => stockDrivenInflow({ stock: [1, 1], table: proper, opening: [{ sinceYears: 4, amount: 1 }] })).toThrow(
      'length-mismatch',
    )
  })

  it('of a fixed life follows the difference equation', () => {
    const stock = Array.from({ length: 60 }, (_, year) => 1000 * 1.02 ** year)
    const fixed = fixedLifetimeInflow(stock, 20)
    const { survival } = tabulateSurvival({ model: 'fixed', lifetimeYears: 20 }, 0, 60)
    const free = unconstrainedInflow(stock, survival)
    free.inflow.forEach((mass, year) => expect(mass).toBeCloseTo(fixed.inflow[year]!, 6))
  })
})

describe('a steadily growing stock', () => {
  it('has the ratios of its own run', () => {
    const { outflowToInflow, inflowToStock } = fixedLifetimeGrowth(0.03, 40)
    const inflow = Array.from({ length: 120 }, (_, year) => 1.03 ** year)
    const { survival } = tabulateSurvival({ model: 'fixed', lifetimeYears: 40 }, 0, 120)
    const { stock, outflow } = inflowDrivenStock(inflow, survival)
    expect(outflow[119]! / inflow[119]!).toBeCloseTo(outflowToInflow, 12)
    expect(inflow[119]! / stock[119]!).toBeCloseTo(inflowToStock, 12)
  })
})

describe('what becomes of an outflow', () => {
  it('keeps the balance of the cascade to 1e-9 in every process and year', () => {
    fc.assert(
      fc.property(masses, share, share, share, anyLifetime(), (outflowKg, recoveryShare, loss, again, lifetime) => {
        const years = outflowKg.length + 20
        const course = cascade({
          outflowKg,
          recoveryShare,
          processLossShare: loss,
          secondRecoveryShare: again,
          secondSurvival: tabulateSurvival(lifetime, 0.5, years).survival,
          years,
        })
        const source = Array.from({ length: years }, (_, year) => outflowKg[year] ?? 0)
        const sinks = source.map(
          (_, year) => course.processLossKg[year]! + course.disposalKg[year]! + course.recoveredAgainKg[year]!,
        )
        massBalance([
          {
            process: 'second use',
            inflow: course.secondInflowKg,
            outflow: course.secondOutflowKg,
            stock: course.secondStockKg,
          },
          { process: 'all', inflow: source, outflow: sinks, stock: course.secondStockKg },
        ])
      }),
    )
  })

  it('keeps the balance of obsolete stock and landfill to 1e-9', () => {
    fc.assert(
      fc.property(masses, share, share, (outflowKg, obsoleteShare, collectionRate) => {
        const years = outflowKg.length
        const buried = obsoleteStock({ outflowKg, obsoleteShare, collectionRate, years })
        const landfill = landfillLeaching({ depositKg: outflowKg, ratePerYear: 0.01 + collectionRate, years })
        massBalance([
          { process: 'obsolete', inflow: outflowKg, outflow: buried.collectedKg, stock: buried.stockKg },
          { process: 'landfill', inflow: outflowKg, outflow: landfill.leachedKg, stock: landfill.stockKg },
        ])
      }),
    )
  })

  it('is refused with shares above 1 and negative masses', () => {
    expect(() => obsoleteStock({ outflowKg: [1], obsoleteShare: 1.1, collectionRate: 0, years: 1 })).toThrow(
      'share-out-of-range',
    )
    expect(() => landfillLeaching({ depositKg: [-1], ratePerYear: 0.1, years: 1 })).toThrow('negative-amount')
    expect(() => landfillLeaching({ depositKg: [1], ratePerYear: NaN, years: 1 })).toThrow('parameter-not-positive')
  })
})

describe('the mass balance', () => {
  const course = { process: 'sorting', inflow: [10, 20], outflow: [10, 20] }

  it('is a table of every process and year', () => {
    const rows = massBalance([course, { process: 'use', inflow: [5], outflow: [1], stock: [104], openingStock: 100 }])
    expect(rows.map(({ process, year }) => `${process} ${year}`)).toEqual(['sorting 0', 'sorting 1', 'use 0'])
    expect(rows[2]).toMatchObject({ stockChange: 4, residual: 0, relativeResidual: 0 })
  })

  it('refuses a run that loses one part in a hundred million, and names where', () => {
    expect(() => massBalance([{ ...course, outflow: [10, 20 * (1 + 1e-8)] }])).toThrow(/mass-not-balanced.*sorting.*1/)
    expect(() => massBalance([{ ...course, outflow: [10, 20 * (1 + 1e-10)] }])).not.toThrow()
  })

  it('refuses what is not a number, and mass from nothing', () => {
    expect(() => massBalance([{ ...course, outflow: [10, NaN] }])).toThrow('mass-not-balanced')
    expect(() => massBalance([{ process: 'use', inflow: [0], outflow: [0], stock: [1e-30] }])).toThrow(
      'mass-not-balanced',
    )
    expect(() => massBalance([{ ...course, outflow: [10] }])).toThrow('length-mismatch')
  })
})

describe('a stationary state', () => {
  it('is the first year of enough still ones in a row', () => {
    expect(stationaryYear([10, 10, 20, 20, 20, 20], 1e-3, 3)).toBe(3)
    expect(stationaryYear([10, 10, 20, 20], 1e-3, 3)).toBeUndefined()
    expect(() => stationaryYear([1, NaN], 1e-3, 1)).toThrow('negative-amount')
  })
})

describe('indicators', () => {
  it('are null where they are relative to nothing', () => {
    const zeros = { constructionKg: [0], renewalKg: [0], demolitionKg: [0], refurbishmentKg: [0], recoveredKg: [0] }
    expect(stockIndicators({ stockKg: [0], population: [0], ...zeros }, 0)).toEqual([
      {
        year: 0,
        recoveryRate: null,
        recoveredSupplyToDemand: null,
        stockPerPersonKg: null,
        demolitionRatePerYear: null,
        renewalRatePerYear: null,
      },
    ])
  })

  it('relate each year to what it is a share of', () => {
    const [, second] = stockIndicators(
      {
        stockKg: [1000, 1100],
        constructionKg: [0, 120],
        renewalKg: [0, 30],
        demolitionKg: [0, 20],
        refurbishmentKg: [0, 30],
        recoveredKg: [0, 25],
        population: [10, 11],
      },
      1000,
    )
    expect(second).toEqual({
      year: 1,
      recoveryRate: 0.5,
      recoveredSupplyToDemand: 25 / 150,
      stockPerPersonKg: 100,
      demolitionRatePerYear: 0.02,
      renewalRatePerYear: 0.03,
    })
    expect(() =>
      stockIndicators(
        { stockKg: [1], constructionKg: [], renewalKg: [0], demolitionKg: [0], refurbishmentKg: [0], recoveredKg: [0] },
        1,
      ),
    ).toThrow('length-mismatch')
  })
})
