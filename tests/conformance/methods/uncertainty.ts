import { demolitionFlowOfYear } from '@/shared/compute/uncertainty/demolitionFlowOfYear'
import type { FactorGroup } from '@/shared/compute/uncertainty/factorGroup.types'
import { lognormalBand } from '@/shared/compute/uncertainty/lognormalBand'
import { lognormalFromMean } from '@/shared/compute/uncertainty/lognormalFromMean'
import { lognormalFromMedian } from '@/shared/compute/uncertainty/lognormalFromMedian'
import { lognormalMoments } from '@/shared/compute/uncertainty/lognormalMoments'
import { lognormalQuantile } from '@/shared/compute/uncertainty/lognormalQuantile'
import type { MassGroup } from '@/shared/compute/uncertainty/massGroup.types'
import { monteCarloBand } from '@/shared/compute/uncertainty/monteCarloBand'
import { productCv } from '@/shared/compute/uncertainty/productCv'
import { sharedFactorStock } from '@/shared/compute/uncertainty/sharedFactorStock'
import type { ConformanceMethod } from '@/tests/conformance/check.types'
import {
  isRecord,
  listOf,
  numberListsOf,
  numberOf,
  numbersOf,
  optionalNumberOf,
  type ConformanceInputs,
} from '@/tests/conformance/inputs'
import { firstNumberOf } from '@/tests/conformance/surveyInput'

const TRIALS = 100_000
const LONGEST_SEED = 2 ** 32
/** Percentiles a check may ask of a lognormal, by their names. */
const PERCENTS = [1, 2.5, 5, 10, 16, 20, 25, 50, 75, 80, 84, 90, 95, 97.5, 99]

const isListed = (inputs: ConformanceInputs, key: string) => Array.isArray(inputs[key])

/** The factor by mean and CV, by mean and standard deviation, or by median and geometric standard deviation. */
function factorOf(inputs: ConformanceInputs): { mean: number; cv: number } {
  const median = firstNumberOf(inputs, ['factor_median', 'median'])
  const gsd = firstNumberOf(inputs, ['factor_gsd', 'gsd'])
  if (median !== undefined && gsd !== undefined) return lognormalMoments(lognormalFromMedian(median, gsd))
  const mean = firstNumberOf(inputs, ['factor_mean', 'mean']) ?? numberOf(inputs, 'factor_mean')
  const sd = optionalNumberOf(inputs, 'factor_sd')
  return { mean, cv: sd === undefined ? numberOf(inputs, 'factor_cv') : sd / mean }
}

function groupOf(inputs: ConformanceInputs): FactorGroup {
  const { mean, cv } = factorOf(inputs)
  return {
    factorMeanKgPerM2: mean,
    factorCv: cv,
    areasM2: numbersOf(inputs, 'areas'),
    areaCv: isListed(inputs, 'area_cv') ? numbersOf(inputs, 'area_cv') : (optionalNumberOf(inputs, 'area_cv') ?? 0),
  }
}

function groupsOf(inputs: ConformanceInputs): FactorGroup[] {
  return inputs['groups'] === undefined ? [groupOf(inputs)] : listOf(inputs, 'groups').filter(isRecord).map(groupOf)
}

function correlationOf(inputs: ConformanceInputs): number | number[][] {
  const key = ['correlation', 'factor_correlation', 'rho'].find((candidate) => inputs[candidate] !== undefined)
  if (key === undefined) return 0
  return isListed(inputs, key) ? numberListsOf(inputs, key) : numberOf(inputs, key)
}

function sharedFactorFigures(inputs: ConformanceInputs) {
  const groups = groupsOf(inputs)
  const { meanKg, sdKg, cv } = sharedFactorStock(groups, correlationOf(inputs))
  const band = lognormalBand(lognormalFromMean(meanKg, cv))
  const [first] = groups
  const factor = first && lognormalFromMean(first.factorMeanKgPerM2, first.factorCv)
  return {
    mean_kg: meanKg,
    sd_kg: sdKg,
    variance: sdKg ** 2,
    cv,
    lognormal_approx: band,
    ...band,
    factor_meanlog: factor?.logMean,
    factor_sdlog: factor?.logSd,
  }
}

