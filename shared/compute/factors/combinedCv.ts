import { ComputeError } from '@/shared/compute/errors'

/**
 * Coefficient of variation of a product of independent quantities,
 *
 *     1 + CV² = Π (1 + CVᵢ²)
 *
 * @param cvs coefficients of variation [–], ≥ 0
 * @returns their combination [–], not below the largest; 0 for none
 * @throws {ComputeError} `parameter-out-of-range`
 * @see Goodman, L. A. (1960). On the exact variance of products. JASA 55, 708–713.
 * @example
 * combinedCv([0.3, 0.4]) // => 0.514198405
 */
export function combinedCv(cvs: readonly number[]): number {
  if (cvs.some((cv) => !(cv >= 0))) throw new ComputeError('parameter-out-of-range', { cvs })
  return Math.sqrt(Math.expm1(cvs.reduce((total, cv) => total + Math.log1p(cv * cv), 0)))
}
