import { ComputeError } from '@/shared/compute/errors'
import { longitudeDifference } from './longitudeDifference'
import type { Position, Ring } from './spatial.types'

/**
 * The smallest convex ring around positions, such as a district around its outlines.
 *
 * @param positions any positions [°] of one district, at least three not in line; across the 180° meridian too
 * @returns closed ring, counter-clockwise, starting at the westernmost position
 * @throws {ComputeError} `ring-too-short` when fewer than three corners remain
 * @remarks Cost n log n.
 * @see Andrew, A. M. (1979). Another efficient algorithm for convex hulls in two dimensions.
 *   Information Processing Letters 9, 216–219.
 * @example
 * convexHull([[0, 0], [2, 0], [1, 1], [2, 2], [0, 2]]) // => [[0, 0], [2, 0], [2, 2], [0, 2], [0, 0]]
 */
export function convexHull(positions: readonly Position[]): Ring {
  const [start = 0] = positions[0] ?? []
  const sorted = positions
    .map((position) => ({ position, x: longitudeDifference(start, position[0]), y: position[1] }))
    .sort((one, other) => one.x - other.x || one.y - other.y)
  const hull = [...halfHull(sorted), ...halfHull(sorted.reverse())]
  const [first] = hull
  if (first === undefined || hull.length < 3) throw new ComputeError('ring-too-short', { corners: hull.length })
  return [...hull, first].map(({ position }) => position)
}

interface Corner {
  readonly position: Position
  readonly x: number
  readonly y: number
}

function halfHull(sorted: readonly Corner[]): Corner[] {
  const chain: Corner[] = []
  for (const corner of sorted) {
    while (chain.length >= 2 && !turnsLeft(chain.at(-2), chain.at(-1), corner)) chain.pop()
    chain.push(corner)
  }
  return chain.slice(0, -1)
}

function turnsLeft(one: Corner | undefined, two: Corner | undefined, three: Corner): boolean {
  if (one === undefined || two === undefined) return true
  return (two.x - one.x) * (three.y - one.y) - (two.y - one.y) * (three.x - one.x) > 0
}
