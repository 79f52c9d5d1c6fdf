import { logSurvival } from '@/shared/compute/lifetime/logSurvival'
import type { Lifetime } from '@/shared/compute/lifetime/lifetime.types'
import { ComputeError } from '@/shared/compute/errors'
import { sum } from '@/shared/compute/sum'
import { chiSquareQuantile } from '@/shared/compute/uncertainty/chiSquareQuantile'
import { requireLives, type ObservedLife } from './observedLives'

/** Fewer demolitions than this are reported, and never applied by themselves. Common practice. */
export const LEAST_OBSERVED = 10

export interface LocalMultiplier {
  readonly observed: number
  readonly expected: number
  /** m = O/E, for the hazard of the district. */
  readonly multiplier: number
  readonly interval: readonly [number, number]
  readonly mayBeApplied: boolean
}

/**
 * Local multiplier of a reference lifetime, m = O/E with E = Σ[H(x) − H(e)] and exact Poisson limits,
 *
 *     lower = χ²(α/2; 2O)/2E,   upper = χ²(1 − α/2; 2O + 2)/2E.
 *
 * @throws {ComputeError} `empty-input`, `interval-reversed`, `undefined-statistic` when the lifetime expects nothing
 * @see Breslow, N. E. & Day, N. E. (1987). Statistical Methods in Cancer Research, vol. II, §2.3 (Garwood limits).
 * @example
 * observedToExpected([{ entryAgeYears: 0, exitAgeYears: 50, isDemolished: true }], { model: 'exponential', meanYears: 50 }).multiplier // => 1
 */
export function observedToExpected(
  lives: readonly ObservedLife[],
  lifetime: Lifetime,
  confidence = 0.95,
): LocalMultiplier {
  requireLives(lives)
  const observed = lives.filter(({ isDemolished }) => isDemolished).length
  const expected = sum(
    lives.map(
      ({ entryAgeYears, exitAgeYears }) => logSurvival(entryAgeYears, lifetime) - logSurvival(exitAgeYears, lifetime),
    ),
  )
  if (!(expected > 0 && expected < Infinity)) throw new ComputeError('undefined-statistic', { expected })
  const tail = (1 - confidence) / 2
  const lower = observed === 0 ? 0 : chiSquareQuantile(tail, 2 * observed) / 2
  const upper = chiSquareQuantile(1 - tail, 2 * observed + 2) / 2
  return {
    observed,
    expected,
    multiplier: observed / expected,
    interval: [lower / expected, upper / expected],
    mayBeApplied: observed >= LEAST_OBSERVED,
  }
}
