/** A position on the WGS84 ellipsoid: [longitude, latitude] in decimal degrees, as GeoJSON writes it. */
export type Position = readonly [longitude: number, latitude: number]

/** Positions of a closed line; the last repeats the first unless a function says otherwise. */
export type Ring = readonly Position[]

/** An outline: one outer ring and any number of holes. */
export interface Outline {
  readonly exterior: Ring
  readonly holes: readonly Ring[]
}

/** A point of a plane [m]: x to the east, y to the north. */
export type PlanePoint = readonly [xM: number, yM: number]
