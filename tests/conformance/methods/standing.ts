import { lifetimeFromMeanSd } from '@/shared/compute/lifetime/lifetimeFromMeanSd'
import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'
import { logSurvival } from '@/shared/compute/lifetime/logSurvival'
import { remainingLife } from '@/shared/compute/lifetime/remainingLife'
import { tabulateUniformYear } from '@/shared/compute/lifetime/tabulateUniformYear'
import { combinedMultiplier, MULTIPLIER_BOUNDS } from '@/shared/compute/stock/combinedMultiplier'
import { comingDownChances } from '@/shared/compute/stock/comingDownChances'
import { comingDownFromTable } from '@/shared/compute/stock/comingDownFromTable'
import { countQuantile } from '@/shared/compute/stock/countQuantile'
import { impliedDemolitionRate } from '@/shared/compute/stock/impliedDemolitionRate'
import { poissonBinomial } from '@/shared/compute/stock/poissonBinomial'
import { standingChancesOfGroups } from '@/shared/compute/stock/standingChancesOfGroups'
import { standingFlows } from '@/shared/compute/stock/standingFlows'
import type { ComingDown, ConstructionYear, StandingGroup, YearOffset } from '@/shared/compute/stock/stock.types'
import { withPermit } from '@/shared/compute/stock/withPermit'
import type { ConformanceMethod } from '@/tests/conformance/check.types'
import {
  numberOf,
  numbersOf,
  numberListsOf,
  optionalNumberOf,
  type ConformanceInputs,
} from '@/tests/conformance/inputs'
import { lifetimeOf } from '@/tests/conformance/lifetimeInput'

/** Years shown where a check asks for one building without saying how far ahead. */
const USUAL_YEARS = 10

function offsetOf(inputs: ConformanceInputs): YearOffset {
  const offset = optionalNumberOf(inputs, 'o') ?? 0.5
  if (offset !== 0 && offset !== 0.5 && offset !== 1) throw new Error(`offset ${offset} is none of 0, 0.5, 1`)
  return offset
}

const yearsOf = (inputs: ConformanceInputs) => optionalNumberOf(inputs, 'years') ?? USUAL_YEARS
const multiplierOf = (inputs: ConformanceInputs) => optionalNumberOf(inputs, 'm') ?? 1
const total = (values: Iterable<number>) => [...values].reduce((sum, value) => sum + value, 0)

function groupsOf(inputs: ConformanceInputs, lifetime: Lifetime): StandingGroup[] {
  const areas = numbersOf(inputs, 'floor_area_m2')
  const counts = inputs.buildings === undefined ? undefined : numbersOf(inputs, 'buildings')
  return numbersOf(inputs, 'construction_years').map((constructionYear, index) => ({
    lifetime,
    constructionYear,
    amount: areas[index] ?? NaN,
    buildingCount: counts?.[index] ?? 1,
    hazardMultiplier: multiplierOf(inputs),
  }))
}

function flowFigures(inputs: ConformanceInputs) {
  const surveyYear = numberOf(inputs, 'survey_year')
  const skipped = (optionalNumberOf(inputs, 'first_flow_year') ?? surveyYear + 1) - surveyYear - 1
  const horizonYears = skipped + (optionalNumberOf(inputs, 'horizon_years') ?? numberOf(inputs, 'years'))
  const groups = groupsOf(inputs, lifetimeOf(inputs))
  const flows = standingFlows(groups, { surveyYear, horizonYears, yearOffset: offsetOf(inputs) })
  const sd = flows.variance.map(Math.sqrt)
  return {
    annual_flow_m2: flows.expected.subarray(skipped),
    annual_sd_m2: sd.subarray(skipped),
    annual_variance: flows.variance.subarray(skipped),
    cumulative_flow_m2: flows.cumulativeExpected.at(-1),
    sd_of_cumulative_m2: Math.sqrt(flows.cumulativeVariance.at(-1) ?? 0),
    cumulative_by_year_m2: flows.cumulativeExpected.subarray(skipped),
    remaining_m2: flows.remaining,
    surveyed_m2: flows.surveyed,
    implied_rate: flows.impliedRatePerYear,
    overdue_m2: flows.overdueAmount,
    overdue_buildings: flows.overdueBuildingCount,
  }
}

function chanceFigures({ chances, remaining }: ComingDown) {
  return { prob: chances, cumulative: total(chances), remaining }
}

/** One building of a known age: what `age`, `m`, `j` and `q` say. */
function oneBuilding(inputs: ConformanceInputs): ComingDown {
  const hazardMultiplier = multiplierOf(inputs)
  const ordinary = comingDownChances(lifetimeOf(inputs), numberOf(inputs, 'age'), yearsOf(inputs), { hazardMultiplier })
  if (inputs.q === undefined) return ordinary
  return withPermit(ordinary, { inYear: numberOf(inputs, 'j'), executionProbability: numberOf(inputs, 'q') })
}

