import { ComputeError } from '@/shared/compute/errors'
import { lifetimeLaw } from './lifetimeLaw'
import type { Lifetime } from './lifetime.types'

/**
 * Density of the lifetime, f(a) = h(a) S(a).
 *
 * @param ageYears age a [yr], ≥ 0
 * @returns density [1/yr], ≥ 0; for a fixed lifetime 0 everywhere but at L itself, where it is Infinity
 * @throws {ComputeError} `negative-age`, `parameter-not-positive`, `not-a-number`
 * @see Kalbfleisch, J. D. & Prentice, R. L. (2002). The Statistical Analysis of Failure Time Data, 2nd ed., §1.2.
 * @example
 * densityPerYear(0, { model: 'exponential', meanYears: 50 }) // => 0.02
 */
export function densityPerYear(ageYears: number, lifetime: Lifetime): number {
  if (!(ageYears >= 0)) throw new ComputeError('negative-age', { ageYears })
  if (lifetime.model === 'fixed') return ageYears === lifetime.lifetimeYears ? Infinity : 0
  const law = lifetimeLaw(lifetime)
  const logSurvival = ageYears > 0 ? law.logSurvival(ageYears) : lawAtBirth(lifetime)
  if (logSurvival === -Infinity) return 0
  const density = law.hazardPerYear(ageYears) * Math.exp(logSurvival)
  if (Number.isNaN(density)) throw new ComputeError('not-a-number', { ageYears, ...lifetime })
  return density
}

/** The normal and the logistic law have lost a little before age 0; the others start at S = 1. */
function lawAtBirth(lifetime: Lifetime): number {
  return lifetime.model === 'normal' || lifetime.model === 'logistic' ? lifetimeLaw(lifetime).logSurvival(0) : 0
}
