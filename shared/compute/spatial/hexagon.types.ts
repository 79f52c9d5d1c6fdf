/** A hexagon of a regular grid, named by its axial coordinates: whole numbers, cell (0, 0) around the origin. */
export interface HexagonCell {
  readonly q: number
  readonly r: number
}
