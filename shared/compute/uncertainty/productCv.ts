import { ComputeError } from '@/shared/compute/errors'

/**
 * Coefficient of variation of a product of independent quantities: exactly 1 + CV² = Π(1 + CV_i²), and to first
 * order CV² = ΣCV_i², which is good below about 0.2 only.
 *
 * @param cvs coefficients of variation [–], each ≥ 0; of none the product is certain
 * @returns exact ≥ firstOrder
 * @throws {ComputeError} `parameter-out-of-range`
 * @see Goodman, L. A. (1960). Journal of the American Statistical Association 55, 708–713.
 * @example
 * productCv([0.3]).exact // => 0.3
 */
export function productCv(cvs: readonly number[]): { exact: number; firstOrder: number } {
  let log = 0
  let squares = 0
  for (const cv of cvs) {
    if (!(cv >= 0 && cv < Infinity)) throw new ComputeError('parameter-out-of-range', { cv })
    log += Math.log1p(cv * cv)
    squares += cv * cv
  }
  return { exact: Math.sqrt(Math.expm1(log)), firstOrder: Math.sqrt(squares) }
}
