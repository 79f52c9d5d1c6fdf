import { ComputeError } from '@/shared/compute/errors'
import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'
import { sumOfSurvival } from '@/shared/compute/lifetime/sumOfSurvival'
import { tabulateSurvival } from '@/shared/compute/lifetime/tabulateSurvival'
import type { Renewals } from './renewalsAfter'

/**
 * Renewals of a component of unknown age in a building much older than the component lives: its age has settled
 * and the rate is constant,
 *
 *     u = 1/Σ_(j≥0) S(j),   g_n = S(n − 1)/Σ_(j≥0) S(j) for the component in place.
 *
 * @param years n = 1 … years, ≥ 1
 * @throws {ComputeError} `undefined-statistic` for a life without a mean, `empty-input`, those of the lifetime
 * @see Cox, D. R. (1962). Renewal Theory, §2.2 (equilibrium renewal process).
 * @example
 * equilibriumRenewals({ model: 'fixed', lifetimeYears: 4 }, 3).all // => [0.25, 0.25, 0.25]
 */
export function equilibriumRenewals(lifetime: Lifetime, years: number): Renewals {
  const total = sumOfSurvival(lifetime, 0)
  if (!(total < Infinity)) throw new ComputeError('undefined-statistic', { lifetime, what: 'mean life' })
  const first = tabulateSurvival(lifetime, 0, years).survival.map((share) => share / total)
  return { all: new Float64Array(years).fill(1 / total), first }
}
