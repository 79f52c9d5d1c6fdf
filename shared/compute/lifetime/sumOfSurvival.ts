import { ComputeError } from '@/shared/compute/errors'
import { integral } from './integral'
import { lifetimeLaw } from './lifetimeLaw'
import type { Lifetime } from './lifetime.types'

const NOTHING_LEFT = -45
const MOST_TERMS = 4000

/**
 * Stock that a constant inflow of one unit a year settles at, Σ_(j≥0) S(j + o): close to the mean life for o = 0.5.
 *
 * @param yearOffset o, age at the end of the construction year [yr], ≥ 0
 * @returns years; Infinity for a log-logistic life with β ≤ 1
 * @throws {ComputeError} `negative-age`, `parameter-not-positive`, `not-a-number`
 * @remarks relative error below 1e-11; a heavy tail is summed by the Euler–Maclaurin formula
 * @see Abramowitz, M. & Stegun, I. A. (1964). Handbook of Mathematical Functions, 3.6.28.
 * @example
 * sumOfSurvival({ model: 'fixed', lifetimeYears: 25 }, 0) // => 25
 */
export function sumOfSurvival(lifetime: Lifetime, yearOffset: number): number {
  if (!(yearOffset >= 0)) throw new ComputeError('negative-age', { yearOffset })
  if (lifetime.model === 'logLogistic' && lifetime.shape <= 1) return Infinity
  const law = lifetimeLaw(lifetime)
  let total = 0
  for (let j = 0; j < MOST_TERMS; j++) {
    const age = j + yearOffset
    const log = age > 0 ? law.logSurvival(age) : 0
    if (log < NOTHING_LEFT) return total
    total += Math.exp(log)
  }
  return total + tail(MOST_TERMS + yearOffset, lifetime)
}

/** ∫_a^∞ S + S(a)/2 − S′(a)/12. */
function tail(ageYears: number, lifetime: Lifetime): number {
  const law = lifetimeLaw(lifetime)
  if (lifetime.model === 'fixed') return Math.max(0, Math.ceil(lifetime.lifetimeYears - ageYears))
  const start = law.logSurvival(ageYears)
  const left = integral((years) => Math.exp(law.logSurvival(ageYears + years) - start), { scale: ageYears })
  return Math.exp(start) * (left + 0.5 + law.hazardPerYear(ageYears) / 12)
}
