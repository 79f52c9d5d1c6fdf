import { pointInRing } from './pointInRing'
import type { Outline, Position } from './spatial.types'

/**
 * Whether a position lies inside an outline and in none of its holes.
 *
 * @param position tested position [°]
 * @param outline rings [°], not across the 180° meridian
 * @returns true inside; on a boundary shared by two outlines true for exactly one of them
 * @example
 * pointInOutline([2, 2], { exterior: [[0, 0], [4, 0], [4, 4], [0, 4], [0, 0]], holes: [[[1, 1], [1, 3], [3, 3], [3, 1], [1, 1]]] }) // => false
 */
export function pointInOutline(position: Position, { exterior, holes }: Outline): boolean {
  return pointInRing(position, exterior) && !holes.some((hole) => pointInRing(position, hole))
}
