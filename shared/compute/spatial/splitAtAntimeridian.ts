import { longitudeDifference } from './longitudeDifference'
import { openRing } from './openRing'
import type { Position, Ring } from './spatial.types'

const ANTIMERIDIAN_DEG = 180

/**
 * Cuts a ring in two at the 180° meridian, as GeoJSON wants it; rings elsewhere come back alone.
 *
 * @param ring closed or open [°], narrower than 180°; a concave ring that crosses several times keeps seams along the
 *   meridian, which enclose nothing
 * @returns one ring, or the western hemisphere's and the eastern hemisphere's part, each closed
 * @see RFC 7946 (2016). The GeoJSON format, section 3.1.9; Sutherland, I. E., Hodgman, G. W. (1974). Reentrant polygon
 *   clipping. Communications of the ACM 17, 32–42.
 * @example
 * splitAtAntimeridian([[179, 0], [-179, 0], [-179, 1], [179, 1], [179, 0]]).length // => 2
 * splitAtAntimeridian([[1, 0], [2, 0], [2, 1], [1, 0]]).length // => 1
 */
export function splitAtAntimeridian(ring: Ring): readonly Ring[] {
  const corners = openRing(ring)
  const [start = 0] = corners[0] ?? []
  const unwrapped = corners.map(([longitude, latitude]): Position => [
    start + longitudeDifference(start, longitude),
    latitude,
  ])
  const seam = unwrapped.some(([longitude]) => longitude > ANTIMERIDIAN_DEG) ? ANTIMERIDIAN_DEG : -ANTIMERIDIAN_DEG
  const west = clip(unwrapped, seam, (longitude) => longitude <= seam)
  const east = clip(unwrapped, seam, (longitude) => longitude >= seam)
  return [west, east].filter((part) => new Set(part.map(([longitude]) => longitude)).size > 1).map(back)
}

function clip(corners: Ring, seam: number, isKept: (longitude: number) => boolean): Position[] {
  return corners.flatMap((corner, index) => {
    const before = corners.at(index - 1) ?? corner
    const crosses = isKept(before[0]) !== isKept(corner[0])
    const cut: Position[] = crosses ? [cutAt(seam, before, corner)] : []
    return isKept(corner[0]) ? [...cut, corner] : cut
  })
}

function cutAt(seam: number, one: Position, other: Position): Position {
  const share = (seam - one[0]) / (other[0] - one[0])
  return [seam, one[1] + share * (other[1] - one[1])]
}

function back(part: readonly Position[]): Ring {
  const isBeyondEast = part.some(([longitude]) => longitude > ANTIMERIDIAN_DEG)
  const isBeyondWest = part.some(([longitude]) => longitude < -ANTIMERIDIAN_DEG)
  const shift = isBeyondEast ? -360 : isBeyondWest ? 360 : 0
  const moved = part.map(([longitude, latitude]): Position => [longitude + shift, latitude])
  const [first] = moved
  return first === undefined ? moved : [...moved, first]
}
