import { geodesicDistance } from './geodesicDistance'
import type { Position } from './spatial.types'

/** Why numbers cannot be [longitude, latitude] on WGS84. */
export type CoordinateFault =
  'not-a-number' | 'coordinates-swapped' | 'coordinates-projected' | 'coordinates-out-of-range'

const FULL_CIRCLE_DEG = 360
const NEAR_M = 100_000

/**
 * Looks for the usual faults of coordinates: metres of a map projection instead of degrees, latitude before longitude,
 * numbers that are none.
 *
 * @param positions pairs as read from a file
 * @param near a position of the district [°], if known: pairs that lie far from it as they stand but within 100 km when
 *   turned round are called swapped, even where both orders are possible on Earth
 * @returns the fault, or undefined when the pairs can be positions
 * @example
 * coordinateFault([[84500.2, 447100.9], [84510.2, 447101.9]]) // => 'coordinates-projected'
 * coordinateFault([[52.01, 4.36], [52.02, 4.36]]) // => undefined
 * coordinateFault([[52.01, 4.36], [52.02, 4.36]], [4.36, 52.01]) // => 'coordinates-swapped'
 * coordinateFault([[35.1, 139.7], [35.2, 139.8]]) // => 'coordinates-swapped'
 */
export function coordinateFault(
  positions: readonly (readonly number[])[],
  near?: Position,
): CoordinateFault | undefined {
  const pairs = positions.map(([x = Number.NaN, y = Number.NaN]): Position => [x, y])
  if (pairs.some(([x, y]) => !Number.isFinite(x) || !Number.isFinite(y))) return 'not-a-number'
  if (pairs.some(([x, y]) => Math.abs(x) > FULL_CIRCLE_DEG || Math.abs(y) > FULL_CIRCLE_DEG)) {
    return 'coordinates-projected'
  }
  const turned = pairs.map(([x, y]): Position => [y, x])
  if (!pairs.every(isOnEarth)) return turned.every(isOnEarth) ? 'coordinates-swapped' : 'coordinates-out-of-range'
  if (near === undefined || !turned.every(isOnEarth)) return undefined
  return liesNear(turned, near) && !liesNear(pairs, near) ? 'coordinates-swapped' : undefined
}

function isOnEarth([longitude, latitude]: Position): boolean {
  return Math.abs(longitude) <= 180 && Math.abs(latitude) <= 90
}

function liesNear(positions: readonly Position[], near: Position): boolean {
  return positions.some((position) => geodesicDistance(position, near).distanceM < NEAR_M)
}
