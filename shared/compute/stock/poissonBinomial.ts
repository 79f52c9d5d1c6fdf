import { ComputeError } from '@/shared/compute/errors'
import { logNormalTail } from '@/shared/compute/lifetime/logNormalTail'

/** How many of a number of buildings come down. */
export interface CountDistribution {
  /** Chance of 0, 1, … n [–]. */
  readonly probabilities: Float64Array
  readonly mean: number
  readonly variance: number
  /** Chance that nothing comes down at all, exact for any number of buildings [–]. */
  readonly noneProbability: number
  readonly isExact: boolean
}

/** Up to here the distribution is worked out exactly. */
export const MOST_EXACT_TRIALS = 2000

/**
 * Distribution of the number of demolitions among buildings with different chances: exact by convolution up to
 * 2 000 buildings, beyond by the normal law refined for skewness,
 *
 *     P(N ≤ k) ≈ Φ(x) + γ (1 − x²) φ(x)/6,   x = (k + ½ − μ)/σ.
 *
 * @param chances one for each building [–], in [0, 1]
 * @returns probabilities that add up to 1
 * @throws {ComputeError} `share-out-of-range`
 * @remarks beyond 2 000 buildings the cumulative chances are right to 0.002 for 15 expected demolitions, to 0.005 for 6;
 *   the cost is n²/2 up to 2 000, about 10 ms
 * @see Hong, Y. (2013). On computing the distribution function for the Poisson binomial distribution. Computational
 *   Statistics & Data Analysis 59, 41–51; Volkova, A. Y. (1996), the refinement.
 * @example
 * poissonBinomial([0.5, 0.5]).probabilities // => [0.25, 0.5, 0.25]
 */
export function poissonBinomial(chances: readonly number[] | Float64Array): CountDistribution {
  let [mean, variance, thirdMoment, logNone] = [0, 0, 0, 0]
  for (const chance of chances) {
    if (!(chance >= 0 && chance <= 1)) throw new ComputeError('share-out-of-range', { chance })
    mean += chance
    variance += chance * (1 - chance)
    thirdMoment += chance * (1 - chance) * (1 - 2 * chance)
    logNone += Math.log1p(-chance)
  }
  const isExact = chances.length <= MOST_EXACT_TRIALS || variance === 0
  const probabilities = isExact ? convolved(chances) : refinedNormal(chances.length, mean, variance, thirdMoment)
  return { probabilities, mean, variance, noneProbability: Math.exp(logNone), isExact }
}

function convolved(chances: readonly number[] | Float64Array): Float64Array {
  const probabilities = new Float64Array(chances.length + 1)
  probabilities[0] = 1
  let trials = 0
  for (const chance of chances) {
    trials++
    for (let count = trials; count > 0; count--) {
      probabilities[count] = probabilities[count]! * (1 - chance) + probabilities[count - 1]! * chance
    }
    probabilities[0]! *= 1 - chance
  }
  return probabilities
}

function refinedNormal(trials: number, mean: number, variance: number, thirdMoment: number): Float64Array {
  const sd = Math.sqrt(variance)
  const skewness = thirdMoment / sd ** 3
  const upTo = (count: number): number => {
    if (count >= trials) return 1
    const x = (count + 0.5 - mean) / sd
    const density = Math.exp((-x * x) / 2) / Math.sqrt(2 * Math.PI)
    return Math.min(1, Math.max(0, Math.exp(logNormalTail(-x)) + (skewness * (1 - x * x) * density) / 6))
  }
  let below = 0
  return Float64Array.from({ length: trials + 1 }, (_, count) => {
    // the refinement may dip far out in a tail; a chance is never negative
    const upToCount = Math.max(below, upTo(count))
    const probability = upToCount - below
    below = upToCount
    return probability
  })
}
