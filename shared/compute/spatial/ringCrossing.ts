import { openRing } from './openRing'
import type { Position, Ring } from './spatial.types'

interface Side {
  readonly index: number
  readonly from: Position
  readonly to: Position
  readonly west: number
  readonly east: number
}

/**
 * The first place at which a ring crosses, touches or runs back over itself.
 *
 * @param ring positions, closed or open; exact for coordinates that are whole numbers (such as degrees × 10⁷) whose
 *   extent stays below 9·10⁷, otherwise to rounding
 * @returns a corner of the side at fault, or undefined for a simple ring
 * @remarks Sides are swept from west to east; n² only when all overlap.
 * @see Shamos, M. I., Hoey, D. (1976). Geometric intersection problems. 17th FOCS, 208–215.
 * @example
 * ringCrossing([[0, 0], [2, 2], [2, 0], [0, 2], [0, 0]]) // => [0, 0]
 * ringCrossing([[0, 0], [2, 0], [2, 2], [0, 2], [0, 0]]) // => undefined
 */
export function ringCrossing(ring: Ring): Position | undefined {
  const corners = openRing(ring)
  const sides = corners.map((from, index): Side => {
    const to = corners[(index + 1) % corners.length] ?? from
    return { index, from, to, west: Math.min(from[0], to[0]), east: Math.max(from[0], to[0]) }
  })
  const fromWest = [...sides].sort((one, other) => one.west - other.west)
  let open: Side[] = []
  for (const side of fromWest) {
    open = open.filter(({ east }) => east >= side.west)
    const fault = open.find((other) => meetsWrongly(side, other, corners.length))
    if (fault !== undefined) return (fault.index < side.index ? fault : side).from
    open.push(side)
  }
  return undefined
}

function meetsWrongly(one: Side, other: Side, count: number): boolean {
  const apart = Math.abs(one.index - other.index)
  if (apart === 1 || apart === count - 1) return runsBack(one, other)
  return meets(one, other)
}

/** Neighbours share a corner; they are at fault only when the second folds back onto the first. */
function runsBack(one: Side, other: Side): boolean {
  const [first, second] = isSame(one.to, other.from) ? [one, other] : [other, one]
  if (turn(first.from, first.to, second.to) !== 0) return false
  const along =
    (first.to[0] - first.from[0]) * (second.to[0] - second.from[0]) +
    (first.to[1] - first.from[1]) * (second.to[1] - second.from[1])
  return along < 0
}

function meets(one: Side, other: Side): boolean {
  const a = Math.sign(turn(one.from, one.to, other.from))
  const b = Math.sign(turn(one.from, one.to, other.to))
  const c = Math.sign(turn(other.from, other.to, one.from))
  const d = Math.sign(turn(other.from, other.to, one.to))
  if (a * b < 0 && c * d < 0) return true
  return (
    (a === 0 && isBetween(other.from, one)) ||
    (b === 0 && isBetween(other.to, one)) ||
    (c === 0 && isBetween(one.from, other)) ||
    (d === 0 && isBetween(one.to, other))
  )
}

function isBetween([x, y]: Position, { from, to, west, east }: Side): boolean {
  return x >= west && x <= east && y >= Math.min(from[1], to[1]) && y <= Math.max(from[1], to[1])
}

function isSame(one: Position, other: Position): boolean {
  return one[0] === other[0] && one[1] === other[1]
}

function turn(from: Position, to: Position, third: Position): number {
  return (to[0] - from[0]) * (third[1] - from[1]) - (to[1] - from[1]) * (third[0] - from[0])
}
