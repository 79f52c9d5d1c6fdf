import fc from 'fast-check'
import type { Lifetime, LifetimeModel } from '@/shared/compute/lifetime/lifetime.types'
import { lifetimeFromMeanSd } from '@/shared/compute/lifetime/lifetimeFromMeanSd'

const SPREAD_MODELS: readonly LifetimeModel[] = [
  'normal',
  'truncatedNormal',
  'foldedNormal',
  'lognormal',
  'weibull',
  'gamma',
  'logistic',
  'truncatedLogistic',
  'logLogistic',
]

/** A lifetime of any model with a mean of 5 to 200 years and a sd of 5 to 70 % of it. */
export function anyLifetime(): fc.Arbitrary<Lifetime> {
  const mean = fc.double({ min: 5, max: 200, noNaN: true })
  const cv = fc.double({ min: 0.05, max: 0.7, noNaN: true })
  return fc.oneof(
    mean.map((meanYears): Lifetime => ({ model: 'fixed', lifetimeYears: meanYears })),
    mean.map((meanYears): Lifetime => ({ model: 'exponential', meanYears })),
    fc
      .tuple(fc.constantFrom(...SPREAD_MODELS), mean, cv)
      .map(([model, meanYears, ratio]) => lifetimeFromMeanSd(model, meanYears, ratio * meanYears)),
  )
}
