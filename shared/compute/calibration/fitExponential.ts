import { ComputeError } from '@/shared/compute/errors'
import { sum } from '@/shared/compute/sum'
import { normalQuantile } from '@/shared/compute/uncertainty/normalQuantile'
import { requireLives, type ObservedLife } from './observedLives'

export interface ExponentialFit {
  readonly demolished: number
  readonly exposureYears: number
  readonly ratePerYear: number
  readonly meanYears: number
  /** Limits on the log scale. */
  readonly interval: readonly [number, number]
}

/**
 * Constant rate of demolition: events over the years watched, Σd/Σ(x − e).
 *
 * @throws {ComputeError} `empty-input`, `interval-reversed`, `undefined-statistic` when nothing came down
 * @see Klein & Moeschberger (2003), §12.2 and §3.5.
 * @example
 * fitExponential([{ entryAgeYears: 20, exitAgeYears: 70, isDemolished: true }]).ratePerYear // => 0.02
 */
export function fitExponential(lives: readonly ObservedLife[], confidence = 0.95): ExponentialFit {
  requireLives(lives)
  const demolished = lives.filter(({ isDemolished }) => isDemolished).length
  if (demolished === 0) throw new ComputeError('undefined-statistic', { what: 'no demolition observed' })
  const exposureYears = sum(lives.map(({ entryAgeYears, exitAgeYears }) => exitAgeYears - entryAgeYears))
  const ratePerYear = demolished / exposureYears
  const spread = Math.exp(normalQuantile((1 + confidence) / 2) / Math.sqrt(demolished))
  return {
    demolished,
    exposureYears,
    ratePerYear,
    meanYears: exposureYears / demolished,
    interval: [ratePerYear / spread, ratePerYear * spread],
  }
}
