import erfc from '@stdlib/math-base-special-erfc'
import { bracketedRoot } from '@/shared/compute/lifetime/bracketedRoot'
import { foldedNormalShape } from '@/shared/compute/lifetime/foldedNormalShape'
import type { FoldedNormalLifetime, LifetimeLaw, LifetimeMoments } from '@/shared/compute/lifetime/lifetime.types'
import { logNormalTail } from '@/shared/compute/lifetime/logNormalTail'
import { requireFinite } from '@/shared/compute/lifetime/requireFinite'
import { requirePositive } from '@/shared/compute/lifetime/requirePositive'

const HALF_LOG_2_PI = 0.5 * Math.log(2 * Math.PI)

/**
 * Normal law with its part below age 0 folded over: S(a) = Φ((μ − a)/σ) + Φ((−μ − a)/σ).
 *
 * @throws {ComputeError} `not-a-number`, `parameter-not-positive`
 * @see Leone, F. C., Nelson, L. S. & Nottingham, R. B. (1961). The folded normal distribution. Technometrics 3, 543–550.
 * @example
 * foldedNormalLaw({ model: 'foldedNormal', parentMeanYears: 0, parentSdYears: 10 }).moments().meanYears // => 7.978845608028654
 */
export function foldedNormalLaw({ parentMeanYears, parentSdYears }: FoldedNormalLifetime): LifetimeLaw {
  requireFinite({ parentMeanYears })
  requirePositive({ parentSdYears })
  const centre = Math.abs(parentMeanYears) / parentSdYears
  const logSurvival = (ageYears: number): number => {
    const z = ageYears / parentSdYears
    if (z < centre) return Math.log1p(-Math.max(0, leftShare(z, centre)))
    const upper = logNormalTail(z - centre)
    return upper === -Infinity ? upper : upper + Math.log1p(Math.exp(logNormalTail(z + centre) - upper))
  }
  const hazardPerYear = (ageYears: number): number => {
    const z = ageYears / parentSdYears
    const logDensity = -0.5 * (z - centre) ** 2 - HALF_LOG_2_PI + Math.log1p(Math.exp(-2 * z * centre))
    return Math.exp(logDensity - logSurvival(ageYears)) / parentSdYears
  }
  const moments = (): LifetimeMoments => {
    const { mean, sd } = foldedNormalShape(centre)
    const meanYears = mean * parentSdYears
    const medianYears = bracketedRoot((age) => logSurvival(age) + Math.LN2, 0, 2 * meanYears)
    return { meanYears, sdYears: sd * parentSdYears, medianYears }
  }
  return { logSurvival, hazardPerYear, moments }
}

/** 1 − S, small where S is near 1: Φ(z − α) − Φ(−z − α). */
function leftShare(z: number, centre: number): number {
  return 0.5 * (erfc((centre - z) * Math.SQRT1_2) - erfc((centre + z) * Math.SQRT1_2))
}
