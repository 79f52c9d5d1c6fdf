import type { Polygon } from 'geojson'
import { pointInOutline } from '@/shared/compute/spatial/pointInOutline'
import type { AreaGeometry } from '@/shared/schemas/primitives'
import { innerPoint, outlineOf } from './innerPoint'

interface Placed {
  readonly id: string
  readonly geometry: AreaGeometry
}

/**
 * Outlines that a drawn area takes: those with an inner point inside, each in one area only where areas touch.
 *
 * @param outlines outlines of a district [°]
 * @param area what was drawn [°]
 * @returns ids in the order of the outlines
 */
export function outlinesWithin(outlines: readonly Placed[], area: Polygon): string[] {
  const drawn = outlineOf(area.coordinates)
  return outlines
    .filter(({ geometry }) => {
      return pointInOutline(innerPoint(geometry), drawn)
    })
    .map(({ id }) => id)
}
