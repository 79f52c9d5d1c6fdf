import type { HatchStroke, HatchTile } from './hatch.types'

/** Lines at 45° over a square tile, each continued at the corners so that tiles join without a gap. */
function diagonalPath(size: number, offset: number, rising: boolean): string {
  const at = ((offset % size) + size) % size
  const pieces = [at - size, at, at + size].map((start) =>
    rising ? `M${start - 1} ${size + 1}L${start + size + 1} -1` : `M${start - 1} -1L${start + size + 1} ${size + 1}`,
  )
  return pieces.join('')
}

interface DiagonalLine {
  /** Where the line crosses the tile's edge [px]. */
  readonly at: number
  readonly widthPx: number
  /** Towards the upper right; to the lower right when false. */
  readonly rising?: boolean
}

/**
 * A square tile of lines at 45°.
 *
 * @param size edge [px]; lines repeat every `size` along the edge
 */
export function diagonals(size: number, lines: readonly DiagonalLine[]): HatchTile {
  const strokes = lines.map(({ at, widthPx, rising = true }): HatchStroke => ({
    d: diagonalPath(size, at, rising),
    widthPx,
  }))
  return { widthPx: size, heightPx: size, strokes, fills: [] }
}

/** Path data of a disc. */
export function disc(x: number, y: number, radius: number): string {
  return `M${x - radius} ${y}a${radius} ${radius} 0 1 0 ${radius * 2} 0a${radius} ${radius} 0 1 0 ${-radius * 2} 0z`
}

/** A tile of strokes of one width and of filled shapes. */
export function tile(
  widthPx: number,
  heightPx: number,
  drawn: { readonly strokes?: readonly string[]; readonly strokePx?: number; readonly fills?: readonly string[] },
): HatchTile {
  const strokes = (drawn.strokes ?? []).map((d) => ({ d, widthPx: drawn.strokePx ?? 1 }))
  return { widthPx, heightPx, strokes, fills: drawn.fills ?? [] }
}
