/** One drawing of a hatch: a tile that repeats in both directions. Paths are SVG path data inside the tile [px]. */
export interface HatchTile {
  readonly widthPx: number
  readonly heightPx: number
  readonly strokes: readonly HatchStroke[]
  /** Path data to fill: dots, triangles. */
  readonly fills: readonly string[]
}

export interface HatchStroke {
  readonly d: string
  readonly widthPx: number
}

/** How a material is drawn: told apart by its lines alone, and by its colour beside them. */
export interface Hatch {
  /** Ground, `#RRGGBB`. */
  readonly ground: string
  /** Lines and dots, `#RRGGBB`. */
  readonly ink: string
  /** For stones, bars and buildings. */
  readonly full: HatchTile
  /** Fewer and thinner lines, for swatches and narrow stones. */
  readonly calm: HatchTile
}
