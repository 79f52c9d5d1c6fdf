import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'
import { comingDownChances } from './comingDownChances'
import { renewalsAfter, type Renewals } from './renewalsAfter'

/**
 * Renewals of a component of known age b: the first life ends with g_j = [S(b + j − 1) − S(b + j)]/S(b), later ones
 * are ordinary. A component that ought not to be in place any more is renewed in the first year.
 *
 * @param ageYears b [yr], ≥ 0; 0 is a new component
 * @param years n = 1 … years, ≥ 0
 * @throws {ComputeError} `negative-age`, those of the lifetime
 * @see Cox, D. R. (1962). Renewal Theory, §2.2 (modified renewal process).
 * @example
 * knownAgeRenewals({ model: 'fixed', lifetimeYears: 3 }, 2, 5).all // => [1, 0, 0, 1, 0]
 */
export function knownAgeRenewals(lifetime: Lifetime, ageYears: number, years: number): Renewals {
  return renewalsAfter(comingDownChances(lifetime, ageYears, years).chances, lifetime)
}
