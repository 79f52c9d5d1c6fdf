import type { Position, Ring } from './spatial.types'

/**
 * Whether a position lies inside a ring, by counting the sides it sees to the east. A position on a side shared by two
 * rings lies in exactly one of them, because both count the side with the same arithmetic.
 *
 * @param position tested position [°]
 * @param ring closed or open, not across the 180° meridian
 * @returns true inside; on the boundary true for one of the neighbours
 * @remarks Within rounding of a corner, sides that are not shared decide as well: there a position may lie in both rings
 *   or in neither. Buildings are counted by an interior point, which is no corner.
 * @see Shimrat, M. (1962). Algorithm 112: position of point relative to polygon. Communications of the ACM 5, 434.
 * @example
 * pointInRing([0.5, 0.5], [[0, 0], [1, 0], [1, 1], [0, 1], [0, 0]]) // => true
 * pointInRing([1.5, 0.5], [[0, 0], [1, 0], [1, 1], [0, 1], [0, 0]]) // => false
 */
export function pointInRing(position: Position, ring: Ring): boolean {
  let isInside = false
  let from = ring.at(-1)
  for (const to of ring) {
    if (from !== undefined && isWestOf(position, from, to)) isInside = !isInside
    from = to
  }
  return isInside
}

function isWestOf([longitude, latitude]: Position, one: Position, other: Position): boolean {
  const [lower, upper] = one[1] <= other[1] ? [one, other] : [other, one]
  if (!(lower[1] <= latitude && latitude < upper[1])) return false
  const turn = (upper[0] - lower[0]) * (latitude - lower[1]) - (longitude - lower[0]) * (upper[1] - lower[1])
  return turn > 0
}
