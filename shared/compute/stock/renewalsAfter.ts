import { ComputeError } from '@/shared/compute/errors'
import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'
import { tabulateSurvival } from '@/shared/compute/lifetime/tabulateSurvival'

/** Renewals of a component, year by year. */
export interface Renewals {
  /** Expected renewals in year n = 1, 2, … [–], first and all later lives. */
  readonly all: Float64Array
  /** Those of the component that was in place at the start. */
  readonly first: Float64Array
}

/**
 * Renewals expected in each of the years ahead, first and all later lives,
 *
 *     v_n = g_n + Σ_(0<j<n) g_j u_(n−j),   u_n = f_n + Σ_(0<j<n) f_j u_(n−j),   f_j = S(j − 1) − S(j),
 *
 * with g the chances of the component in place to end in each year; for a new one g = f.
 *
 * @param first g, chances of the component in place [–]
 * @param lifetime of the later components
 * @returns series as long as g
 * @throws {ComputeError} `share-out-of-range`, those of the lifetime
 * @remarks cost n²
 * @see Feller, W. (1968). An Introduction to Probability Theory and Its Applications, vol. 1, 3rd ed., ch. XIII.
 * @example
 * renewalsAfter(Float64Array.of(0, 1, 0, 0), { model: 'fixed', lifetimeYears: 2 }).all // => [0, 1, 0, 1]
 */
export function renewalsAfter(first: Float64Array, lifetime: Lifetime): Renewals {
  const years = first.length
  const all = new Float64Array(years)
  if (years === 0) return { all, first }
  const ending = tabulateSurvival(lifetime, 0, years).leaving
  for (let n = 0; n < years; n++) {
    if (!(first[n]! >= 0 && first[n]! <= 1)) throw new ComputeError('share-out-of-range', { chance: first[n] })
    let renewals = first[n]!
    // every renewal j years ago, of whatever life, ends again now
    for (let j = 1; j <= n; j++) renewals += ending[j - 1]! * all[n - j]!
    all[n] = renewals
  }
  return { all, first }
}
