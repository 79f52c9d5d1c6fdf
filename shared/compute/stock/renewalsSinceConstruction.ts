import { ComputeError } from '@/shared/compute/errors'
import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'
import { tabulateSurvival } from '@/shared/compute/lifetime/tabulateSurvival'
import { newComponentRenewals } from './newComponentRenewals'
import type { Renewals } from './renewalsAfter'

/**
 * Renewals of a component of unknown age in a building not much older than the component lives: it came with the
 * building, and what happened since is left to the model. The building alone is known to stand.
 *
 * @param buildingYears whole years since construction at the survey, ≥ 0
 * @param years n = 1 … years after the survey, ≥ 1
 * @returns `first` is the chance that the component in place at the survey ends in each year
 * @throws {ComputeError} `negative-age`, `empty-input`, those of the lifetime
 * @see Cox, D. R. (1962). Renewal Theory, §5.2 (forward recurrence time).
 * @example
 * renewalsSinceConstruction({ model: 'fixed', lifetimeYears: 4 }, 6, 3).all // => [0, 1, 0]
 */
export function renewalsSinceConstruction(lifetime: Lifetime, buildingYears: number, years: number): Renewals {
  if (!(Number.isInteger(buildingYears) && buildingYears >= 0))
    throw new ComputeError('negative-age', { buildingYears })
  const since = newComponentRenewals(lifetime, buildingYears + years).all
  const ending = tabulateSurvival(lifetime, 0, buildingYears + years).leaving
  const first = Float64Array.from({ length: years }, (_, index) => {
    const n = buildingYears + index + 1
    let chance = ending[n - 1]!
    for (let built = 1; built <= buildingYears; built++) chance += since[built - 1]! * ending[n - built - 1]!
    return chance
  })
  return { all: since.slice(buildingYears), first }
}
