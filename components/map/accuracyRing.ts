import type { Polygon } from 'geojson'
import type { MapPosition } from './OutlineMap.types'

const METRES_PER_DEGREE = 111_320
const CORNERS = 48

/**
 * The circle within which a position is known, as a polygon of 48 corners. On the scale of a street the earth is taken
 * as flat.
 */
export function accuracyRing({ longitude, latitude, accuracyM }: MapPosition): Polygon {
  const northDegrees = accuracyM / METRES_PER_DEGREE
  const eastDegrees = northDegrees / Math.max(0.01, Math.cos((latitude * Math.PI) / 180))
  const corners = Array.from({ length: CORNERS + 1 }, (_, corner) => {
    const angle = (2 * Math.PI * (corner % CORNERS)) / CORNERS
    return [longitude + eastDegrees * Math.cos(angle), latitude + northDegrees * Math.sin(angle)]
  })
  return { type: 'Polygon', coordinates: [corners] }
}
