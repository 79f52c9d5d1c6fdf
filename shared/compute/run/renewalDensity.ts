import type { SurvivalTable } from './survivalTable'

/**
 * Renewals expected in the n-th year after a component was built in, first and all later lives,
 *
 *     u_n = f_n + Σ_(0<j<n) f_j u_(n−j),   f_j = S(j − 1 + o) − S(j + o),
 *
 * with the construction year itself as n = 0.
 *
 * @returns u by n, as long as the table; far from n = 0 it settles at one over the mean life
 * @see Feller, W. (1968). An Introduction to Probability Theory and Its Applications, vol. 1, 3rd ed., ch. XIII.
 */
export function renewalDensity(table: SurvivalTable): Float64Array {
  const length = table.survival.length
  const density = new Float64Array(length)
  const ending = (year: number) => (year === 0 ? 1 - table.survival[0]! : table.falling[year - 1]!)
  for (let n = 0; n < length; n++) {
    let renewals = ending(n)
    for (let j = 1; j < n; j++) renewals += ending(j) * density[n - j]!
    density[n] = renewals
  }
  return density
}