function monteCarloFigures(inputs: ConformanceInputs) {
  const groups = groupsOf(inputs).map((group, index): MassGroup => ({
    factors: [{ factorId: String(index), meanKgPerM2: group.factorMeanKgPerM2, sharedCv: group.factorCv }],
    areasM2: group.areasM2,
    areaCv: group.areaCv,
  }))
  const trials = firstNumberOf(inputs, ['draws', 'trials', 'n_draws']) ?? TRIALS
  const seed = (optionalNumberOf(inputs, 'seed') ?? 1) % LONGEST_SEED
  const drawn = monteCarloBand(groups, Math.max(trials, TRIALS), seed)
  return {
    mean_kg: drawn.meanKg,
    sd_kg: drawn.sdKg,
    cv: drawn.sdKg / drawn.meanKg,
    p10: drawn.p10Kg,
    p50: drawn.p50Kg,
    p90: drawn.p90Kg,
  }
}

function flowFigures(inputs: ConformanceInputs) {
  const areas = numbersOf(inputs, 'areas')
  const key = ['prob', 'probs', 'p', 'probabilities'].find((candidate) => inputs[candidate] !== undefined) ?? 'prob'
  const chances = isListed(inputs, key) ? numbersOf(inputs, key) : areas.map(() => numberOf(inputs, key))
  const { mean, cv } = factorOf(inputs)
  const flow = demolitionFlowOfYear(mean, cv, areas, chances, optionalNumberOf(inputs, 'area_cv') ?? 0)
  return {
    mean_kg: flow.meanKg,
    sd_kg: flow.sdKg,
    variance: flow.sdKg ** 2,
    cv: flow.cv,
    share_of_variance_from_factor: flow.factorShareOfVariance,
    share_of_variance_from_chance: 1 - flow.factorShareOfVariance,
  }
}

function quantileFigures(inputs: ConformanceInputs) {
  const median = optionalNumberOf(inputs, 'median')
  const law =
    median === undefined
      ? lawFromMean(inputs)
      : lognormalFromMedian(median, firstNumberOf(inputs, ['gsd']) ?? gsdOf(inputs))
  const { mean, cv } = lognormalMoments(law)
  const named = PERCENTS.map((percent) => {
    const [whole, rest] = String(percent).split('.')
    return [`p${whole!.padStart(2, '0')}${rest ?? ''}`, lognormalQuantile(law, percent / 100)] as const
  })
  return {
    mean,
    cv,
    sd: mean * cv,
    median: Math.exp(law.logMean),
    gsd: Math.exp(law.logSd),
    meanlog: law.logMean,
    sdlog: law.logSd,
    ...Object.fromEntries(named),
  }
}

function lawFromMean(inputs: ConformanceInputs) {
  const mean = numberOf(inputs, 'mean')
  const sd = optionalNumberOf(inputs, 'sd')
  return lognormalFromMean(mean, sd === undefined ? numberOf(inputs, 'cv') : sd / mean)
}

/** GSD of a lognormal given by its median and CV. */
const gsdOf = (inputs: ConformanceInputs) => Math.exp(lognormalFromMean(1, numberOf(inputs, 'cv')).logSd)

function productFigures(inputs: ConformanceInputs) {
  const { exact, firstOrder } = productCv(numbersOf(inputs, isListed(inputs, 'cv') ? 'cv' : 'cvs'))
  return { exact_cv: exact, first_order_cv: firstOrder, exact, first_order: firstOrder }
}

export const uncertaintyMethods: Readonly<Record<string, ConformanceMethod>> = {
  'shared-factor': sharedFactorFigures,
  'shared-factor-groups': sharedFactorFigures,
  'shared-factor-monte-carlo': monteCarloFigures,
  'flow-variance': flowFigures,
  'lognormal-quantiles': quantileFigures,
  'product-cv': productFigures,
}

/** Treating a shared error as independent makes the spread too small: the production functions keep it shared. */
export function uncertaintyCounterExample(inputs: ConformanceInputs): unknown {
  if (inputs['prob'] !== undefined && inputs['factor_cv'] !== undefined) return bothNames(flowFigures(inputs))
  if (inputs['groups'] !== undefined || inputs['factor_cv'] !== undefined) return bothNames(sharedFactorFigures(inputs))
  return undefined
}

function bothNames(figures: Readonly<Record<string, unknown>>) {
  const under = (prefix: string) =>
    Object.fromEntries(Object.entries(figures).map(([key, figure]) => [`${prefix}_${key}`, figure]))
  return { ...figures, correct: figures, ...under('correct'), naive: figures, wrong: figures }
}
