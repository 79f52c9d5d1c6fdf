import type { FixedLifetime, LifetimeLaw } from '@/shared/compute/lifetime/lifetime.types'
import { requirePositive } from '@/shared/compute/lifetime/requirePositive'

/**
 * Everything stands before age L and nothing from age L on: S = 1 for a < L, 0 for a ≥ L.
 *
 * @throws {ComputeError} `parameter-not-positive`
 * @see Common practice; the limit of every law below for sd → 0.
 * @example
 * fixedLaw({ model: 'fixed', lifetimeYears: 60 }).logSurvival(60) // => -Infinity
 */
export function fixedLaw({ lifetimeYears }: FixedLifetime): LifetimeLaw {
  requirePositive({ lifetimeYears })
  return {
    logSurvival: (ageYears) => (ageYears < lifetimeYears ? 0 : -Infinity),
    hazardPerYear: (ageYears) => (ageYears < lifetimeYears ? 0 : Infinity),
    moments: () => ({ meanYears: lifetimeYears, sdYears: 0, medianYears: lifetimeYears }),
  }
}
