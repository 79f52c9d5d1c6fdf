import geographicLib from 'geographiclib-geodesic'
import { ComputeError } from '@/shared/compute/errors'
import { openRing } from './openRing'
import type { Ring } from './spatial.types'

/** Measures of one ring on the ellipsoid. */
export interface RingMeasures {
  readonly areaM2: number
  readonly perimeterM: number
  readonly orientation: 'clockwise' | 'counter-clockwise'
}

/**
 * Area and perimeter of a ring whose sides are geodesics of the WGS84 ellipsoid; holds at poles and across the
 * 180° meridian.
 *
 * @param ring corners [°], closed or open, at least three different ones; longitudes beyond 180° are taken round
 * @returns area [m²] and perimeter [m], neither negative, and the sense of rotation seen from above
 * @throws {ComputeError} `ring-too-short`, `not-a-number`, `coordinates-out-of-range`
 * @remarks Accuracy about 0.1 m² per corner at any size (round-off of the method); about 20 µs a building.
 * @see Karney, C. F. F. (2013). Algorithms for geodesics. Journal of Geodesy 87, 43–55, section 6.
 * @example
 * geodesicArea([[0, 90], [0, 0], [90, 0]]).areaM2 // => 63758202715511.055
 */
export function geodesicArea(ring: Ring): RingMeasures {
  const corners = openRing(ring)
  if (corners.length < 3) throw new ComputeError('ring-too-short', { corners: corners.length })
  const polygon = geographicLib.Geodesic.WGS84.Polygon(false)
  for (const [longitude, latitude] of corners) {
    if (!Number.isFinite(longitude) || !Number.isFinite(latitude)) {
      throw new ComputeError('not-a-number', { longitude, latitude })
    }
    if (Math.abs(latitude) > 90) throw new ComputeError('coordinates-out-of-range', { longitude, latitude })
    polygon.AddPoint(latitude, longitude)
  }
  const { area = 0, perimeter } = polygon.Compute(false, true)
  return {
    areaM2: Math.abs(area),
    perimeterM: perimeter,
    orientation: area < 0 ? 'clockwise' : 'counter-clockwise',
  }
}
