/** A brick of a wall, placed [px] from the upper left. */
export interface Brick {
  readonly x: number
  readonly y: number
}

/** A wall of as many bricks as there are buildings. */
export interface WallLayout {
  readonly brickWidthPx: number
  readonly brickHeightPx: number
  readonly heightPx: number
  /** From the foot upwards, row by row from the left: the order in which a wall is laid. */
  readonly bricks: readonly Brick[]
}

/** Joint beside a brick [px]: thinner beside small ones. */
function gap(brickWidthPx: number): number {
  return brickWidthPx < 10 ? 1 : 2
}

/**
 * Lays a number of bricks in running bond, in the largest size that keeps the wall under a height.
 *
 * @param count bricks, ≥ 0
 * @param widthPx width of the wall [px]
 * @param mostHeightPx height that the wall may reach [px]; passed only by the smallest bricks
 */
export function wallLayout(count: number, widthPx: number, mostHeightPx: number): WallLayout {
  const sizes = [28, 22, 18, 15, 12, 10, 8, 6, 5, 4]
  const brickWidthPx =
    sizes.find((size) => rowCount(count, widthPx, size) * (brickHeight(size) + gap(size)) <= mostHeightPx) ?? 4
  const brickHeightPx = brickHeight(brickWidthPx)
  const gapPx = gap(brickWidthPx)
  const rows = rowCount(count, widthPx, brickWidthPx)
  const inRow = bricksInRow(widthPx, brickWidthPx)
  const heightPx = Math.max(1, rows) * (brickHeightPx + gapPx)
  const bricks = Array.from({ length: count }, (_, place): Brick => {
    const row = Math.floor(place / inRow)
    const bond = row % 2 === 0 ? (brickWidthPx + gapPx) / 2 : 0
    return {
      x: bond + (place % inRow) * (brickWidthPx + gapPx) + 1,
      y: heightPx - (row + 1) * (brickHeightPx + gapPx) + 1,
    }
  })
  return { brickWidthPx, brickHeightPx, heightPx, bricks }
}

function brickHeight(widthPx: number): number {
  return Math.max(4, Math.round(widthPx * 0.72))
}

function bricksInRow(widthPx: number, brickWidthPx: number): number {
  return Math.max(
    1,
    Math.floor((widthPx - (brickWidthPx + gap(brickWidthPx)) / 2) / (brickWidthPx + gap(brickWidthPx))),
  )
}

function rowCount(count: number, widthPx: number, brickWidthPx: number): number {
  return Math.ceil(count / bricksInRow(widthPx, brickWidthPx))
}
