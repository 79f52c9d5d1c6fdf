/**
 * ln(1 + e^x) without overflow and without losing a small e^x.
 *
 * @param x any number
 * @returns near 0 for very negative x, near x for large x
 * @see Mächler, M. (2012). Accurately computing log(1 − exp(−|a|)). R package Rmpfr, note.
 * @example
 * softplus(0) // => 0.6931471805599453
 * softplus(800) // => 800
 */
export function softplus(x: number): number {
  return x > 0 ? x + Math.log1p(Math.exp(-x)) : Math.log1p(Math.exp(x))
}
