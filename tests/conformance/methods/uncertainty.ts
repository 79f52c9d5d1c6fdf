import {
  lognormalFromMean,
  lognormalFromMedian,
  lognormalMoments,
  lognormalQuantile,
} from '@/shared/compute/uncertainty/lognormal'
import { monteCarloStock } from '@/shared/compute/uncertainty/monteCarloStock'
import { productCv } from '@/shared/compute/uncertainty/productCv'
import { demolitionFlowOfYear, sharedFactorStock, type FactorGroup } from '@/shared/compute/uncertainty/sharedFactor'
import type { ConformanceMethod } from '@/tests/conformance/check.types'
import {
  isRecord,
  listOf,
  numberOf,
  numbersOf,
  optionalNumberOf,
  type ConformanceInputs,
} from '@/tests/conformance/inputs'

const TRIALS = 40_000

function groupOf(inputs: ConformanceInputs): FactorGroup {
  return {
    factorMeanKgPerM2: numberOf(inputs, 'factor_mean'),
    factorCv: numberOf(inputs, 'factor_cv'),
    areasM2: numbersOf(inputs, 'areas'),
    areaCv: Array.isArray(inputs['area_cv'])
      ? numbersOf(inputs, 'area_cv')
      : (optionalNumberOf(inputs, 'area_cv') ?? 0),
  }
}

function groupsOf(inputs: ConformanceInputs): FactorGroup[] {
  return inputs['groups'] === undefined ? [groupOf(inputs)] : listOf(inputs, 'groups').filter(isRecord).map(groupOf)
}

function sharedFactorFigures(inputs: ConformanceInputs) {
  const groups = groupsOf(inputs)
  const { meanKg, sdKg, cv } = sharedFactorStock(groups, optionalNumberOf(inputs, 'correlation') ?? 0)
  const law = lognormalFromMean(meanKg, cv)
  const [first] = groups
  const factor = first && lognormalFromMean(first.factorMeanKgPerM2, first.factorCv)
  return {
    mean_kg: meanKg,
    sd_kg: sdKg,
    cv,
    lognormal_approx: {
      p10: lognormalQuantile(law, 0.1),
      p50: lognormalQuantile(law, 0.5),
      p90: lognormalQuantile(law, 0.9),
    },
    factor_meanlog: factor?.logMean,
    factor_sdlog: factor?.logSd,
  }
}

function monteCarloFigures(inputs: ConformanceInputs) {
  const drawn = monteCarloStock(
    groupsOf(inputs),
    optionalNumberOf(inputs, 'draws') ?? TRIALS,
    optionalNumberOf(inputs, 'seed') ?? 1,
  )
  return { mean_kg: drawn.meanKg, sd_kg: drawn.sdKg, p10: drawn.p10Kg, p50: drawn.p50Kg, p90: drawn.p90Kg }
}

function flowFigures(inputs: ConformanceInputs) {
  const flow = demolitionFlowOfYear(
    numberOf(inputs, 'factor_mean'),
    numberOf(inputs, 'factor_cv'),
    numbersOf(inputs, 'areas'),
    numbersOf(inputs, 'prob'),
  )
  return {
    mean_kg: flow.meanKg,
    sd_kg: flow.sdKg,
    cv: flow.sdKg / flow.meanKg,
    share_of_variance_from_factor: flow.factorShareOfVariance,
  }
}

function quantileFigures(inputs: ConformanceInputs) {
  const median = optionalNumberOf(inputs, 'median')
  const law =
    median === undefined
      ? lognormalFromMean(numberOf(inputs, 'mean'), numberOf(inputs, 'cv'))
      : lognormalFromMedian(median, numberOf(inputs, 'gsd'))
  const { mean, cv } = lognormalMoments(law)
  const at = (probability: number) => lognormalQuantile(law, probability)
  return {
    mean,
    cv,
    median: at(0.5),
    gsd: Math.exp(law.logSd),
    p05: at(0.05),
    p10: at(0.1),
    p25: at(0.25),
    p50: at(0.5),
    p75: at(0.75),
    p90: at(0.9),
    p95: at(0.95),
  }
}

function productFigures(inputs: ConformanceInputs) {
  const { exact, firstOrder } = productCv(numbersOf(inputs, 'cv'))
  return { exact_cv: exact, first_order_cv: firstOrder }
}

export const uncertaintyMethods: Readonly<Record<string, ConformanceMethod>> = {
  'shared-factor': sharedFactorFigures,
  'shared-factor-groups': sharedFactorFigures,
  'shared-factor-monte-carlo': monteCarloFigures,
  'flow-variance': flowFigures,
  'lognormal-quantiles': quantileFigures,
  'product-cv': productFigures,
}
