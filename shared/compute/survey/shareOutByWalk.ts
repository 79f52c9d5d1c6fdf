import { ComputeError } from '@/shared/compute/errors'
import { localPlane } from '@/shared/compute/spatial/localPlane'
import type { PlanePoint, Position } from '@/shared/compute/spatial/spatial.types'
import { sum } from '@/shared/compute/sum'

/** What is walked together: a block, or a building that belongs to none. */
export interface WalkPart {
  /** Its middle [°]. */
  readonly position: Position
  /** How much work it is, such as its number of buildings; > 0. */
  readonly load: number
}

interface Placed {
  readonly index: number
  readonly point: PlanePoint
  readonly load: number
}

/**
 * Shares parts of a district out in beats that lie together and are about equally much work: the parts are cut in two
 * across their longest direction, at the load that the number of beats on each side asks for, and each side again.
 *
 *     direction = first principal axis of the loads,   cut at k₁/k of the load, k₁ = ⌊k/2⌋
 *
 * @param parts at least as many as beats; not across a pole
 * @param beatCount number of beats, ≥ 1
 * @returns indexes into `parts`, one list a beat, none empty, every part in exactly one
 * @throws {ComputeError} `parameter-out-of-range` for the number of beats, `negative-amount` for a load
 * @see Berger, M. J. & Bokhari, S. H. (1987). A partitioning strategy for nonuniform problems on multiprocessors.
 *   IEEE Transactions on Computers C-36, 570–580 (recursive bisection).
 * @example
 * shareOutByWalk([{ position: [0, 0], load: 2 }, { position: [0.01, 0], load: 1 }, { position: [0.011, 0], load: 1 }], 2) // => [[0], [1, 2]]
 */
export function shareOutByWalk(parts: readonly WalkPart[], beatCount: number): number[][] {
  if (!Number.isInteger(beatCount) || beatCount < 1 || beatCount > parts.length) {
    throw new ComputeError('parameter-out-of-range', { beatCount, partCount: parts.length })
  }
  const [first] = parts
  if (first === undefined) return []
  const { toPlane } = localPlane(first.position)
  const placed = parts.map(({ position, load }, index): Placed => {
    if (!(load > 0)) throw new ComputeError('negative-amount', { load, index })
    return { index, point: toPlane(position), load }
  })
  return bisect(placed, beatCount).map((side) => side.map(({ index }) => index).sort((one, other) => one - other))
}

function bisect(parts: readonly Placed[], beatCount: number): (readonly Placed[])[] {
  if (beatCount === 1) return [parts]
  const leftCount = Math.floor(beatCount / 2)
  const [x, y] = principalAxis(parts)
  const ordered = [...parts].sort(
    (one, other) =>
      one.point[0] * x + one.point[1] * y - (other.point[0] * x + other.point[1] * y) || one.index - other.index,
  )
  const cut = cutAt(ordered, leftCount, beatCount)
  return [...bisect(ordered.slice(0, cut), leftCount), ...bisect(ordered.slice(cut), beatCount - leftCount)]
}

/** Number of parts on the left, so that its load is nearest to its due and each side can fill its beats. */
function cutAt(ordered: readonly Placed[], leftCount: number, beatCount: number): number {
  const due = (sum(ordered.map(({ load }) => load)) * leftCount) / beatCount
  const last = ordered.length - (beatCount - leftCount)
  let best = leftCount
  let leastMiss = Infinity
  let load = 0
  for (const [index, part] of ordered.entries()) {
    load += part.load
    const cut = index + 1
    if (cut < leftCount || cut > last) continue
    const miss = Math.abs(load - due)
    if (miss < leastMiss) [best, leastMiss] = [cut, miss]
  }
  return best
}

/** Direction in which the loads lie furthest apart, of unit length. */
function principalAxis(parts: readonly Placed[]): PlanePoint {
  const total = sum(parts.map(({ load }) => load))
  const middle = ([0, 1] as const).map((axis) => sum(parts.map(({ point, load }) => load * point[axis])) / total)
  const moment = (one: 0 | 1, other: 0 | 1): number =>
    sum(
      parts.map(({ point, load }) => load * (point[one] - (middle[one] ?? 0)) * (point[other] - (middle[other] ?? 0))),
    )
  const angle = Math.atan2(2 * moment(0, 1), moment(0, 0) - moment(1, 1)) / 2
  return [Math.cos(angle), Math.sin(angle)]
}
