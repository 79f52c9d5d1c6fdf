import { ComputeError } from '@/shared/compute/errors'
import { bracketedRoot } from './bracketedRoot'
import { integral } from './integral'
import { lifetimeLaw } from './lifetimeLaw'
import type { Lifetime } from './lifetime.types'

export interface RemainingLife {
  readonly meanYears: number
  readonly medianYears: number
}

const MOST_DOUBLINGS = 1000

/**
 * What is left of the life of a building that stands at age a,
 *
 *     mean = ∫_a^∞ S(t) dt / S(a),   median: S(a + x) = S(a)/2.
 *
 * @param ageYears age a [yr], ≥ 0
 * @returns years; 0 where the model leaves no survivor at age a, mean Infinity for a log-logistic life with β ≤ 1
 * @throws {ComputeError} `negative-age`, `parameter-not-positive`, `not-a-number`
 * @remarks relative error below 1e-10
 * @see Kalbfleisch, J. D. & Prentice, R. L. (2002). The Statistical Analysis of Failure Time Data, 2nd ed., §1.2.
 * @example
 * remainingLife(200, { model: 'exponential', meanYears: 70 }) // => { meanYears: 70, medianYears: 48.52030263919617 }
 * remainingLife(45, { model: 'fixed', lifetimeYears: 60 }) // => { meanYears: 15, medianYears: 15 }
 */
export function remainingLife(ageYears: number, lifetime: Lifetime): RemainingLife {
  if (!(ageYears >= 0)) throw new ComputeError('negative-age', { ageYears })
  const law = lifetimeLaw(lifetime)
  if (lifetime.model === 'fixed') {
    const left = Math.max(0, lifetime.lifetimeYears - ageYears)
    return { meanYears: left, medianYears: left }
  }
  const start = ageYears > 0 ? law.logSurvival(ageYears) : 0
  if (start === -Infinity) return { meanYears: 0, medianYears: 0 }
  const logLeft = (years: number) => (years > 0 ? law.logSurvival(ageYears + years) - start : 0)
  const medianYears = bracketedRoot((years) => logLeft(years) + Math.LN2, 0, pastMedian(logLeft))
  if (lifetime.model === 'logLogistic' && lifetime.shape <= 1) return { meanYears: Infinity, medianYears }
  const meanYears = integral((years) => Math.exp(logLeft(years)), { scale: Math.max(medianYears, 1e-9) })
  return { meanYears, medianYears }
}

function pastMedian(logLeft: (years: number) => number): number {
  let years = 1e-6
  for (let step = 0; step < MOST_DOUBLINGS; step++) {
    if (logLeft(years) <= -Math.LN2) return years
    years *= 2
  }
  throw new ComputeError('not-converged', { years })
}
