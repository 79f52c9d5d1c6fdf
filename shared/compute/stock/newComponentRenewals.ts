import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'
import { tabulateSurvival } from '@/shared/compute/lifetime/tabulateSurvival'
import { renewalsAfter, type Renewals } from './renewalsAfter'

/**
 * Renewals of a component that is new at the start: u_n = f_n + Σ_(0<j<n) f_j u_(n−j), f_j = S(j − 1) − S(j).
 *
 * @param years n = 1 … years, ≥ 1
 * @returns at L, 2L, … for a fixed life L; constant 1 − e^(−1/m) for an exponential one
 * @throws {ComputeError} `empty-input`, those of the lifetime
 * @see Feller, W. (1968). An Introduction to Probability Theory and Its Applications, vol. 1, 3rd ed., ch. XIII.
 * @example
 * newComponentRenewals({ model: 'fixed', lifetimeYears: 2 }, 5).all // => [0, 1, 0, 1, 0]
 */
export function newComponentRenewals(lifetime: Lifetime, years: number): Renewals {
  return renewalsAfter(tabulateSurvival(lifetime, 0, years).leaving, lifetime)
}
