import type { LineString, MultiLineString, MultiPolygon, Polygon } from 'geojson'
import type { ReactNode } from 'react'
import type { Material } from '@/shared/compute/factors/vocabulary'

/** A building outline, a block or a hexagon to be painted and pressed. */
export interface MapOutline {
  readonly id: string
  readonly geometry: Polygon | MultiPolygon
  /** Name of the thing, for the list where there is no map. */
  readonly name?: string
}

/** How one outline is painted. */
export interface OutlinePaint {
  /** `#RRGGBB`; the ground of the hatch when left out. */
  readonly fill?: string
  readonly hatch?: Material
  /** Colour of the edge; the rule's colour when left out. */
  readonly outline?: string
  /** 0 to 1; 1 when left out. */
  readonly opacity?: number
  /** Width of the edge [px]; 1 when left out. */
  readonly outlinePx?: number
}

/** An area drawn by its edge alone, such as a beat or a block, with its name inside. */
export interface MapArea {
  readonly id: string
  readonly geometry: Polygon | MultiPolygon
  readonly name?: string
  /** Selection colour when left out. */
  readonly colour?: string
}

/** A street, drawn as a pale line under the outlines, with its name along it. */
export interface MapStreet {
  readonly geometry: LineString | MultiLineString
  readonly name?: string
}

/** Where the person stands, and to within what. */
export interface MapPosition {
  readonly longitude: number
  readonly latitude: number
  readonly accuracyM: number
}

export interface OutlineMapProps {
  /** What the map shows, in a few words: "Footprints of beat 4". */
  readonly label: string
  readonly outlines: readonly MapOutline[]
  /** Must be the same function while nothing changes (`useCallback`): a new one paints every outline anew. */
  readonly paint: (id: string) => OutlinePaint
  readonly selectedIds?: readonly string[]
  readonly onPress?: (id: string) => void
  readonly areas?: readonly MapArea[]
  readonly streets?: readonly MapStreet[]
  readonly userPosition?: MapPosition | null
  /** Keeps the person in the middle as they walk. */
  readonly followsUser?: boolean
  /** Offers "Draw an area"; called with the closed ring when the person is done. */
  readonly onDraw?: (area: Polygon) => void
  /** The map shows everything anew when this changes; else it stays where the person left it. */
  readonly fitKey?: string
  /** Ids to show when fitting, instead of everything. */
  readonly fitIds?: readonly string[]
  /** Lies at the upper left, over the map: a legend, a choice of measure. */
  readonly overlay?: ReactNode
  /** Height [px]; fills its place when left out. */
  readonly heightPx?: number
}
