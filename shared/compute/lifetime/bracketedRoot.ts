import { ComputeError } from '@/shared/compute/errors'

const MOST_STEPS = 400

/**
 * Root of a continuous function between two points where it has opposite signs, by halving: slow and never astray.
 *
 * @param rootOf function, may be infinite with a sign, never NaN
 * @param low one end of the bracket
 * @param high the other end
 * @returns x where rootOf changes its sign, to the last digits of x
 * @throws {ComputeError} `not-converged` when the ends do not enclose a root or the function is not a number
 * @remarks about 60 evaluations
 * @see Press, W. H. et al. (2007). Numerical Recipes, 3rd ed., §9.1.
 * @example
 * bracketedRoot((x) => x * x - 2, 0, 2) // => 1.4142135623730951
 */
export function bracketedRoot(rootOf: (x: number) => number, low: number, high: number): number {
  let [left, right] = [low, high]
  const [signAtLow, signAtHigh] = [Math.sign(rootOf(low)), Math.sign(rootOf(high))]
  if (signAtLow === 0) return low
  if (signAtHigh === 0) return high
  if (!(signAtLow * signAtHigh === -1)) throw new ComputeError('not-converged', { low, high, signAtLow, signAtHigh })
  for (let step = 0; step < MOST_STEPS; step++) {
    const middle = left + (right - left) / 2
    if (middle === left || middle === right) break
    const sign = Math.sign(rootOf(middle))
    if (Number.isNaN(sign)) throw new ComputeError('not-converged', { low, high, at: middle })
    if (sign === 0) return middle
    if (sign === signAtHigh) right = middle
    else left = middle
  }
  return left + (right - left) / 2
}
