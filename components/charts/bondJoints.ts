import type { CourseStretch } from './courseStretches'

/**
 * Upright joints of a row of stones in running bond: every other row is set off by half a stone, and no sliver is
 * left beside the end of a stretch.
 *
 * @param row number of the row, from 0
 * @param stonePx length of a whole stone [px]
 * @returns places of the joints inside the stretches [px]
 */
export function bondJoints(stretches: readonly CourseStretch[], row: number, stonePx: number): number[] {
  const offset = row % 2 === 0 ? 0 : stonePx / 2
  const sliver = stonePx * 0.28
  return stretches.flatMap(({ fromPx, toPx }) => {
    const joints: number[] = []
    for (let at = fromPx + (offset || stonePx); at < toPx - sliver; at += stonePx) {
      if (at > fromPx + sliver) joints.push(at)
    }
    return joints
  })
}