function singleFigures(inputs: ConformanceInputs) {
  const lifetime = lifetimeOf(inputs)
  const age = numberOf(inputs, 'age')
  const { meanYears, medianYears } = remainingLife(age, lifetime)
  return {
    ...chanceFigures(oneBuilding(inputs)),
    log_S_age: logSurvival(age, lifetime),
    remaining_life_mean: Number.isFinite(meanYears) ? meanYears : null,
    remaining_life_median: medianYears,
  }
}

function uniformFigures(inputs: ConformanceInputs) {
  const lifetime = lifetimeOf(inputs)
  const [year, years] = [numberOf(inputs, 'j'), yearsOf(inputs)]
  const spread = comingDownFromTable(tabulateUniformYear(lifetime, year, years + 1), 0, years)
  return { ...chanceFigures(spread), mid_year_approximation: comingDownChances(lifetime, year + 0.5, years).chances }
}

function memorylessFigures(inputs: ConformanceInputs) {
  const lifetime = { model: 'exponential', meanYears: numberOf(inputs, 'mean') } as const
  return {
    prob_next_year: numbersOf(inputs, 'ages').map((age) => comingDownChances(lifetime, age, 1).chances[0]),
  }
}

function intervalFigures(inputs: ConformanceInputs) {
  const lifetime = lifetimeOf(inputs)
  const [yearFrom = NaN, yearTo = NaN] = numbersOf(inputs, 'interval')
  const conventions = {
    surveyYear: numberOf(inputs, 'survey_year'),
    horizonYears: yearsOf(inputs),
    yearOffset: offsetOf(inputs),
  }
  const chancesOf = (constructionYear: ConstructionYear) => {
    const group = { lifetime, constructionYear, amount: 1, buildingCount: 1, hazardMultiplier: multiplierOf(inputs) }
    return standingChancesOfGroups([group], conventions)[0]?.chances
  }
  return {
    equal_weights_standing: chancesOf({ yearFrom, yearTo, rule: 'judgement' }),
    survival_weighted: chancesOf({ yearFrom, yearTo, rule: 'register' }),
    midpoint: chancesOf((yearFrom + yearTo) / 2),
  }
}

function overdueFigures(inputs: ConformanceInputs) {
  const lifetime: Lifetime =
    inputs.family === undefined
      ? { model: 'fixed', lifetimeYears: numberOf(inputs, 'lifetime') }
      : lifetimeOf({ ...inputs, params: inputs.params ?? inputs })
  return {
    prob: numbersOf(inputs, 'ages').map((age) => comingDownChances(lifetime, age, yearsOf(inputs)).chances),
  }
}

function multiplierFigures(inputs: ConformanceInputs) {
  const [least = MULTIPLIER_BOUNDS.least, most = MULTIPLIER_BOUNDS.most] =
    inputs.clamp === undefined ? [] : numbersOf(inputs, 'clamp')
  const { product, applied } = combinedMultiplier(numbersOf(inputs, 'multipliers'), { least, most })
  return { product, clamped: applied }
}

function countFigures(inputs: ConformanceInputs) {
  const { probabilities, mean, variance, noneProbability } = poissonBinomial(numbersOf(inputs, 'prob'))
  let soFar = 0
  return {
    pmf: probabilities,
    cdf: probabilities.map((probability) => (soFar += probability)),
    mean,
    var: variance,
    sd: Math.sqrt(variance),
    p10: countQuantile(probabilities, 0.1),
    p50: countQuantile(probabilities, 0.5),
    p90: countQuantile(probabilities, 0.9),
    prob_none: noneProbability,
    p_none: noneProbability,
    prob_nothing: noneProbability,
  }
}

function impliedRateFigures(inputs: ConformanceInputs) {
  const conventions = {
    surveyYear: numberOf(inputs, 'survey_year'),
    horizonYears: 1,
    yearOffset: offsetOf(inputs),
  }
  const rates = numberListsOf(inputs, 'mean_sd').map(([mean = NaN, sd = NaN]) => {
    const flows = standingFlows(groupsOf(inputs, lifetimeFromMeanSd('weibull', mean, sd)), conventions)
    return [`${mean}+-${sd}`, impliedDemolitionRate(flows.expected[0] ?? 0, flows.surveyed).ratePerYear]
  })
  return { rate: Object.fromEntries(rates) }
}

const buildingFigures: ConformanceMethod = (inputs) => chanceFigures(oneBuilding(inputs))

/** Standing buildings: conditional chances, flows, counts. */
export const standingMethods: Readonly<Record<string, ConformanceMethod>> = {
  'standing-flows': flowFigures,
  'standing-flow-uniform': uniformFigures,
  'standing-tail': singleFigures,
  'standing-single': singleFigures,
  'standing-memoryless': memorylessFigures,
  'standing-interval': intervalFigures,
  'standing-permit': buildingFigures,
  'standing-hazard': buildingFigures,
  'standing-age-zero': buildingFigures,
  'standing-overdue': overdueFigures,
  'hazard-multipliers': multiplierFigures,
  'poisson-binomial': countFigures,
  'implied-rate': impliedRateFigures,
}
