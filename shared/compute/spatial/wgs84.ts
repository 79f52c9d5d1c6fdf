/** Semi-major axis of the WGS84 ellipsoid [m]. */
export const WGS84_SEMI_MAJOR_AXIS_M = 6_378_137

/** Flattening of the WGS84 ellipsoid [–]. */
export const WGS84_FLATTENING = 1 / 298.257223563

/** First eccentricity of the WGS84 ellipsoid, squared [–]. */
export const WGS84_ECCENTRICITY_SQUARED = WGS84_FLATTENING * (2 - WGS84_FLATTENING)
