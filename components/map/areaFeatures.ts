import type { Feature, FeatureCollection, MultiPolygon, Polygon, Position } from 'geojson'
import { interiorPoint } from '@/shared/compute/spatial/interiorPoint'
import type { Position as PlainPosition } from '@/shared/compute/spatial/spatial.types'
import { boundsOf } from './boundsOf'
import type { MapArea } from './OutlineMap.types'

/** The edges of areas, and for each named one a point inside it where its name stands once. */
export function areaFeatures(areas: readonly MapArea[], colour: string): FeatureCollection {
  return {
    type: 'FeatureCollection',
    features: areas.flatMap(({ geometry, name, colour: own = colour }) => {
      const edge: Feature = { type: 'Feature', geometry, properties: { colour: own } }
      const place = name ? placeOfName(geometry) : null
      if (!place) return [edge]
      return [edge, { type: 'Feature', geometry: { type: 'Point', coordinates: [...place] }, properties: { name } }]
    }),
  }
}

/** A point inside the first polygon; the middle of its box when its ring is faulty. */
function placeOfName(geometry: Polygon | MultiPolygon): PlainPosition | null {
  const [exterior, ...holes] = (geometry.type === 'Polygon' ? geometry.coordinates : geometry.coordinates[0]) ?? []
  if (!exterior) return null
  try {
    return interiorPoint({ exterior: exterior.map(plain), holes: holes.map((hole) => hole.map(plain)) })
  } catch {
    // A ring that encloses nothing is reported where it is imported; here its name still has to stand somewhere.
    const box = boundsOf([geometry])
    return box ? [(box[0] + box[2]) / 2, (box[1] + box[3]) / 2] : null
  }
}

function plain([longitude = 0, latitude = 0]: Position): PlainPosition {
  return [longitude, latitude]
}
