import { ComputeError } from '@/shared/compute/errors'

/**
 * Error of a mean factor from the spread of single buildings: the spread of the mean shrinks to GSD^(1/√n), the step
 * to another region or period does not,
 *
 *     σ² = (ln GSD)²/n + ln(1 + CV_t²),   CV = √(e^{σ²} − 1)
 *
 * @param gsdBetweenBuildings geometric standard deviation between buildings [–], ≥ 1
 * @param sampleCount independent buildings behind it n [–], ≥ 1
 * @param transferCv coefficient of variation of the step to this district CV_t [–], ≥ 0
 * @returns coefficient of variation of the mean [–], shared by all buildings that use the factor, ≥ CV_t
 * @throws {ComputeError} `parameter-out-of-range`
 * @see lognormal moments: Crow, E. L., Shimizu, K. (1988). Lognormal distributions, chapter 1.
 * @example
 * meanFactorCv(1.802, 245, 0) // => 0.037636577368704
 * meanFactorCv(1.802, 245, 0.22) // => 0.2233496611475
 */
export function meanFactorCv(gsdBetweenBuildings: number, sampleCount: number, transferCv: number): number {
  if (!(gsdBetweenBuildings >= 1 && sampleCount >= 1 && transferCv >= 0)) {
    throw new ComputeError('parameter-out-of-range', { gsdBetweenBuildings, sampleCount, transferCv })
  }
  const logVariance = Math.log(gsdBetweenBuildings) ** 2 / sampleCount + Math.log1p(transferCv ** 2)
  return Math.sqrt(Math.expm1(logVariance))
}
