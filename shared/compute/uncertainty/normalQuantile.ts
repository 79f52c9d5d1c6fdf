import erfinv from '@stdlib/math-base-special-erfinv'
import { logNormalTail } from '@/shared/compute/lifetime/logNormalTail'
import { normalHazard } from '@/shared/compute/lifetime/normalHazard'
import { requireProbability } from './requireProbability'

/** Below this tail 2p − 1 has lost digits and Newton's steps on the logarithm of the tail restore them. */
const FAR_TAIL = 0.02
const FARTHEST_FOR_ERFINV = 1e-12
const MOST_STEPS = 20

/**
 * Quantile of the standard normal distribution, z = √2·erf⁻¹(2p − 1), in the tails by Newton's method on ln P(Z > z).
 *
 * @param probability p [–], in (0, 1)
 * @returns z [–], any real number, rising with p
 * @throws {ComputeError} `share-out-of-range`
 * @remarks relative error below 1e-14 for 1e-300 ≤ p ≤ 0.5 against SciPy 1.17
 * @see Abramowitz, M. & Stegun, I. A. (1964). Handbook of Mathematical Functions, §26.2.
 * @example
 * normalQuantile(0.975) // => 1.959963984540054
 * normalQuantile(1e-20) // => -9.262340089798408
 */
export function normalQuantile(probability: number): number {
  requireProbability(probability)
  const tail = Math.min(probability, 1 - probability)
  const sign = probability < 0.5 ? -1 : 1
  if (tail > FAR_TAIL) return Math.SQRT2 * erfinv(2 * probability - 1)
  const logTail = Math.log(tail)
  let z = tail > FARTHEST_FOR_ERFINV ? -Math.SQRT2 * erfinv(2 * tail - 1) : Math.sqrt(-2 * logTail)
  for (let step = 0; step < MOST_STEPS; step++) {
    const change = (logNormalTail(z) - logTail) / normalHazard(z)
    z += change
    if (Math.abs(change) <= 1e-15 * z) break
  }
  return sign * z
}
