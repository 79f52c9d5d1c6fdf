import { localPlane } from '@/shared/compute/spatial/localPlane'
import type { Position } from '@/shared/compute/spatial/spatial.types'

/**
 * About how far it is to go from door to door: from the first position always on to the nearest one not yet visited,
 * as the crow flies. Streets are longer; for comparing beats, not for timing a day.
 *
 * @param positions inner points of the buildings [°], in any order
 * @returns length [m], 0 for fewer than two positions
 * @see Rosenkrantz, D. J., Stearns, R. E. & Lewis, P. M. (1977). An analysis of several heuristics for the traveling
 *   salesman problem. SIAM Journal on Computing 6, 563–581 (nearest neighbour).
 * @example
 * walkLength([[0, 0], [0.002, 0], [0.001, 0]]) // => 222.638981591
 */
export function walkLength(positions: readonly Position[]): number {
  const [first] = positions
  if (first === undefined) return 0
  const { toPlane } = localPlane(first)
  const left = positions.slice(1).map(toPlane)
  let here = toPlane(first)
  let lengthM = 0
  while (left.length > 0) {
    let nearest = 0
    let leastM = Infinity
    for (const [index, [x, y]] of left.entries()) {
      const distanceM = Math.hypot(x - here[0], y - here[1])
      if (distanceM < leastM) [nearest, leastM] = [index, distanceM]
    }
    lengthM += leastM
    here = left[nearest] ?? here
    left.splice(nearest, 1)
  }
  return lengthM
}
