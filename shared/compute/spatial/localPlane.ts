import { ComputeError } from '@/shared/compute/errors'
import { curvatureRadii } from './curvatureRadii'
import { longitudeDifference } from './longitudeDifference'
import type { PlanePoint, Position } from './spatial.types'
import { WGS84_ECCENTRICITY_SQUARED } from './wgs84'

/** A plane that touches the ellipsoid at its origin. */
export interface LocalPlane {
  readonly origin: Position
  readonly toPlane: (position: Position) => PlanePoint
  readonly toPosition: (point: PlanePoint) => Position
}

const RADIANS = Math.PI / 180
const INVERSE_STEPS = 4

/**
 * A plane in metres around one position, in which lines that are straight on the ellipsoid stay straight to
 * second order (normal coordinates),
 *
 *     x = N cosφ₀ Δλ − M sinφ₀ Δφ Δλ
 *     y = M Δφ + ½ M′ Δφ² + ½ N sinφ₀ cosφ₀ Δλ²,   M′ = 3 M e² sinφ₀ cosφ₀ / (1 − e² sin²φ₀)
 *
 * The second-order terms matter for areas: without them the sides of a district bend against its true ones.
 *
 * @param origin the touching point [°], |latitude| < 89
 * @returns the way into the plane [m] and back [°]; both work across the 180° meridian
 * @throws {ComputeError} `coordinates-out-of-range` next to a pole or outside it
 * @remarks Distances from the origin measured against Karney's geodesics, up to 60° of latitude:
 *   below 5·10⁻⁷ relative within 5 km.
 * @see do Carmo, M. P. (1992). Riemannian Geometry, chapter 3 (normal coordinates); radii after Snyder (1987), p. 24.
 * @example
 * localPlane([13.405, 52.52]).toPlane([13.405, 52.52]) // => [0, 0]
 * localPlane([179.9999, -17]).toPlane([-179.9999, -17])[0] // => 21.2971661530
 */
export function localPlane(origin: Position): LocalPlane {
  const [longitude, latitude] = origin
  if (!(Math.abs(latitude) < 89) || !Number.isFinite(longitude)) {
    throw new ComputeError('coordinates-out-of-range', { longitude, latitude })
  }
  const { meridionalM, primeVerticalM } = curvatureRadii(latitude)
  const sine = Math.sin(latitude * RADIANS)
  const cosine = Math.cos(latitude * RADIANS)
  const parallelM = primeVerticalM * cosine
  const eastByBothM = -meridionalM * sine
  const northByNorthM =
    (1.5 * meridionalM * WGS84_ECCENTRICITY_SQUARED * sine * cosine) / (1 - WGS84_ECCENTRICITY_SQUARED * sine * sine)
  const northByEastM = (parallelM * sine) / 2

  const toPlane = ([toLongitude, toLatitude]: Position): PlanePoint => {
    const east = longitudeDifference(longitude, toLongitude) * RADIANS
    const north = (toLatitude - latitude) * RADIANS
    return [
      parallelM * east + eastByBothM * north * east,
      meridionalM * north + northByNorthM * north * north + northByEastM * east * east,
    ]
  }
  const toPosition = ([xM, yM]: PlanePoint): Position => {
    let north = yM / meridionalM
    let east = xM / parallelM
    for (let step = 0; step < INVERSE_STEPS; step += 1) {
      north = (yM - northByNorthM * north * north - northByEastM * east * east) / meridionalM
      east = xM / (parallelM + eastByBothM * north)
    }
    return [longitudeDifference(0, longitude + east / RADIANS), latitude + north / RADIANS]
  }
  return { origin, toPlane, toPosition }
}
