import type { FeatureCollection } from 'geojson'
import { MATERIAL_HATCHES } from '@/shared/hatches/materialHatches'
import type { MapOutline, MapStreet, OutlinePaint } from './OutlineMap.types'

/** The outlines with their paint as properties, as the layers of the map read them. */
export function outlineFeatures(
  outlines: readonly MapOutline[],
  paint: (id: string) => OutlinePaint,
  edgeColour: string,
): FeatureCollection {
  return {
    type: 'FeatureCollection',
    features: outlines.map(({ id, geometry }) => {
      const painted = paint(id)
      const { hatch, outline = edgeColour, opacity = 1, outlinePx = 1 } = painted
      return {
        type: 'Feature',
        geometry,
        properties: { id, fill: plainFill(painted), outline, opacity, outlinePx, ...(hatch ? { hatch } : {}) },
      }
    }),
  }
}

/** Colour of an outline without its lines: its own, or the ground of its hatch, or none. */
export function plainFill({ fill, hatch }: OutlinePaint): string {
  return fill ?? (hatch ? MATERIAL_HATCHES[hatch].ground : NO_FILL)
}

/** An outline that is drawn by its edge alone still takes a press. */
const NO_FILL = 'rgba(0, 0, 0, 0)'

/** The streets with their names. */
export function streetFeatures(streets: readonly MapStreet[]): FeatureCollection {
  return {
    type: 'FeatureCollection',
    features: streets.map(({ geometry, name = '' }) => ({ type: 'Feature', geometry, properties: { name } })),
  }
}
