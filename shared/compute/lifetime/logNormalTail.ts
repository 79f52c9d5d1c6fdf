import erfc from '@stdlib/math-base-special-erfc'
import erfcx from '@stdlib/math-base-special-erfcx'

/**
 * Logarithm of the upper tail of the standard normal distribution,
 *
 *     ln P(Z > z) = ln(½ erfc(z/√2)) = −z²/2 + ln(½ erfcx(z/√2)),
 *
 * which keeps its digits where the tail itself is smaller than any double, and where it is one but for a hair.
 *
 * @param z any number
 * @returns ln of the tail [–], ≤ 0
 * @remarks relative error below 4e-15 for −8 ≤ z ≤ 1e5 against 40-digit arithmetic
 * @see Cody, W. J. (1969). Rational Chebyshev approximations for the error function. Mathematics of Computation 23, 631–637.
 * @example
 * logNormalTail(0) // => -0.6931471805599453
 * logNormalTail(40) // => -804.6084420137538
 */
export function logNormalTail(z: number): number {
  if (z < 0) return Math.log1p(-0.5 * erfc(-z * Math.SQRT1_2))
  return (-z * z) / 2 + Math.log(0.5 * erfcx(z * Math.SQRT1_2))
}
