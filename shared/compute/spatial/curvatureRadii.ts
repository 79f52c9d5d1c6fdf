import { WGS84_ECCENTRICITY_SQUARED, WGS84_SEMI_MAJOR_AXIS_M } from './wgs84'

/** Radii of curvature of the ellipsoid at one latitude. */
export interface CurvatureRadii {
  readonly meridionalM: number
  readonly primeVerticalM: number
}

/**
 * Radii of curvature of the WGS84 ellipsoid along the meridian (M) and across it (N),
 *
 *     N = a / √(1 − e² sin²φ),   M = N (1 − e²) / (1 − e² sin²φ)
 *
 * @param latitudeDeg latitude φ [°], in [−90, 90]
 * @returns both radii [m]
 * @see Snyder, J. P. (1987). Map projections: a working manual. USGS Professional Paper 1395, p. 24–25.
 * @example
 * curvatureRadii(0).primeVerticalM // => 6378137
 * curvatureRadii(90).meridionalM // => 6399593.625758493
 */
export function curvatureRadii(latitudeDeg: number): CurvatureRadii {
  const sine = Math.sin((latitudeDeg * Math.PI) / 180)
  const reduction = 1 - WGS84_ECCENTRICITY_SQUARED * sine * sine
  const primeVerticalM = WGS84_SEMI_MAJOR_AXIS_M / Math.sqrt(reduction)
  return { primeVerticalM, meridionalM: (primeVerticalM * (1 - WGS84_ECCENTRICITY_SQUARED)) / reduction }
}
