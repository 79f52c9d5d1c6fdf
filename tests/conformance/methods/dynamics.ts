import { sumOfSurvival } from '@/shared/compute/lifetime/sumOfSurvival'
import { lifetimeMoments } from '@/shared/compute/lifetime/lifetimeMoments'
import { tabulateSurvival } from '@/shared/compute/lifetime/tabulateSurvival'
import { cascade } from '@/shared/compute/stock/cascade'
import { doublingYears } from '@/shared/compute/growth/doublingYears'
import { exponentialGrowth } from '@/shared/compute/growth/exponentialGrowth'
import { logisticGrowth } from '@/shared/compute/growth/logisticGrowth'
import { logisticLandmarks } from '@/shared/compute/growth/logisticLandmarks'
import { logisticTime } from '@/shared/compute/growth/logisticTime'
import { perCapitaStock } from '@/shared/compute/growth/perCapitaStock'
import { saturatingGrowth } from '@/shared/compute/growth/saturatingGrowth'
import { fixedLifetimeGrowth } from '@/shared/compute/stock/fixedLifetimeGrowth'
import { fixedLifetimeInflow } from '@/shared/compute/stock/fixedLifetimeInflow'
import { inflowDrivenStock } from '@/shared/compute/stock/inflowDrivenStock'
import { landfillLeaching } from '@/shared/compute/stock/landfillLeaching'
import { obsoleteStock } from '@/shared/compute/stock/obsoleteStock'
import { stationaryYear } from '@/shared/compute/stock/stationaryYear'
import { stockDrivenInflow } from '@/shared/compute/stock/stockDrivenInflow'
import { unconstrainedInflow } from '@/shared/compute/stock/unconstrainedInflow'
import type { ConformanceMethod } from '@/tests/conformance/check.types'
import { isRecord, numberOf, numbersOf, optionalNumberOf, type ConformanceInputs } from '@/tests/conformance/inputs'
import { lifetimeOf } from '@/tests/conformance/lifetimeInput'
import { atYears, firstOf, rowsBy } from '@/tests/conformance/shownInPart'

const BALANCE_BOUND = 1e-6
const USUAL_LOGISTIC_YEARS = [0, 1, 2, 5, 10, 20, 40, 60, 80, 100, 150]
const USUAL_PER_CAPITA_YEARS = [0, 1, 10, 25, 50, 100]

const total = (values: Iterable<number>) => [...values].reduce((sum, value) => sum + value, 0)
const most = (values: Iterable<number>) => [...values].reduce((a, b) => Math.max(a, b), -Infinity)
const offsetOf = (inputs: ConformanceInputs) => optionalNumberOf(inputs, 'o') ?? 0.5
const yearly = (years: number, valueOf: (year: number) => number) =>
  Float64Array.from({ length: years }, (_, year) => valueOf(year))
const before = (years: number, usual: readonly number[]) => usual.filter((year) => year < years)

/** Survival at the end of each year, S(j + o). */
function survivalOf(inputs: ConformanceInputs, years: number): Float64Array {
  return tabulateSurvival(lifetimeOf(inputs), offsetOf(inputs), years).survival
}

function fixedGrowthFigures(inputs: ConformanceInputs) {
  const [rate, lifetime] = [numberOf(inputs, 'alpha'), numberOf(inputs, 'L')]
  const years = optionalNumberOf(inputs, 'years') ?? 2 * lifetime + 1
  const path = { start: optionalNumberOf(inputs, 'I0') ?? 1, ratePerYear: rate, compounding: 'yearly' } as const
  const inflow = yearly(years, (year) => exponentialGrowth(year, path))
  const { survival } = tabulateSurvival({ model: 'fixed', lifetimeYears: lifetime }, 0, years)
  const { stock, outflow } = inflowDrivenStock(inflow, survival)
  const ratios = fixedLifetimeGrowth(rate, lifetime)
  return {
    outflow_to_inflow_ratio: ratios.outflowToInflow,
    inflow_to_stock_ratio: ratios.inflowToStock,
    outflow_to_stock_ratio: ratios.outflowToStock,
    stock_at: rowsBy('t', [lifetime - 1, lifetime, years - 1], (year) => ({
      inflow: inflow[year],
      stock: stock[year],
      outflow: outflow[year],
    })),
  }
}

function stockFixedFigures(inputs: ConformanceInputs) {
  const rate = optionalNumberOf(inputs, 'alpha') ?? 0
  const path = { start: numberOf(inputs, 'S0'), ratePerYear: rate, compounding: 'yearly' } as const
  const stock = yearly(numberOf(inputs, 'years'), (year) => exponentialGrowth(year, path))
  const { inflow, outflow } = fixedLifetimeInflow(stock, numberOf(inputs, 'L'))
  return { stock: firstOf(stock), inflow: firstOf(inflow), outflow: firstOf(outflow) }
}

