import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'
import { sumOfSurvival } from '@/shared/compute/lifetime/sumOfSurvival'
import { anyLifetime } from '@/tests/support/anyLifetime'
import { comingDownChances } from './comingDownChances'
import { componentFlows } from './componentFlows'
import { equilibriumRenewals } from './equilibriumRenewals'
import { knownAgeRenewals } from './knownAgeRenewals'
import { massBalance } from './massBalance'
import { newComponentRenewals } from './newComponentRenewals'
import { renewalsSinceConstruction } from './renewalsSinceConstruction'

const window: Lifetime = { model: 'weibull', shape: 3, scaleYears: 33.6 }
const anyAge = fc.integer({ min: 0, max: 150 })

describe('renewals', () => {
  it('of a new component are those of a component of age 0', () => {
    fc.assert(
      fc.property(anyLifetime(), (lifetime) => {
        const [fresh, known] = [newComponentRenewals(lifetime, 50), knownAgeRenewals(lifetime, 0, 50)]
        fresh.all.forEach((rate, n) => expect(Math.abs(rate - known.all[n]!)).toBeLessThan(1e-12))
      }),
    )
  })

  it('settle at one over the sum of survival', () => {
    const rate = newComponentRenewals(window, 400).all.at(-1)!
    expect(rate).toBeCloseTo(1 / sumOfSurvival(window, 0), 9)
  })

  it('stay where they are once the age has settled', () => {
    const { all, first } = equilibriumRenewals(window, 60)
    expect(Math.max(...all) - Math.min(...all)).toBe(0)
    expect(first[0]).toBeCloseTo(all[0]!, 12)
    expect(first.at(-1)!).toBeLessThan(first[0]!)
  })

  it('come at every whole life of a fixed one, and evenly for one that does not age', () => {
    const fixed = newComponentRenewals({ model: 'fixed', lifetimeYears: 25 }, 80).all
    expect([...fixed.keys()].filter((n) => fixed[n] === 1)).toEqual([24, 49, 74])
    const ageless = newComponentRenewals({ model: 'exponential', meanYears: 20 }, 40).all
    for (const rate of ageless) expect(rate).toBeCloseTo(-Math.expm1(-1 / 20), 14)
  })

  it('since construction run on from where the component was built in', () => {
    fc.assert(
      fc.property(anyLifetime(), fc.integer({ min: 0, max: 60 }), (lifetime, buildingYears) => {
        const { all, first } = renewalsSinceConstruction(lifetime, buildingYears, 20)
        const whole = newComponentRenewals(lifetime, buildingYears + 20).all
        expect([...all]).toEqual([...whole.slice(buildingYears)])
        first.forEach((chance, n) => expect(chance <= all[n]! + 1e-12 && chance >= 0).toBe(true))
        expect(first.reduce((sum, chance) => sum + chance, 0)).toBeLessThanOrEqual(1 + 1e-9)
      }),
      { numRuns: 40 },
    )
  })

  it('are refused for an age that is none and a life without a mean', () => {
    expect(() => knownAgeRenewals(window, -1, 10)).toThrow('negative-age')
    expect(() => renewalsSinceConstruction(window, 1.5, 10)).toThrow('negative-age')
    expect(() => equilibriumRenewals({ model: 'logLogistic', shape: 0.9, scaleYears: 20 }, 5)).toThrow(
      'undefined-statistic',
    )
  })
})

describe('a component inside a standing building', () => {
  it('keeps the balance to 1e-9 in every year, whatever the replacement weighs', () => {
    const ratio = fc.double({ min: 0.2, max: 3, noNaN: true })
    fc.assert(
      fc.property(
        anyLifetime(),
        anyLifetime(),
        anyAge,
        anyAge,
        ratio,
        (component, building, age, of, replacementRatio) => {
          const flows = componentFlows({
            renewals: knownAgeRenewals(component, age, 60),
            building: comingDownChances(building, of, 60),
            massKg: 1000,
            replacementRatio,
          })
          const outflow = flows.refurbishmentKg.map((mass, k) => mass + flows.demolitionKg[k]!)
          const rows = massBalance([
            { process: 'use', inflow: flows.inflowKg, outflow, stock: flows.stockKg, openingStock: 1000 },
          ])
          expect(rows).toHaveLength(60)
        },
      ),
    )
  })

  it('sends out more than one mass over a long horizon', () => {
    const building = comingDownChances({ model: 'weibull', shape: 3.059114961, scaleYears: 78.32083206 }, 50.5, 60)
    const { refurbishmentKg, demolitionKg } = componentFlows({
      renewals: knownAgeRenewals(window, 18, 60),
      building,
      massKg: 1,
    })
    const left = [...refurbishmentKg, ...demolitionKg].reduce((sum, mass) => sum + mass, 0)
    expect(left).toBeCloseTo(1.9099418569883997, 9)
  })

  it('is left alone in the years before a known demolition', () => {
    const { refurbishmentKg } = componentFlows({
      renewals: knownAgeRenewals(window, 18, 10),
      building: comingDownChances(window, 10, 10),
      massKg: 1,
      beforeDemolition: { inYear: 6, quietYears: 3 },
    })
    expect([...refurbishmentKg].map((mass) => mass > 0)).toEqual([
      true,
      true,
      true,
      false,
      false,
      false,
      true,
      true,
      true,
      true,
    ])
  })

  it('is refused when its series and the building differ in length', () => {
    const building = comingDownChances(window, 10, 10)
    const renewals = knownAgeRenewals(window, 18, 9)
    expect(() => componentFlows({ renewals, building, massKg: 1 })).toThrow('length-mismatch')
  })
})
