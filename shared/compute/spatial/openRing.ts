import type { Position } from './spatial.types'

/**
 * The corners of a ring, each once: without the closing position and without repeats in a row.
 *
 * @param ring closed or open, any length
 * @returns the corners in their order
 * @example
 * openRing([[0, 0], [1, 0], [1, 1], [0, 0]]) // => [[0, 0], [1, 0], [1, 1]]
 */
export function openRing<P extends Position>(ring: readonly P[]): P[] {
  const corners = ring.filter((position, index) => index === 0 || !isSame(position, ring[index - 1]))
  const first = corners[0]
  while (corners.length > 1 && first !== undefined && isSame(first, corners.at(-1))) corners.pop()
  return corners
}

function isSame(one: Position, other: Position | undefined): boolean {
  return other !== undefined && one[0] === other[0] && one[1] === other[1]
}
