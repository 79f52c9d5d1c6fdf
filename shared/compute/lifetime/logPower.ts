/**
 * Logarithm of a power, with 0⁰ = 1.
 *
 * @param base ≥ 0
 * @param exponent any number
 * @returns exponent · ln(base), 0 for exponent 0
 * @example
 * logPower(0, 0) // => 0
 * logPower(Math.E, 3) // => 3
 */
export function logPower(base: number, exponent: number): number {
  return exponent === 0 ? 0 : exponent * Math.log(base)
}