function stockDriven(inputs: ConformanceInputs, stock: Float64Array) {
  const { inflow, outflow } = unconstrainedInflow(stock, survivalOf(inputs, stock.length))
  const largest = stock.reduce((residual, now, year) => {
    const change = now - (stock[year - 1] ?? 0)
    return Math.max(residual, Math.abs(change - (inflow[year] ?? NaN) + (outflow[year] ?? NaN)))
  }, 0)
  const bound = BALANCE_BOUND * (optionalNumberOf(inputs, 'C') ?? most(stock))
  return {
    series: { stock, inflow, outflow },
    figures: {
      cumulative_inflow: total(inflow),
      cumulative_outflow: total(outflow),
      max_abs_balance_residual_below: largest < bound ? bound : largest,
    },
  }
}

function logisticStockFigures(inputs: ConformanceInputs) {
  const years = numberOf(inputs, 'years')
  const [ceiling, rate] = [numberOf(inputs, 'C'), numberOf(inputs, 'r')]
  const inflection = optionalNumberOf(inputs, 't0')
  const start =
    inflection === undefined
      ? numberOf(inputs, 'S0')
      : logisticGrowth(-inflection, { start: ceiling / 2, ceiling, ratePerYear: rate })
  const stock = yearly(years, (year) => logisticGrowth(year, { start, ceiling, ratePerYear: rate }))
  const { series, figures } = stockDriven(inputs, stock)
  return atYears(series, before(years, USUAL_LOGISTIC_YEARS), figures)
}

function perCapitaFigures(inputs: ConformanceInputs) {
  const years = numberOf(inputs, 'years')
  const people = {
    start: numberOf(inputs, 'pop0'),
    ceiling: numberOf(inputs, 'popK'),
    ratePerYear: numberOf(inputs, 'pr'),
  }
  const use = { start: numberOf(inputs, 'pc0'), ceiling: numberOf(inputs, 'sat'), ratePerYear: numberOf(inputs, 'r') }
  const population = yearly(years, (year) => saturatingGrowth(year, people))
  const perPerson = yearly(years, (year) => logisticGrowth(year, use))
  const { series, figures } = stockDriven(inputs, perCapitaStock(perPerson, population))
  return atYears({ population, per_capita: perPerson, ...series }, before(years, USUAL_PER_CAPITA_YEARS), figures)
}

function shrinkFigures(inputs: ConformanceInputs) {
  const stock = Float64Array.from(numbersOf(inputs, 'stock'))
  const { inflow, outflow } = unconstrainedInflow(stock, survivalOf(inputs, stock.length))
  const table = tabulateSurvival(lifetimeOf(inputs), offsetOf(inputs), stock.length + 1)
  const met = stockDrivenInflow({ stock, table })
  const negativeYears = [...inflow.keys()].filter((year) => (inflow[year] ?? 0) < 0)
  return {
    raw_inflow: inflow,
    raw_outflow: outflow,
    years_with_negative_inflow: negativeYears,
    inflow: met.inflow,
    outflow: met.outflow,
    extra_demolition: met.extraDemolition,
    years_with_extra_demolition: [...met.extraDemolition.keys()].filter((year) => met.extraDemolition[year]! > 0),
  }
}

function inflowDrivenFigures(inputs: ConformanceInputs) {
  const given = inputs.inflow ?? inputs.I
  const years = optionalNumberOf(inputs, 'years') ?? (Array.isArray(given) ? given.length : NaN)
  const constant = typeof given === 'number' ? given : undefined
  const inflow = constant === undefined ? numbersOf({ given }, 'given') : Array<number>(years).fill(constant)
  const { stock, outflow } = inflowDrivenStock(inflow, survivalOf(inputs, inflow.length))
  const threshold = optionalNumberOf(inputs, 'threshold')
  return {
    stock: firstOf(stock),
    outflow: firstOf(outflow),
    ...(constant !== undefined && {
      stationary_stock: constant * sumOfSurvival(lifetimeOf(inputs), offsetOf(inputs)),
      inflow_times_mean: constant * lifetimeMoments(lifetimeOf(inputs)).meanYears,
    }),
    first_stationary_year_index: stationaryYear(stock, threshold, optionalNumberOf(inputs, 'consecutive') ?? 1) ?? null,
    stock_at_end: stock.at(-1),
    outflow_at_end: outflow.at(-1),
  }
}

function exponentialFigures(inputs: ConformanceInputs) {
  const [start, n] = [numberOf(inputs, 'S0'), numberOf(inputs, 'n')]
  const growth = optionalNumberOf(inputs, 'g')
  const decay = optionalNumberOf(inputs, 'lam')
  return {
    ...(growth !== undefined && {
      growth: exponentialGrowth(n, { start, ratePerYear: growth, compounding: 'continuous' }),
      doubling_time: doublingYears(growth, 'continuous'),
      discrete_growth: exponentialGrowth(n, { start, ratePerYear: growth, compounding: 'yearly' }),
      discrete_doubling: doublingYears(growth, 'yearly'),
    }),
    ...(decay !== undefined && {
      decay: exponentialGrowth(n, { start, ratePerYear: -decay, compounding: 'continuous' }),
      half_life: doublingYears(-decay, 'continuous'),
      discrete_decay: exponentialGrowth(n, { start, ratePerYear: -decay, compounding: 'yearly' }),
    }),
  }
}

