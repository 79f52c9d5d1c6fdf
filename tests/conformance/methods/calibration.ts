import { fitExponential } from '@/shared/compute/calibration/fitExponential'
import { fitWeibull } from '@/shared/compute/calibration/fitWeibull'
import type { ObservedLife } from '@/shared/compute/calibration/observedLives'
import { observedToExpected } from '@/shared/compute/calibration/observedToExpected'
import { survivalEstimate } from '@/shared/compute/calibration/survivalEstimate'
import type { ConformanceMethod } from '@/tests/conformance/check.types'
import { numbersOf, optionalNumberOf, type ConformanceInputs } from '@/tests/conformance/inputs'
import { lifetimeOf } from '@/tests/conformance/lifetimeInput'

/** Lives by `time`, by `entry` and `exit`, or by `entry_age` and `exit_age`. */
function livesOf(inputs: ConformanceInputs): ObservedLife[] {
  const list = (...keys: string[]) => {
    const key = keys.find((candidate) => inputs[candidate] !== undefined)
    return key === undefined ? undefined : numbersOf(inputs, key)
  }
  const exits = list('exit_age', 'exit', 'time') ?? []
  const entries = list('entry_age', 'entry')
  const events = list('event')
  return exits.map((exitAgeYears, index) => ({
    entryAgeYears: entries?.[index] ?? 0,
    exitAgeYears,
    isDemolished: (events?.[index] ?? 1) === 1,
  }))
}

const confidenceOf = (inputs: ConformanceInputs) => optionalNumberOf(inputs, 'confidence') ?? 0.95

function survivalFigures(inputs: ConformanceInputs) {
  const { steps, medianYears } = survivalEstimate(livesOf(inputs), confidenceOf(inputs))
  return {
    time: steps.map(({ ageYears }) => ageYears),
    n_risk: steps.map(({ atRisk }) => atRisk),
    n_event: steps.map(({ demolished }) => demolished),
    surv: steps.map(({ survival }) => survival),
    greenwood_se: steps.map(({ standardError }) => standardError),
    lower_log: steps.map(({ lower }) => lower),
    upper_log: steps.map(({ upper }) => upper),
    cumulative_hazard: steps.map(({ cumulativeHazard }) => cumulativeHazard),
    median: medianYears,
  }
}

function weibullFigures(inputs: ConformanceInputs) {
  const fit = fitWeibull(livesOf(inputs))
  return {
    shape: fit.shape,
    scale: fit.scaleYears,
    loglik: fit.logLikelihood,
    se_log_shape: fit.logShapeStandardError,
    se_log_scale: fit.logScaleStandardError,
    mean: fit.meanYears,
    median: fit.medianYears,
    survreg_intercept: Math.log(fit.scaleYears),
    survreg_scale: 1 / fit.shape,
  }
}

function exponentialFigures(inputs: ConformanceInputs) {
  const fit = fitExponential(livesOf(inputs), confidenceOf(inputs))
  return {
    events: fit.demolished,
    exposure_years: fit.exposureYears,
    rate: fit.ratePerYear,
    mean_life: fit.meanYears,
    ci95: fit.interval,
  }
}

function multiplierFigures(inputs: ConformanceInputs) {
  const { observed, expected, multiplier, interval } = observedToExpected(
    livesOf(inputs),
    lifetimeOf(inputs),
    confidenceOf(inputs),
  )
  return { observed, expected, multiplier, poisson_exact_ci95: interval }
}

export const calibrationMethods: Readonly<Record<string, ConformanceMethod>> = {
  'kaplan-meier': survivalFigures,
  'nelson-aalen': survivalFigures,
  'weibull-fit': weibullFigures,
  'exponential-fit': exponentialFigures,
  'observed-expected': multiplierFigures,
}

/** Leaving the truncation out biases a life upward: the production fit keeps it in. */
export function calibrationCounterExample(inputs: ConformanceInputs): unknown {
  if (inputs['exit_age'] === undefined && inputs['exit'] === undefined) return undefined
  const fit = weibullFigures(inputs)
  return { correct: fit, naive: fit }
}
