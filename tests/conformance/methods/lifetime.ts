import { densityPerYear } from '@/shared/compute/lifetime/densityPerYear'
import { hazardPerYear } from '@/shared/compute/lifetime/hazardPerYear'
import type { Lifetime, LifetimeModel } from '@/shared/compute/lifetime/lifetime.types'
import { lifetimeFromMeanSd } from '@/shared/compute/lifetime/lifetimeFromMeanSd'
import { lifetimeMoments } from '@/shared/compute/lifetime/lifetimeMoments'
import { logSurvival } from '@/shared/compute/lifetime/logSurvival'
import { survival } from '@/shared/compute/lifetime/survival'
import { tabulateSurvival } from '@/shared/compute/lifetime/tabulateSurvival'
import { tabulateUniformYear } from '@/shared/compute/lifetime/tabulateUniformYear'
import { weibullModeYears } from '@/shared/compute/lifetime/weibullModeYears'
import { ComputeError } from '@/shared/compute/errors'
import { cohortOutflow } from '@/shared/compute/stock/cohortOutflow'
import type { ConformanceMethod } from '@/tests/conformance/check.types'
import { numberOf, numbersOf, optionalNumberOf, textOf, type ConformanceInputs } from '@/tests/conformance/inputs'
import { lifetimeOf, modelOf } from '@/tests/conformance/lifetimeInput'

const finite = (value: number) => (Number.isFinite(value) ? value : null)

function lifetimeFigures(inputs: ConformanceInputs) {
  const lifetime = lifetimeOf(inputs)
  const ages = numbersOf(inputs, 'ages')
  const { meanYears, sdYears, medianYears } = lifetimeMoments(lifetime)
  const logs = ages.map((age) => logSurvival(age, lifetime))
  return {
    survival: ages.map((age) => survival(age, lifetime)),
    cdf: logs.map((log) => -Math.expm1(log)),
    log_survival: logs.map(finite),
    cumulative_hazard: logs.map((log) => finite(-log)),
    pdf: ages.map((age) => finite(densityPerYear(age, lifetime))),
    hazard: ages.map((age) => finite(hazardPerYear(age, lifetime))),
    mean: finite(meanYears),
    sd: finite(sdYears),
    variance: finite(sdYears ** 2),
    cv: finite(sdYears / meanYears),
    median: medianYears,
  }
}

/** Parameters under the names of the check files. */
const NAMES: Readonly<Record<string, string>> = {
  lifetimeYears: 'lifetime',
  meanYears: 'mean',
  sdYears: 'sd',
  parentMeanYears: 'parent_mean',
  parentSdYears: 'parent_sd',
  logMean: 'meanlog',
  logSd: 'sdlog',
  scaleYears: 'scale',
  locationYears: 'location',
}

function parametersOf(lifetime: Lifetime) {
  return Object.fromEntries(Object.entries(lifetime).map(([name, value]) => [NAMES[name] ?? name, value]))
}

const FITTED: Readonly<Record<string, LifetimeModel>> = {
  weibull: 'weibull',
  lognormal: 'lognormal',
  gamma: 'gamma',
  normal: 'normal',
  logistic: 'logistic',
  loglogistic: 'logLogistic',
  normal_truncated_at_0: 'truncatedNormal',
  folded_normal: 'foldedNormal',
  logistic_truncated_at_0: 'truncatedLogistic',
  exponential: 'exponential',
  fixed: 'fixed',
}

/** A model that cannot have this mean and sd is left out. */
function fitted(model: LifetimeModel, mean: number, sd: number) {
  try {
    const lifetime = lifetimeFromMeanSd(model, mean, sd)
    const { meanYears, sdYears, medianYears } = lifetimeMoments(lifetime)
    return { mean: meanYears, sd: sdYears, ...parametersOf(lifetime), median: medianYears }
  } catch (fault) {
    if (fault instanceof ComputeError && fault.code === 'parameter-out-of-range') return undefined
    throw fault
  }
}

function momentFigures(inputs: ConformanceInputs) {
  const [mean, sd] = [numberOf(inputs, 'mean'), numberOf(inputs, 'sd')]
  const asked = inputs.family === undefined ? 'weibull' : modelOf(textOf(inputs, 'family'))
  const byFamily = Object.entries(FITTED).map(([family, model]) => [family, fitted(model, mean, sd)] as const)
  return { ...fitted(asked, mean, sd), ...Object.fromEntries(byFamily) }
}

function weibullFigures(inputs: ConformanceInputs) {
  const weibull = {
    model: 'weibull',
    shape: numberOf(inputs, 'shape'),
    scaleYears: numberOf(inputs, 'scale'),
  } as const
  const { meanYears, sdYears, medianYears } = lifetimeMoments(weibull)
  return {
    mean: meanYears,
    median: medianYears,
    sd: sdYears,
    cv: sdYears / meanYears,
    mode: weibullModeYears(weibull),
    S_at_scale: survival(weibull.scaleYears, weibull),
    S_at_mean: survival(meanYears, weibull),
  }
}

function cohortFigures(inputs: ConformanceInputs) {
  const years = numberOf(inputs, 'years')
  const table = tabulateSurvival(lifetimeOf(inputs), optionalNumberOf(inputs, 'o') ?? 0.5, years)
  const { outflow, standing } = cohortOutflow(table, 1)
  const amount = optionalNumberOf(inputs, 'N') ?? 1
  return {
    outflow_share: outflow,
    surviving_share: standing,
    still_standing_at_end: standing.at(-1),
    outflow: outflow.map((share) => amount * share),
    standing: standing.map((share) => amount * share),
  }
}

function uniformCohortFigures(inputs: ConformanceInputs) {
  const { outflow, standing } = cohortOutflow(tabulateUniformYear(lifetimeOf(inputs), 0, numberOf(inputs, 'years')), 1)
  return { surviving_share: standing, outflow_share: outflow, still_standing_at_end: standing.at(-1) }
}

/** Lifetime models and the course of one cohort. */
export const lifetimeMethods: Readonly<Record<string, ConformanceMethod>> = {
  lifetime: lifetimeFigures,
  'lifetime-from-mean-sd': momentFigures,
  'weibull-moments': weibullFigures,
  'cohort-outflow': cohortFigures,
  'cohort-outflow-uniform': uniformCohortFigures,
}
