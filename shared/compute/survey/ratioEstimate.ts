import { ComputeError } from '@/shared/compute/errors'
import { sum } from '@/shared/compute/sum'

export interface RatioEstimate {
  readonly ratio: number
  readonly standardError: number
  readonly total: number
  readonly totalStandardError: number
}

/**
 * Ratio estimator with a known total X of the auxiliary variable,
 *
 *     R̂ = Σy/Σx,   V(R̂) = (1 − f)/(n x̄²)·Σ(y − R̂x)²/(n − 1),   T̂ = R̂ X.
 *
 * Better than expansion when y is near proportional to x; its bias of order 1/n asks for n ≥ 20.
 *
 * @param frameCount N, buildings in the frame
 * @param auxiliaryTotal X, known for the whole frame
 * @throws {ComputeError} `length-mismatch`, `stratum-too-small`, `parameter-not-positive`
 * @see Cochran, W. G. (1977). Sampling Techniques, 3rd ed., ch. 6.
 * @example
 * ratioEstimate([1, 2, 3], [2, 4, 6], 100, 300).total // => 600
 */
export function ratioEstimate(
  x: readonly number[],
  y: readonly number[],
  frameCount: number,
  auxiliaryTotal: number,
): RatioEstimate {
  if (x.length !== y.length) throw new ComputeError('length-mismatch', { x: x.length, y: y.length })
  const n = x.length
  if (n < 2) throw new ComputeError('stratum-too-small', { sampleCount: n })
  const sumX = sum(x)
  if (!(sumX > 0)) throw new ComputeError('parameter-not-positive', { sumX })
  const ratio = sum(y) / sumX
  const residuals = sum(y.map((value, index) => (value - ratio * x[index]!) ** 2)) / (n - 1)
  const standardError = Math.sqrt(((1 - n / frameCount) * residuals) / n) / (sumX / n)
  return { ratio, standardError, total: ratio * auxiliaryTotal, totalStandardError: standardError * auxiliaryTotal }
}
