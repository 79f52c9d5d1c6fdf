import type { Polygon } from 'geojson'
import { interiorPoint } from '@/shared/compute/spatial/interiorPoint'
import { pointInOutline } from '@/shared/compute/spatial/pointInOutline'
import type { Outline } from '@/shared/compute/spatial/spatial.types'
import type { AreaGeometry } from '@/shared/schemas/primitives'

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
      const rings = geometry.type === 'Polygon' ? geometry.coordinates : (geometry.coordinates[0] ?? [])
      return pointInOutline(interiorPoint(outlineOf(rings)), drawn)
    })
    .map(({ id }) => id)
}

function outlineOf(rings: readonly (readonly (readonly number[])[])[]): Outline {
  const [exterior = [], ...holes] = rings.map((ring) => ring.map(([x = 0, y = 0]) => [x, y] as const))
  return { exterior, holes }
}
