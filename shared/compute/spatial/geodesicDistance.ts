import geographicLib from 'geographiclib-geodesic'
import { ComputeError } from '@/shared/compute/errors'
import type { Position } from './spatial.types'

/** The shortest way between two positions. */
export interface GeodesicWay {
  readonly distanceM: number
  /** Azimuth at the start, clockwise from north [°], in (−180, 180]. */
  readonly forwardAzimuthDeg: number
  /** Azimuth at the end, in the sense of travel [°]. */
  readonly finalAzimuthDeg: number
}

/**
 * Length and direction of the shortest line between two positions on the WGS84 ellipsoid.
 *
 * @param from start [°]
 * @param to end [°]
 * @returns length [m], ≥ 0, and azimuths [°]
 * @throws {ComputeError} `not-a-number`, `coordinates-out-of-range`
 * @remarks Accurate to about 15 nm (Karney 2013).
 * @see Karney, C. F. F. (2013). Algorithms for geodesics. Journal of Geodesy 87, 43–55.
 * @example
 * geodesicDistance([13.405, 52.52], [13.4065, 52.5209]).distanceM // => 142.8175170403587
 */
export function geodesicDistance(from: Position, to: Position): GeodesicWay {
  for (const [longitude, latitude] of [from, to]) {
    if (!Number.isFinite(longitude) || !Number.isFinite(latitude)) {
      throw new ComputeError('not-a-number', { longitude, latitude })
    }
    if (Math.abs(latitude) > 90) throw new ComputeError('coordinates-out-of-range', { longitude, latitude })
  }
  const way = geographicLib.Geodesic.WGS84.Inverse(from[1], from[0], to[1], to[0])
  return { distanceM: way.s12 ?? 0, forwardAzimuthDeg: way.azi1 ?? 0, finalAzimuthDeg: way.azi2 ?? 0 }
}
