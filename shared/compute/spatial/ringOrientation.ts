import { longitudeDifference } from './longitudeDifference'
import { signedPlaneArea } from './signedPlaneArea'
import type { Ring } from './spatial.types'

/**
 * The sense in which a ring runs round, seen from above, in longitude and latitude as in a plane.
 *
 * @param ring positions [°], closed or open; rings across the 180° meridian are taken the short way
 * @returns `none` when the ring encloses nothing
 * @see RFC 7946 (2016). The GeoJSON format, section 3.1.6.
 * @example
 * ringOrientation([[0, 0], [0, 1], [1, 1], [1, 0], [0, 0]]) // => 'clockwise'
 */
export function ringOrientation(ring: Ring): 'clockwise' | 'counter-clockwise' | 'none' {
  const [start = 0] = ring[0] ?? []
  const area = signedPlaneArea(ring.map(([longitude, latitude]) => [longitudeDifference(start, longitude), latitude]))
  if (area === 0) return 'none'
  return area > 0 ? 'counter-clockwise' : 'clockwise'
}
