/**
 * What the doubt of a mean life does to a flow. Flows answer to a life by nearly a power of it, so the answer is taken
 * in logarithms, ln E(z) = ln E − b·z − c·z² with z standard normal, fitted through one standard error either way:
 *
 *     b = ½ ln(E⁻/E⁺),   c = ln E − ½ ln(E⁻E⁺),
 *     shift = E·(e^(b²/2) − 1 − c),   Var = E²·(e^(2b²) − e^(b²) + 2c²).
 *
 * @param givenKg E, flow under the life as given [kg/yr], ≥ 0
 * @param shorterKg E⁻, one standard error shorter [kg/yr], ≥ 0
 * @param longerKg E⁺, one standard error longer [kg/yr], ≥ 0
 * @returns shift of the mean [kg/yr] and variance [kg²/yr²]; where a flow is zero, by differences instead
 * @remarks For a flow that is a power of the life both are exact; 500 drawn towns hold the interval to its word.
 * @see Johnson, Kotz & Balakrishnan (1994), Continuous Univariate Distributions, vol. 1, ch. 14 (lognormal moments).
 * @example
 * lifetimeDoubt(100, 100, 100) // => { shiftKg: 0, varianceKg2: 0 }
 */
export function lifetimeDoubt(
  givenKg: number,
  shorterKg: number,
  longerKg: number,
): { shiftKg: number; varianceKg2: number } {
  if (!(givenKg > 0 && shorterKg > 0 && longerKg > 0)) {
    const bend = shorterKg + longerKg - 2 * givenKg
    return { shiftKg: Math.max(-givenKg, bend / 2), varianceKg2: ((longerKg - shorterKg) / 2) ** 2 + bend ** 2 / 2 }
  }
  const slope = Math.log(shorterKg / longerKg) / 2
  const bend = Math.log(givenKg) - Math.log(shorterKg * longerKg) / 2
  const square = slope ** 2
  return {
    shiftKg: givenKg * (Math.expm1(square / 2) - bend),
    varianceKg2: givenKg ** 2 * (Math.exp(square) * Math.expm1(square) + 2 * bend ** 2),
  }
}
