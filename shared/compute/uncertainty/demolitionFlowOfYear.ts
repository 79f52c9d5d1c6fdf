import { ComputeError } from '@/shared/compute/errors'
import { sum } from '@/shared/compute/sum'
import type { MassMoments } from './factorGroup.types'

export interface FlowMoments extends MassMoments {
  /** Part of the variance that more or better surveying cannot take away [–], in [0, 1]. */
  readonly factorShareOfVariance: number
}

/**
 * Mean and standard deviation of what comes down in one year with one shared factor,
 *
 *     Var = E[F²]·Σ (E[A²] p − A̅² p²) + Var F·(Σ A̅ p)²,
 *
 * where the first term is E[F²]·Σ A² p(1 − p) for areas without error.
 *
 * @param areasM2 areas [m²], ≥ 0
 * @param chances p of each building to come down in the year [–], as long
 * @param areaCv of each area, independent [–], ≥ 0; 0 unless given
 * @throws {ComputeError} `length-mismatch`, `share-out-of-range`, `negative-area`, `parameter-out-of-range`
 * @see law of total variance; Bernoulli draws independent given the factor. Johnson, N. L., Kotz, S. & Balakrishnan, N.
 *   (1997). Discrete Multivariate Distributions, ch. 35.
 * @example
 * demolitionFlowOfYear(800, 0, [100], [0.5]) // => { meanKg: 40000, sdKg: 40000, cv: 1, factorShareOfVariance: 0 }
 */
export function demolitionFlowOfYear(
  factorMeanKgPerM2: number,
  factorCv: number,
  areasM2: readonly number[],
  chances: readonly number[],
  areaCv = 0,
): FlowMoments {
  if (areasM2.length !== chances.length)
    throw new ComputeError('length-mismatch', { areas: areasM2.length, chances: chances.length })
  if (!(factorMeanKgPerM2 >= 0 && factorCv >= 0 && areaCv >= 0))
    throw new ComputeError('parameter-out-of-range', { factorMeanKgPerM2, factorCv, areaCv })
  areasM2.forEach((areaM2, index) => {
    const chance = chances[index]!
    if (!(areaM2 >= 0)) throw new ComputeError('negative-area', { areaM2 })
    if (!(chance >= 0 && chance <= 1)) throw new ComputeError('share-out-of-range', { chance })
  })
  const factorVariance = (factorMeanKgPerM2 * factorCv) ** 2
  const expected = sum(areasM2.map((area, index) => area * chances[index]!))
  const ofBuildings = sum(
    areasM2.map((area, index) => area ** 2 * chances[index]! * (1 - chances[index]! + areaCv ** 2)),
  )
  const byFactor = factorVariance * expected ** 2
  const variance = (factorMeanKgPerM2 ** 2 + factorVariance) * ofBuildings + byFactor
  const [meanKg, sdKg] = [factorMeanKgPerM2 * expected, Math.sqrt(variance)]
  return {
    meanKg,
    sdKg,
    cv: meanKg === 0 ? 0 : sdKg / meanKg,
    factorShareOfVariance: variance === 0 ? 0 : byFactor / variance,
  }
}
