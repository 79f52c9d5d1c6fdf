import { interiorPoint } from '@/shared/compute/spatial/interiorPoint'
import type { Outline, Position } from '@/shared/compute/spatial/spatial.types'
import type { AreaGeometry } from '@/shared/schemas/primitives'

/** A position surely inside an outline [°]; of several parts, inside the first. */
export function innerPoint(geometry: AreaGeometry): Position {
  return interiorPoint(outlineOf(geometry.type === 'Polygon' ? geometry.coordinates : (geometry.coordinates[0] ?? [])))
}

/** Rings of GeoJSON as an outline. */
export function outlineOf(rings: readonly (readonly (readonly number[])[])[]): Outline {
  const [exterior = [], ...holes] = rings.map((ring) => ring.map(([x = 0, y = 0]) => [x, y] as const))
  return { exterior, holes }
}
