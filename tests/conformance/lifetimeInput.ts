import type { Lifetime, LifetimeModel } from '@/shared/compute/lifetime/lifetime.types'
import { lifetimeFromMeanSd } from '@/shared/compute/lifetime/lifetimeFromMeanSd'
import { isRecord, numberOf, optionalNumberOf, textOf, type ConformanceInputs } from './inputs'

/** Names under which check files know the models. */
const MODELS: Readonly<Record<string, LifetimeModel>> = {
  fixed: 'fixed',
  deterministic: 'fixed',
  exponential: 'exponential',
  normal: 'normal',
  normal_truncated_at_0: 'truncatedNormal',
  truncated_normal: 'truncatedNormal',
  folded_normal: 'foldedNormal',
  lognormal: 'lognormal',
  weibull: 'weibull',
  gamma: 'gamma',
  logistic: 'logistic',
  logistic_truncated_at_0: 'truncatedLogistic',
  truncated_logistic: 'truncatedLogistic',
  loglogistic: 'logLogistic',
  log_logistic: 'logLogistic',
}

/** The model named by `family`. */
export function modelOf(family: string): LifetimeModel {
  const model = MODELS[family]
  if (model === undefined) throw new Error(`unknown lifetime family "${family}"`)
  return model
}

/** The lifetime that `family` and `params` describe; parameters may also stand beside the family, or be mean and sd. */
export function lifetimeOf(inputs: ConformanceInputs): Lifetime {
  const model = modelOf(textOf(inputs, 'family'))
  const params = isRecord(inputs.params) ? inputs.params : inputs
  return READERS[model](params) ?? lifetimeFromMeanSd(model, numberOf(params, 'mean'), numberOf(params, 'sd'))
}

/** Reads the parameters of a model, nothing when they are given as mean and sd. */
type Reader = (params: ConformanceInputs) => Lifetime | undefined

const withShape =
  (model: 'weibull' | 'gamma' | 'logLogistic'): Reader =>
  (params) =>
    params.shape === undefined ? undefined : { model, shape: numberOf(params, 'shape'), scaleYears: scaleOf(params) }

const withParent =
  (model: 'truncatedNormal' | 'foldedNormal'): Reader =>
  (params) =>
    params.parent_mean === undefined
      ? undefined
      : { model, parentMeanYears: numberOf(params, 'parent_mean'), parentSdYears: numberOf(params, 'parent_sd') }

const withLocation =
  (model: 'logistic' | 'truncatedLogistic'): Reader =>
  (params) =>
    params.location === undefined
      ? undefined
      : { model, locationYears: numberOf(params, 'location'), scaleYears: scaleOf(params) }

const READERS: Readonly<Record<LifetimeModel, Reader>> = {
  fixed: (params) => ({ model: 'fixed', lifetimeYears: firstNumber(params, ['lifetime', 'L', 'mean']) }),
  exponential: (params) => ({
    model: 'exponential',
    meanYears: params.rate === undefined ? firstNumber(params, ['mean', 'scale']) : 1 / numberOf(params, 'rate'),
  }),
  normal: (params) => ({ model: 'normal', meanYears: numberOf(params, 'mean'), sdYears: numberOf(params, 'sd') }),
  truncatedNormal: withParent('truncatedNormal'),
  foldedNormal: withParent('foldedNormal'),
  lognormal: (params) =>
    params.meanlog === undefined
      ? undefined
      : { model: 'lognormal', logMean: numberOf(params, 'meanlog'), logSd: numberOf(params, 'sdlog') },
  weibull: withShape('weibull'),
  gamma: withShape('gamma'),
  logistic: withLocation('logistic'),
  truncatedLogistic: withLocation('truncatedLogistic'),
  logLogistic: withShape('logLogistic'),
}

function scaleOf(params: ConformanceInputs): number {
  return optionalNumberOf(params, 'scale') ?? 1 / numberOf(params, 'rate')
}

function firstNumber(params: ConformanceInputs, keys: readonly string[]): number {
  for (const key of keys) {
    const value = optionalNumberOf(params, key)
    if (value !== undefined) return value
  }
  throw new Error(`none of ${keys.join(', ')} is given`)
}
