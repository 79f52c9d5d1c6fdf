import { geodesicArea } from './geodesicArea'
import { localPlaneArea } from './localPlaneArea'
import { longitudeDifference } from './longitudeDifference'
import type { Outline, Ring } from './spatial.types'

const FAST_EXTENT_M = 10_000
const FAST_LATITUDE_DEG = 65
const METRES_PER_DEGREE = 111_320

/**
 * Area of an outline on the ellipsoid, holes taken off. Small rings (extent below 10 km, below 65° of latitude) are
 * measured in their local plane, all others by geodesics.
 *
 * @param outline closed or open rings [°], any sense of rotation, holes inside the exterior
 * @returns area [m²], ≥ 0
 * @throws {ComputeError} `ring-too-short`, `not-a-number`, `coordinates-out-of-range`
 * @remarks The local plane against Karney's geodesics, 200 random outlines a case: below 5·10⁻⁷ relative up to
 *   10 km at 60°, below 5·10⁻⁹ for 200 to 1 000 m; the test of this file holds the bound.
 * @see Karney, C. F. F. (2013). Algorithms for geodesics. Journal of Geodesy 87, 43–55.
 * @example
 * outlineArea({ exterior: [[16.3725, 48.2084], [16.3865085, 48.2137899], [16.3811166, 48.2200136], [16.3671081, 48.2146237]], holes: [] }) // => 960605.187
 */
export function outlineArea({ exterior, holes }: Outline): number {
  return holes.reduce((areaM2, hole) => areaM2 - ringArea(hole), ringArea(exterior))
}

function ringArea(ring: Ring): number {
  return isSmall(ring) ? Math.abs(localPlaneArea(ring)) : geodesicArea(ring).areaM2
}

function isSmall(ring: Ring): boolean {
  const [firstLongitude = 0] = ring[0] ?? []
  const east = ring.map(([longitude]) => longitudeDifference(firstLongitude, longitude))
  const north = ring.map(([, latitude]) => latitude)
  const extentDeg = Math.max(Math.max(...east) - Math.min(...east), Math.max(...north) - Math.min(...north))
  const northernmost = Math.max(...north.map(Math.abs))
  return extentDeg * METRES_PER_DEGREE < FAST_EXTENT_M && northernmost < FAST_LATITUDE_DEG
}