function logisticFigures(inputs: ConformanceInputs) {
  const path = {
    start: numberOf(inputs, 'S0'),
    ceiling: numberOf(inputs, 'C'),
    ratePerYear: numberOf(inputs, 'r'),
  }
  const { inflectionYears, valueAtInflection, steepestSlopePerYear } = logisticLandmarks(path)
  const timeTo = (share: number) => logisticTime(share * path.ceiling, path)
  const times = inputs.at === undefined ? [] : numbersOf(inputs, 'at')
  return {
    t_inflection: inflectionYears,
    stock_at_inflection: valueAtInflection,
    max_slope: steepestSlopePerYear,
    at: rowsBy('t', times, (time) => ({ stock: logisticGrowth(time, path) })),
    t_50: timeTo(0.5),
    t_90: timeTo(0.9),
    t_95: timeTo(0.95),
    t_99: timeTo(0.99),
  }
}

function secondSurvivalOf(inputs: ConformanceInputs, years: number): Float64Array {
  const second = inputs.second_life
  if (isRecord(second))
    return tabulateSurvival(lifetimeOf(second), optionalNumberOf(inputs, 'o') ?? 0.5, years).survival
  const lifetimeYears = numberOf(inputs, 'second_life')
  return tabulateSurvival({ model: 'fixed', lifetimeYears }, optionalNumberOf(inputs, 'o') ?? 0, years).survival
}

function cascadeFigures(inputs: ConformanceInputs) {
  const outflowKg = numbersOf(inputs, 'outflow')
  const years = optionalNumberOf(inputs, 'years') ?? outflowKg.length
  const course = cascade({
    outflowKg,
    recoveryShare: numberOf(inputs, 'recovery'),
    processLossShare: optionalNumberOf(inputs, 'process_loss') ?? 0,
    secondSurvival: secondSurvivalOf(inputs, years),
    secondRecoveryShare: optionalNumberOf(inputs, 'second_recovery') ?? 0,
    years,
  })
  const sinks = [total(course.processLossKg), total(course.disposalKg), total(course.recoveredAgainKg)]
  const stockAtEnd = course.secondStockKg.at(-1) ?? 0
  return {
    second_use_stock: firstOf(course.secondStockKg),
    second_use_stock_end: stockAtEnd,
    max_second_use_stock: most(course.secondStockKg),
    process_loss_total: sinks[0],
    disposal_total: sinks[1],
    recovered_again_total: sinks[2],
    balance_residual: total(outflowKg) - total(sinks) - stockAtEnd,
  }
}

function leachingFigures(inputs: ConformanceInputs) {
  const depositKg = numbersOf(inputs, 'deposit')
  const years = optionalNumberOf(inputs, 'years') ?? depositKg.length
  const course = landfillLeaching({ depositKg, ratePerYear: numberOf(inputs, 'k'), years })
  return {
    annual: course.leachedKg,
    left: course.stockKg.at(-1),
    half_life: course.halfLifeYears,
    total_released: total(course.leachedKg),
  }
}

function obsoleteFigures(inputs: ConformanceInputs) {
  const outflowKg = numbersOf(inputs, 'out')
  const course = obsoleteStock({
    outflowKg,
    obsoleteShare: numberOf(inputs, 'obsolete_share'),
    collectionRate: numberOf(inputs, 'collect_rate'),
    years: optionalNumberOf(inputs, 'years') ?? outflowKg.length,
  })
  const stockAtEnd = course.stockKg.at(-1) ?? 0
  return {
    collected: course.collectedKg,
    obsolete_stock: course.stockKg,
    obsolete_stock_end: stockAtEnd,
    balance: total(outflowKg) - total(course.collectedKg) - stockAtEnd,
  }
}

/** Stocks and flows over time, growth paths, and what becomes of an outflow. */
export const dynamicsMethods: Readonly<Record<string, ConformanceMethod>> = {
  'fixed-lifetime-growth': fixedGrowthFigures,
  'stock-driven-fixed': stockFixedFigures,
  'stock-driven-logistic': logisticStockFigures,
  'stock-driven-per-capita': perCapitaFigures,
  'stock-driven-shrink': shrinkFigures,
  'inflow-driven': inflowDrivenFigures,
  'growth-exponential': exponentialFigures,
  'growth-logistic': logisticFigures,
  cascade: cascadeFigures,
  leaching: leachingFigures,
  'obsolete-stock': obsoleteFigures,
}
